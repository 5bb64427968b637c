import type { Box } from '#shared/geometry/boxes.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { FrameIndex } from '#shared/timing/units.ts';

/**
 * Marks that follow. A point placed by hand is a keyframe: it never moves. Between and beyond
 * keyframes the point is followed from picture to picture, in both directions. All points are in
 * pixels of the upright source frame, whatever the size of the copy that is looked at.
 */

/**
 * - `sure`    a person need only glance at it
 * - `unsure`  a place is given, but look before it counts
 * - `lost`    covered, blurred away or out of the picture: no place is given
 */
export type TrackState = 'sure' | 'unsure' | 'lost';

/** Confidence from which on a place is sure. */
export const SURE = 0.5;

/** Where a point is on one frame. */
export interface Followed {
  readonly frame: FrameIndex;
  /** Null exactly where the state is `lost`. */
  readonly point: FramePoint | null;
  /** 0 (nothing known) to 1 (as good as a hand). */
  readonly confidence: number;
  readonly state: TrackState;
}

/** A point placed by a person. */
export interface Keyframe {
  readonly frame: FrameIndex;
  readonly point: FramePoint;
}

export interface PointToFollow {
  /** The caller's name for it, a landmark id or a corner of a box; unique within the request. */
  readonly id: string;
  /** At least one, in any order, no frame twice. A re-mark is one more keyframe. */
  readonly keyframes: readonly Keyframe[];
}

export interface FollowRequest {
  readonly points: readonly PointToFollow[];
  /** First and last frame to give places for, both inclusive. Keyframes may lie outside. */
  readonly from: FrameIndex;
  readonly to: FrameIndex;
}

/** One point's places, rising by frame: each frame of the span once. Keyframes: confidence 1. */
export interface Track {
  readonly id: string;
  readonly places: readonly Followed[];
}

/**
 * Why a point cannot be followed from where it was placed.
 * - `nothing-to-hold-on-to`  no texture there that stands out of the noise: put a dot
 * - `only-an-edge`           it would slide along a line: put a dot
 * - `at-the-border`          too near the edge of the picture
 * - `outside`                not in the picture
 */
export type RefusalCode = 'nothing-to-hold-on-to' | 'only-an-edge' | 'at-the-border' | 'outside';

/** A round sticker at a touch. */
export interface Dot {
  /** Its middle, a tenth of a pixel or better on a clean picture. */
  readonly centre: FramePoint;
  /** Source pixels. */
  readonly radius: number;
  readonly tone: 'dark' | 'light';
}

/** What is known of a place before it is followed. */
export interface Touch {
  /** Null where no round thing lies under or close to the touch. The caller chooses: snap or keep. */
  readonly dot: Dot | null;
  /** For the touched place itself; null where it can be followed. */
  readonly refusal: RefusalCode | null;
}

export interface FollowProgress {
  /** Pictures looked at, and all that will be; the second may shrink when a point gets lost. */
  readonly done: number;
  readonly total: number;
  /** True while it gives way to the person who steps through the clip. */
  readonly held: boolean;
}

export interface FollowOptions {
  /** Aborting rejects with the signal's reason; the tracker stays usable. */
  readonly signal?: AbortSignal;
  readonly onProgress?: (progress: FollowProgress) => void;
  /**
   * Called with places as they become known, in no order; those between two keyframes only when
   * they were reached from both. The answer of `follow` holds them all.
   */
  readonly onPlaces?: (id: string, places: readonly Followed[]) => void;
}

export interface FollowResult {
  /** In the order of the request. */
  readonly tracks: readonly Track[];
  /** Points that were refused at one of their keyframes: that keyframe gives no places. */
  readonly refused: readonly {
    readonly id: string;
    readonly frame: FrameIndex;
    readonly code: RefusalCode;
  }[];
}

/** Follows points in one clip, away from the page's thread. One request at a time; more wait. */
export interface Tracker {
  /** `decoder`: a worker with a decoder of its own. `sheets`: pictures cut by the server, coarser. */
  readonly kind: 'decoder' | 'sheets';
  /** Rejects with a `TrackingError`, or with the signal's reason. */
  follow(request: FollowRequest, options?: FollowOptions): Promise<FollowResult>;
  /** Looks at one place of one frame: is there a dot, can it be followed? Passes waiting requests. */
  look(frame: FrameIndex, point: FramePoint, signal?: AbortSignal): Promise<Touch>;
  /** Call on every step or scrub: following pauses until nobody stepped for `ms` (default 300). */
  giveWay(ms?: number): void;
  /** Rejects what is under way with `closed`. */
  close(): void;
}

/** A box that covers something from the frame it was drawn on, a head. */
export interface FollowedBox {
  readonly frame: FrameIndex;
  /** Never smaller than what was drawn; grows where the head is not surely known, so it fails closed. */
  readonly box: Box;
  readonly state: TrackState;
}
