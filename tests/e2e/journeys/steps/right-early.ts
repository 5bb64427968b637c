import { fileURLToPath } from 'node:url';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { markedRep } from '#tests/fixtures/clips/marked.ts';
import { loadTruth } from '#tests/fixtures/clips/truth.ts';

/** A phone's upright HEVC .mov at a variable rate: three reps on the right leg that turn out early. */
export const CLIP_FILE = fileURLToPath(
  new URL('../../../fixtures/clips/right-early.mov', import.meta.url),
);
export const truth = loadTruth('right-early');

/** Standard deviation of a mark of anatomy, px, and what the draws start from. */
const SPREAD_PX = 2;
const SEED = 20_260;

/** The landmarks that marking leads through with both pointers, in its order. */
export const LED: readonly LandmarkId[] = landmarksOf('belt+thigh');

export interface Place {
  readonly frame: number;
  readonly landmark: LandmarkId;
  readonly u: number;
  readonly v: number;
}

/** Where a careful coach puts the marks of a rep (from 0): the true places plus seeded noise, by frame. */
export const placesOf = (rep: number): readonly Place[] =>
  markedRep(truth, rep, SPREAD_PX, SEED).frames.flatMap(({ frame, marks }) =>
    LED.flatMap((landmark) => {
      const mark = marks[landmark];
      if (mark === undefined || mark.hidden) return [];
      return [{ frame, landmark, u: mark.point.u, v: mark.point.v }];
    }),
  );

/** Where a landmark is marked on a frame. */
export const placeOn = (places: readonly Place[], frame: number, id: LandmarkId): Place => {
  const place = places.find((each) => each.frame === frame && each.landmark === id);
  if (place === undefined) throw new Error(`nothing is known of ${id} on frame ${frame}`);
  return place;
};

/** Frames of a rep that get marks, in order. */
export const framesOf = (rep: number): readonly number[] => [
  ...new Set(placesOf(rep).map(({ frame }) => frame)),
];

/** The true turn from 60° to 90° of lift, mean of the three reps, degrees, external positive. */
export const TRUE_CHANGE =
  truth.reps.reduce((sum, rep) => sum + (rep.turnChange60To90 ?? NaN), 0) / truth.reps.length;
