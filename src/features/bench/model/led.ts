import type { ClipGeometry } from '#shared/contracts/clips.ts';
import type { FrameMarks } from '#shared/landmarks/commands.ts';
import { landmarksIn, landmarksOf } from '#shared/landmarks/table.ts';
import type { LandmarkId, LandmarkSetId, View } from '#shared/landmarks/types.ts';

/** Landmarks that only substitutions need; offered, never asked for by themselves. */
export const EXTRAS = {
  shoulders: ['acromion-support', 'acromion-lifted'],
  foot: ['toe-support', 'heel-support'],
} as const satisfies Record<string, readonly LandmarkId[]>;
export type Extra = keyof typeof EXTRAS;

/** The richest set for which the pointer lengths are known. */
export const proposedSet = (
  geometry: Pick<ClipGeometry, 'beltPointerMm' | 'thighPointerMm'>,
): LandmarkSetId => {
  if (geometry.beltPointerMm === null) return 'bare';
  return geometry.thighPointerMm === null ? 'belt' : 'belt+thigh';
};

/** What marking leads through on a frame of this view, in its order. */
export const ledLandmarks = (
  view: View,
  set: LandmarkSetId,
  extras: readonly Extra[],
): readonly LandmarkId[] => {
  const inView = landmarksIn(view);
  // both ankles tell when the foot leaves the floor: a side clip needs them too
  if (view === 'lifted-side' || view === 'support-side') return inView;
  const wanted = new Set<LandmarkId>([
    ...landmarksOf(set),
    ...extras.flatMap((extra): readonly LandmarkId[] => EXTRAS[extra]),
  ]);
  return inView.filter((id) => wanted.has(id));
};

/** Tracked and not yet looked at counts as still to do; hidden counts as done. */
export const isDone = (marks: FrameMarks, id: LandmarkId): boolean => {
  const mark = marks[id];
  return mark !== undefined && (mark.to === 'hidden' || mark.looked);
};

/**
 * The landmark to ask for next: the first that is not done after `after`, then from the beginning.
 * Null once all are done.
 */
export const nextLandmark = (
  led: readonly LandmarkId[],
  marks: FrameMarks,
  after: LandmarkId | null,
): LandmarkId | null => {
  const from = after === null ? 0 : led.indexOf(after) + 1;
  const order = [...led.slice(from), ...led.slice(0, from)];
  return order.find((id) => !isDone(marks, id)) ?? null;
};

export interface Tally {
  readonly placed: number;
  readonly hidden: number;
  readonly tracked: number;
  readonly toGo: number;
}

/** How far the marking of one frame has come. */
export const tallyOf = (led: readonly LandmarkId[], marks: FrameMarks): Tally => {
  const tally = { placed: 0, hidden: 0, tracked: 0, toGo: 0 };
  for (const id of led) {
    const mark = marks[id];
    if (!mark) tally.toGo += 1;
    else if (mark.to === 'hidden') tally.hidden += 1;
    else if (mark.looked) tally.placed += 1;
    else tally.tracked += 1;
  }
  return tally;
};
