import { framePoint } from '#shared/geometry/points.ts';
import { landmark as landmarkOf } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { isLandmark } from '#shared/records/stored-marks.ts';
import type { DoublyMarked } from './mark-repeat.ts';

/** A mark with its place, as one of the two markings has it. `u` and `v` are null where hidden. */
export interface PlacedMark {
  readonly frame: number;
  readonly landmark: string;
  readonly u: number | null;
  readonly v: number | null;
  /** Long edge, px, of the picture on which it was placed. */
  readonly pictureLongEdge: number;
}

/** A mark of the first marking, and whose it is. */
export interface FirstMark extends PlacedMark {
  readonly byUser: string;
}

/** One landmark of one frame with a point in both markings, px of the source. */
export interface MarkedTwice {
  readonly frame: number;
  readonly landmark: LandmarkId;
  /** Who placed the first mark. */
  readonly firstBy: string;
  readonly first: { readonly u: number; readonly v: number };
  readonly second: { readonly u: number; readonly v: number };
  /** How much coarser than the source the coarser of the two pictures was; 1: not at all. */
  readonly coarseness: number;
}

/** Marks that have a point in both markings. A landmark that one of the two hid says nothing of its place. */
export const markedTwice = (
  first: readonly FirstMark[],
  second: readonly PlacedMark[],
  sourceLongEdge: number,
): MarkedTwice[] => {
  const again = new Map(second.map((mark) => [`${mark.frame} ${mark.landmark}`, mark]));
  return first.flatMap((before): MarkedTwice[] => {
    const { frame, landmark, u, v, byUser } = before;
    const after = again.get(`${frame} ${landmark}`);
    if (!isLandmark(landmark) || u === null || v === null) return [];
    if (!after || after.u === null || after.v === null) return [];
    const edge = Math.min(before.pictureLongEdge, after.pictureLongEdge);
    return [
      {
        frame,
        landmark,
        firstBy: byUser,
        first: { u, v },
        second: { u: after.u, v: after.v },
        coarseness: edge > 0 ? Math.max(1, sourceLongEdge / edge) : 1,
      },
    ];
  });
};

/** Whether this landmark's error is the one that a coach's own replaces: pointers and outlines have others. */
export const isAnatomical = (landmark: LandmarkId): boolean =>
  landmarkOf(landmark).errorClass === 'anatomical';

/**
 * As the marking error takes them: at the fineness of the source, because a reading widens the error of coarser
 * pictures by itself.
 */
export const doublyMarked = (rep: string, marks: readonly MarkedTwice[]): DoublyMarked[] =>
  marks.map(({ frame, first, second, coarseness }) => ({
    frame: `${rep} ${frame}`,
    first: framePoint(first.u / coarseness, first.v / coarseness),
    second: framePoint(second.u / coarseness, second.v / coarseness),
  }));
