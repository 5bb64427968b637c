import type { StagePoint } from '#shared/geometry/points.ts';

/** Half of a 44 px target. */
const LARGEST = 22;
/** Marks nearer than this to each other are told apart by enlarging. */
const SMALLEST = 9;

/** How far around each mark a press counts as its own: half way to its nearest neighbour. */
export const hitRadii = (marks: readonly StagePoint[]): number[] =>
  marks.map((mark, n) => {
    const nearest = marks.reduce(
      (least, other, m) =>
        m === n ? least : Math.min(least, Math.hypot(other.x - mark.x, other.y - mark.y)),
      Infinity,
    );
    return Math.max(SMALLEST, Math.min(LARGEST, nearest / 2));
  });
