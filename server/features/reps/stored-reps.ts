import type { EntityManager } from '@mikro-orm/postgresql';
import { group } from 'd3-array';
import type { Rep as RepShape } from '#shared/contracts/reps.ts';
import { type Borrowing, sharedQuietOf } from '#shared/records/shared-quiet.ts';
import { type Tying, withTiedLift } from '#shared/records/tied-lifts.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { type MarkRow, readMarks } from '../marks/mark-store.ts';
import { Rep } from './rep.entity.ts';
import { presentRep, repInput, type StoredRep, timesOfClip } from './reps.presenter.ts';

/** The place of a rep among those of its clip: by where it starts, then by when it was made. */
export const REP_ORDER = { startFrame: 'asc', createdAt: 'asc', id: 'asc' } as const;

/** A rep ready to be presented. */
export interface NumberedRep extends StoredRep {
  readonly number: number;
}

const borrowing = (stored: StoredRep): Borrowing => ({
  input: repInput(stored, timesOfClip(stored.clip)),
  clipId: stored.clip.id,
  quietFrom: stored.rep.quietFrom ?? null,
});

/** The quiet stance of the rep that lends it. */
const taken = (own: StoredRep, all: readonly StoredRep[]) =>
  sharedQuietOf(
    borrowing(own),
    all.filter(({ rep }) => rep.id === own.rep.quietFrom).map(borrowing),
  );

const byTheirMarks = async (
  em: EntityManager,
  clips: readonly Clip[],
  athlete: Athlete,
): Promise<NumberedRep[]> => {
  const reps = (await em.find(
    Rep,
    { clip: { $in: clips.map(({ id }) => id) } },
    { orderBy: REP_ORDER },
  )) as Rep[];
  const marks = group(
    await readMarks(
      em,
      reps.map(({ id }) => id),
    ),
    ({ repId }) => repId,
  );
  const none: readonly MarkRow[] = [];
  const stored = clips.flatMap((clip) =>
    reps
      .filter((rep) => rep.clip.id === clip.id)
      .map((rep, index) => ({
        rep,
        clip,
        marks: marks.get(rep.id) ?? none,
        bodyHeightMm: athlete.heightMm ?? null,
        number: index + 1,
      })),
  );
  return stored.map((own) =>
    own.rep.quietFrom ? { ...own, sharedQuiet: taken(own, stored) } : own,
  );
};

const tying = (stored: StoredRep): Tying => {
  const { rep, clip } = stored;
  const times = timesOfClip(clip);
  const clap = typeof rep.clapFrame === 'number' ? (times[rep.clapFrame] ?? null) : null;
  const input = repInput(stored, times);
  return { input, clipId: clip.id, liftFrom: rep.liftFrom ?? null, clap };
};

/** Other clips of which a rep of these names one. */
const clipsNamed = async (em: EntityManager, reps: readonly StoredRep[]): Promise<Clip[]> => {
  const here = new Set(reps.map(({ rep }) => rep.id));
  const named = reps.flatMap(({ rep: { liftFrom } }) =>
    liftFrom && !here.has(liftFrom) ? [liftFrom] : [],
  );
  if (named.length === 0) return [];
  const there = await em.find(Rep, { id: { $in: named } }, { populate: ['clip.frames'] });
  return [...new Set(there.map(({ clip }) => clip.unwrap() as Clip))];
};

/**
 * The reps of some clips with their marks, clip by clip in the order of each.
 * @param clips with the lazy `frames` loaded
 */
export const storedReps = async (
  em: EntityManager,
  clips: readonly Clip[],
  athlete: Athlete,
): Promise<NumberedRep[]> => {
  const own = await byTheirMarks(em, clips, athlete);
  if (!own.some(({ rep }) => rep.liftFrom)) return own;
  const others = await byTheirMarks(em, await clipsNamed(em, own), athlete);
  const all = [...own, ...others].map(tying);
  return own.map((stored) => {
    if (!stored.rep.liftFrom) return stored;
    const { input, tieFault } = withTiedLift(tying(stored), all);
    return { ...stored, liftFrom: input?.liftFrom, tieFault };
  });
};

export const presentNumbered = (stored: NumberedRep): RepShape => presentRep(stored, stored.number);
