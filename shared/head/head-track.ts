import type { Box } from '#shared/geometry/boxes.ts';

/** A box around the head, drawn by hand on one frame; pixels of the upright source frame. */
export interface DrawnHead {
  readonly frame: number;
  readonly box: Box;
}

/** The same where the drawn box was followed to. */
export interface FollowedHead extends DrawnHead {
  /** 0 (nothing known) to 1 (as good as a hand). */
  readonly confidence: number;
}

/** What is known of where the head is in a clip. */
export interface HeadTrack {
  /** Of the upright source frame, px. */
  readonly width: number;
  readonly height: number;
  /** The frames that were looked through, both inclusive: within them a lost head is covered by the last box, grown. */
  readonly fromFrame: number;
  readonly toFrame: number;
  readonly drawn: readonly DrawnHead[];
  readonly followed: readonly FollowedHead[];
  /** By which part of its larger edge the last box grows with every frame on which the head is lost. */
  readonly growth: number;
}

/** A followed box counts from this confidence on; below, the head counts as lost. */
export const SURE_HEAD = 0.5;

/** The smallest box that can be drawn, px: below, nothing can be followed. From our tracker's patches, no source. */
export const LEAST_HEAD_PX = 16;

/** A head gets no farther than so many of its own sizes in a second. From our own clips, no source. */
const HEADS_A_SECOND = 1.5;
/** No clip is quick enough to grow by less. */
const LEAST_GROWTH = 0.05;

/** @param perSecond the fewest frames a second that the clip has anywhere; null: unknown, taken as 10 */
export const headGrowth = (perSecond: number | null): number =>
  Math.max(LEAST_GROWTH, HEADS_A_SECOND / (perSecond ?? 10));
