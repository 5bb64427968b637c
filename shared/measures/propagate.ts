import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { LevelFrame, LevelMark } from './level.ts';

const STEP_PX = 0.5;

/**
 * Standard uncertainty of a value from the random errors of its marks: the root of the sum of
 * (∂value/∂coordinate × error)², by central differences of half a pixel.
 */
export const propagate = (
  frame: LevelFrame,
  landmarks: readonly LandmarkId[],
  formula: (frame: LevelFrame) => number,
): number => {
  let variance = 0;
  for (const id of landmarks) {
    const mark = frame.marks[id];
    if (!mark) continue;
    for (const axis of ['u', 'v'] as const) {
      const at = (step: number): number => {
        const moved: LevelMark = { ...mark, [axis]: mark[axis] + step };
        return formula({ ...frame, marks: { ...frame.marks, [id]: moved } });
      };
      const slope = (at(STEP_PX) - at(-STEP_PX)) / (2 * STEP_PX);
      variance += (slope * mark.error) ** 2;
    }
  }
  return Math.sqrt(variance);
};
