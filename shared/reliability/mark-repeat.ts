import type { FramePoint } from '#shared/geometry/points.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from '#shared/measures/inputs.ts';
import { typicalError } from './agreement.ts';

/** Doubly marked frames from which a coach's own error replaces the assumed one. */
export const LEAST_DOUBLY_MARKED = 20;

/** One anatomical landmark of one frame, marked twice without sight of the first mark. */
export interface DoublyMarked {
  readonly frame: string;
  readonly first: FramePoint;
  readonly second: FramePoint;
}

/** Typical error of one coordinate of a mark, px of the source. Null of nothing marked twice. */
export const typicalMarkError = (marks: readonly DoublyMarked[]): number | null =>
  typicalError(
    marks.flatMap(({ first, second }) => [
      [first.u, second.u],
      [first.v, second.v],
    ]),
  );

/** The coach's own error from twenty doubly marked frames on; the assumed 3 px before. */
export const markErrorOf = (marks: readonly DoublyMarked[]): MarkError => {
  const frames = new Set(marks.map(({ frame }) => frame)).size;
  const own = typicalMarkError(marks);
  return frames < LEAST_DOUBLY_MARKED || own === null || own <= 0
    ? ASSUMED_MARK_ERROR
    : { anatomicalPx: own, doublyMarkedFrames: frames };
};
