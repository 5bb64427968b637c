import type { StagePoint } from '#shared/geometry/points.ts';

/** Half of a 44 px target. */
const LARGEST = 22;
/** Marks nearer than this to each other are told apart by enlarging. */
const SMALLEST = 9;
/** While a press is for the landmark asked for, a mark takes hold only where its own shape is pressed. */
const WHILE_PLACING = 8;

/**
 * How far around each mark a press counts as its own: half way to its nearest neighbour. While a landmark is asked
 * for it may lie close beside one that stands: the tip of a thigh pointer and the end of its strap are 10 px apart.
 */
export const hitRadii = (marks: readonly StagePoint[], placing: boolean): number[] =>
  marks.map((mark, n) => {
    if (placing) return WHILE_PLACING;
    const nearest = marks.reduce(
      (least, other, m) =>
        m === n ? least : Math.min(least, Math.hypot(other.x - mark.x, other.y - mark.y)),
      Infinity,
    );
    return Math.max(SMALLEST, Math.min(LARGEST, nearest / 2));
  });
