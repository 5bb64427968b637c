import type { FramePoint } from '#shared/geometry/points.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import type { TrackingErrorCode } from '../errors.ts';
import type { Followed, FollowProgress, FollowRequest, FollowResult, Touch } from '../types.ts';

/** A clip as it can be sent to a worker. */
export interface SentClip {
  /** Absolute: a worker's own address is another than the page's. */
  readonly url: string;
  readonly frameTable: readonly Milliseconds[];
}

export interface SentPicture {
  readonly luma: Uint8Array<ArrayBuffer>;
  readonly width: number;
  readonly height: number;
}

/** `n` numbers the requests. */
export type ToWorker =
  | {
      readonly do: 'open';
      /** Null: the page feeds pictures when they are needed. */
      readonly clip: SentClip | null;
      readonly frameCount: number;
      readonly sourceWidth: number;
      readonly sourceHeight: number;
    }
  | { readonly do: 'follow'; readonly n: number; readonly request: FollowRequest }
  | {
      readonly do: 'look';
      readonly n: number;
      readonly frame: FrameIndex;
      readonly point: FramePoint;
    }
  | { readonly do: 'cancel'; readonly n: number }
  | { readonly do: 'give-way'; readonly ms: number }
  | { readonly do: 'take'; readonly frame: FrameIndex; readonly picture: SentPicture }
  | {
      readonly do: 'do-without';
      readonly frame: FrameIndex;
      readonly code: TrackingErrorCode;
      readonly detail: string;
    };

export type FromWorker =
  | { readonly say: 'opened' }
  | { readonly say: 'progress'; readonly n: number; readonly progress: FollowProgress }
  | {
      readonly say: 'places';
      readonly n: number;
      readonly id: string;
      readonly places: readonly Followed[];
    }
  | { readonly say: 'followed'; readonly n: number; readonly result: FollowResult }
  | { readonly say: 'looked'; readonly n: number; readonly touch: Touch }
  | {
      readonly say: 'failed';
      /** Null: opening failed. */
      readonly n: number | null;
      readonly code: TrackingErrorCode;
      readonly detail: string;
    }
  | { readonly say: 'need'; readonly frame: FrameIndex };
