import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';

/** How much of the clip has arrived; it only grows. Bytes are null where the browser hides them. */
export interface LoadProgress {
  /** 0 to 1. */
  readonly share: number;
  readonly loadedBytes: number | null;
  readonly totalBytes: number | null;
}

/** Sheets of JPEG tiles, cut by the server for browsers without a video decoder of their own. */
export interface SheetLayout {
  /** Address of sheet `n`, from 0. */
  readonly sheetUrl: (n: number) => string;
  readonly framesPerSheet: number;
  /** Tiles per row; the tiles run left to right, then down, in the order of the frames. */
  readonly columns: number;
  /** Size of one tile, pixels. */
  readonly tileWidth: number;
  readonly tileHeight: number;
}

export interface ClipSource {
  /** Address of the prepared bench copy; the server answers ranges. */
  readonly url: string;
  /** One time per frame of the copy, strictly rising, as `shared/timing` keeps them. */
  readonly frameTable: readonly Milliseconds[];
  /** Size of the copy's picture, pixels, upright. */
  readonly width: number;
  readonly height: number;
  /** Where the server can cut sheets. */
  readonly sheets?: SheetLayout;
}

/** Pixels of one frame, held until evicted; paint it through a `CanvasPainter`. */
export interface Picture {
  readonly index: FrameIndex;
  /** Pixels. */
  readonly width: number;
  readonly height: number;
  /** Memory that the picture holds. */
  readonly bytes: number;
  /** False where the browser had no means to tell which frame it showed. */
  readonly verified: boolean;
  /**
   * Draws at 0,0 in the picture's own size. Asynchronous where pixels must be converted first:
   * only a `CanvasPainter` keeps the order when several are under way. `current` is asked just
   * before the pixels go to the canvas; where it says no, nothing is drawn and the answer is false.
   */
  paint(context: CanvasRenderingContext2D, current: () => boolean): Promise<boolean>;
}

/** `step`: the neighbours will be wanted next, so prefetch them. `scrub`: only this one. */
export type FrameIntent = 'step' | 'scrub';

export interface FrameRequest {
  readonly signal?: AbortSignal;
  /** Default: `step` where the frame is next to the one asked for before, else `scrub`. */
  readonly intent?: FrameIntent;
}

export type FrameSourceKind = 'decoder' | 'sheets' | 'video-element';

export interface FrameSource {
  readonly kind: FrameSourceKind;
  readonly frameCount: number;
  readonly width: number;
  readonly height: number;
  readonly frameTable: readonly Milliseconds[];
  /**
   * The picture of exactly this frame.
   * Rejects with a `VideoError`, or with the signal's reason where it was aborted.
   */
  frame(index: FrameIndex, request?: FrameRequest): Promise<Picture>;
  /** True where `frame` would answer without decoding or loading. */
  holds(index: FrameIndex): boolean;
  /** Calls back at once with what is known, then on every change; the answer stops it. */
  onProgress(listener: (progress: LoadProgress) => void): () => void;
  close(): void;
}
