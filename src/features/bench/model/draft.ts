import type { BenchDocument } from '#shared/contracts/bench.ts';
import { NO_BOUNDARIES, type Rep } from '#shared/contracts/reps.ts';
import type { MarkingCommand, MarksByFrame, MarkValue } from '#shared/landmarks/commands.ts';
import { landmarkAt, type SpotId, spotOf } from '#shared/landmarks/spots.ts';
import type { LandmarkId, Side } from '#shared/landmarks/types.ts';
import { repInputOf } from '#shared/records/engine-input.ts';
import { viewOf } from '#shared/records/views.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';

/**
 * Marks placed before the clip has a rep, by frame and by place on the body. They are kept on the
 * device until reps are found that can take them.
 */
export type Touches = ReadonlyMap<FrameIndex, ReadonlyMap<SpotId, MarkValue>>;
export const NO_TOUCHES: Touches = new Map();
export const countTouches = (touches: Touches): number =>
  [...touches.values()].reduce((sum, spots) => sum + spots.size, 0);

/** The leg stood on in a clip without reps, as far as the coach says. */
export type StandsOn = Side | 'both';

const DRAFT_ID = 'draft';
export const isDraft = (own: { readonly rep: Pick<Rep, 'id'> } | null): boolean =>
  own?.rep.id === DRAFT_ID;

const marksOf = (touches: Touches, rep: Pick<Rep, 'supportSide' | 'view'>): MarksByFrame =>
  new Map(
    [...touches].flatMap(([frame, spots]) => {
      const named = [...spots].flatMap(([spot, value]) => {
        const id = landmarkAt(spot, rep);
        return id ? [[id, value] as const] : [];
      });
      return named.length === 0 ? [] : [[frame, Object.fromEntries(named)] as const];
    }),
  );

/** The whole clip as if it were one rep, so that marking can begin before a rep is named. */
export const draftRep = (
  document: BenchDocument,
  supportSide: Side,
  touches: Touches,
  times: readonly Milliseconds[],
) => {
  const { clip, athlete } = document;
  const rep: Rep = {
    id: DRAFT_ID,
    clipId: clip.id,
    number: 0,
    supportSide,
    view: viewOf(clip.cameraStood, supportSide),
    startFrame: 0,
    endFrame: times.length - 1,
    boundaries: NO_BOUNDARIES,
    excluded: null,
    excludedNote: '',
    markedFrames: 0,
    quietFrom: null,
    liftFrom: null,
    clapFrame: null,
    tieFault: null,
    version: 0,
  };
  const marks = marksOf(touches, rep);
  const input = repInputOf({ rep, clip, times, marks, bodyHeightMm: athlete.heightMm });
  const tie = { clipId: clip.id, liftFrom: null, clap: null, tieFault: null };
  return { rep, marks, input, quietFrom: null, ...tie };
};

/** Every mark of a rep as if it stood on one frame: one touch is enough for a mark that follows. */
export const touchedOnce = (
  marks: MarksByFrame,
): Readonly<Partial<Record<LandmarkId, MarkValue>>> =>
  Object.assign({}, ...[...marks.values()].reverse()) as Readonly<
    Partial<Record<LandmarkId, MarkValue>>
  >;

/** The touches after some commands of a draft. */
export const touchesAfter = (
  touches: Touches,
  commands: readonly MarkingCommand[],
  rep: Pick<Rep, 'supportSide' | 'view'>,
): Touches => {
  const next = new Map([...touches].map(([frame, spots]) => [frame, new Map(spots)]));
  for (const { frame, landmark, after } of commands) {
    const spots = next.get(frame) ?? new Map<SpotId, MarkValue>();
    if (after) spots.set(spotOf(landmark, rep), after);
    else spots.delete(spotOf(landmark, rep));
    if (spots.size > 0) next.set(frame, spots);
    else next.delete(frame);
  }
  return next;
};

/** Which leg the touches are asked for now: of both in turn, the one whose landmarks are not all touched. */
export const askedSide = (
  stands: StandsOn,
  touches: Touches,
  clip: BenchDocument['clip'],
  led: (side: Side) => readonly LandmarkId[],
): Side => {
  if (stands !== 'both') return stands;
  const known = new Set([...touches.values()].flatMap((spots) => [...spots.keys()]));
  const whole = (side: Side): boolean => {
    const standing = { supportSide: side, view: viewOf(clip.cameraStood, side) };
    return led(side).every((id) => known.has(spotOf(id, standing)));
  };
  return whole('right') ? 'left' : 'right';
};
