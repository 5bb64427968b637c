import type { EntityManager } from '@mikro-orm/postgresql';
import type { ClipGeometry } from '../../features/clips/clip.entity.ts';
import { Comment } from '../../features/comments/comment.entity.ts';
import { writeMarks } from '../../features/marks/mark-store.ts';
import { Rep } from '../../features/reps/rep.entity.ts';
import { marksOfRep } from './marks-of-rep.ts';
import { hourOf } from './seed-athlete.ts';
import { clipPlaceOf, type PlacedClip, type RenderedSource, type ThreadStory } from './story.ts';
import { storyId } from './story-id.ts';
import type { DemoTruth } from './truth.ts';

/** The people whose hands fill the demo. */
export interface Hands {
  readonly practiceId: string;
  readonly coach: string;
  readonly supervisor: string | null;
}

/** What the coach measured with the tape, and the rod's two ends on the picture. */
const geometryOf = ({ setUp, rod }: DemoTruth): ClipGeometry => ({
  scale: {
    from: 'rod',
    a: { u: rod.top[0], v: rod.top[1] },
    b: { u: rod.bottom[0], v: rod.bottom[1] },
    lengthMm: setUp.rodLengthMm,
  },
  distanceMm: setUp.distanceMm,
  lensHeightMm: setUp.lensHeightMm,
  beltPointerMm: setUp.beltPointerMm,
  thighPointerMm: setUp.thighPointerMm,
  plumb: null,
  floorLine: null,
  shutter: null,
});

export const demoRepId = (
  { practiceId }: Hands,
  { clipPlace }: Pick<PlacedClip, 'clipPlace'>,
  index: number,
): string => storyId(practiceId, 'rep', ...clipPlace, index);

/** The first frame of the rise at which the thigh has come so far. */
const frameAtLift = (truth: DemoTruth, thread: ThreadStory): number => {
  const rep = truth.reps[thread.rep];
  if (!rep) throw new RangeError(`The clip has no rep ${thread.rep}.`);
  const { lift } = truth.frames.values;
  for (let frame = rep.footOffFrame; frame < rep.plateauEndFrame; frame += 1) {
    if ((lift[frame] ?? 0) >= thread.lift) return frame;
  }
  return rep.plateauEndFrame;
};

const addThread = (
  em: EntityManager,
  hands: Hands,
  { visit, clipPlace }: PlacedClip,
  truth: DemoTruth,
  thread: ThreadStory,
): void => {
  const frame = frameAtLift(truth, thread);
  const ring = thread.ringAt === undefined ? undefined : truth.frames.marks[thread.ringAt];
  const clip = storyId(hands.practiceId, ...clipPlace);
  const root = storyId(hands.practiceId, 'comment', ...clipPlace, thread.rep, thread.lift);
  thread.words.forEach(({ by, body }, index) => {
    const last = index === thread.words.length - 1;
    const resolved = thread.resolved === true && index === 0;
    em.create(Comment, {
      ...(index === 0 ? { id: root } : {}),
      clip,
      answerTo: index === 0 ? null : root,
      body,
      fromFrame: frame,
      toFrame: frame,
      shape:
        ring && index === 0
          ? { kind: 'ring', u: ring[2 * frame] ?? 0, v: ring[2 * frame + 1] ?? 0, radius: 70 }
          : null,
      shared: last && thread.shared === true,
      by: by === 'coach' ? hands.coach : (hands.supervisor ?? hands.coach),
      at: hourOf(visit.daysAgo, 14 + index),
      resolvedBy: resolved ? hands.coach : null,
      resolvedAt: resolved ? hourOf(visit.daysAgo, 17) : null,
    });
  });
};

const addReps = async (
  em: EntityManager,
  hands: Hands,
  placed: PlacedClip,
  truth: DemoTruth,
  source: RenderedSource,
): Promise<void> => {
  const clip = storyId(hands.practiceId, ...placed.clipPlace);
  for (const index of source.named) {
    const rep = truth.reps[index];
    if (!rep) throw new RangeError(`The clip has no rep ${index}.`);
    em.create(Rep, {
      id: demoRepId(hands, placed, index),
      clip,
      supportSide: rep.supportSide,
      startFrame: rep.firstFrame,
      endFrame: rep.lastFrame,
      handBoundaries: {},
      excluded: source.excluded?.[index] ?? null,
      createdBy: hands.coach,
      createdAt: hourOf(placed.visit.daysAgo, 10),
    });
  }
  await em.flush();
  for (const index of source.marked) {
    const rep = truth.reps[index];
    if (!rep) continue;
    const marks = marksOfRep(truth, rep, {
      repId: demoRepId(hands, placed, index),
      byUser: hands.coach,
      at: hourOf(placed.visit.daysAgo, 11),
      seed: source.seed + index,
      spreadPx: source.spreadPx,
      hollow: source.hollow ?? false,
    });
    await writeMarks(em, hands.practiceId, marks);
  }
};

/** Ties the reps of the visit's front clip to those of this one, which shows the same lifts from the side. */
const tieLifts = async (
  em: EntityManager,
  hands: Hands,
  placed: PlacedClip,
  { liftFor, named }: RenderedSource,
): Promise<void> => {
  if (liftFor === undefined) return;
  const front = { clipPlace: clipPlaceOf(placed.visitPlace, liftFor) };
  for (const index of named) {
    const rep = await em.findOneOrFail(Rep, { id: demoRepId(hands, front, index) });
    rep.liftFrom = demoRepId(hands, placed, index);
  }
};

/** Gives a clip its scale, reps, marks, ties and comments; does nothing where they are there. */
export const fillClip = async (
  em: EntityManager,
  hands: Hands,
  placed: PlacedClip,
  truth: DemoTruth | null,
): Promise<void> => {
  const { source } = placed.clip;
  const clip = { id: storyId(hands.practiceId, ...placed.clipPlace) };
  // By SQL, past the version that the ORM counts: preparation writes the same row at the same time.
  await em.execute(
    'update clip set uploaded_at = ?, geometry = coalesce(?::jsonb, geometry) where id = ?',
    [hourOf(placed.visit.daysAgo, 9), truth ? JSON.stringify(geometryOf(truth)) : null, clip.id],
  );
  if (!truth || !('rendered' in source)) return;
  if ((await em.count(Rep, { clip: clip.id })) > 0) return;
  await addReps(em, hands, placed, truth, source);
  await tieLifts(em, hands, placed, source);
  for (const thread of source.threads ?? []) addThread(em, hands, placed, truth, thread);
};
