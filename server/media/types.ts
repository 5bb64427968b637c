import type { FrameRate } from '#shared/timing/frame-rate.ts';
import type { Seconds } from '#shared/timing/units.ts';

/** Plain facts that leave this room. No database, no HTTP, no queue: other rooms call and keep. */

/** An exact fraction, lowest terms, `den` above 0. */
export interface Rational {
  readonly num: number;
  readonly den: number;
}

/** Width and height in whole pixels. */
export interface Size {
  readonly width: number;
  readonly height: number;
}

/** One instant, exact: `ticks × timeBase` seconds on its file's own clock. */
export interface Timestamp {
  readonly ticks: number;
  readonly timeBase: Rational;
}

/** Every shown frame's instant, ascending; the place in the list is the frame index. */
export interface FrameTable {
  /** seconds per tick */
  readonly timeBase: Rational;
  readonly ticks: readonly number[];
  /** the same instants rounded to the nearest microsecond */
  readonly us: readonly number[];
}

/** Measured from the frame table, never read from the header. Frames per second. */
export type MeasuredRate =
  | { readonly kind: 'constant'; readonly rate: FrameRate }
  | {
      readonly kind: 'variable';
      /** from the longest, the median and the shortest distance between two frames */
      readonly min: number;
      readonly median: number;
      readonly max: number;
    };

/** `pq` = SMPTE ST 2084, `hlg` = ARIB STD-B67, by the file's own tag. */
export type DynamicRange = 'standard' | 'pq' | 'hlg';

export type Container = 'mp4' | 'mov' | 'matroska' | 'webm';

/** What a clip is, by its numbers. */
export interface ClipFacts {
  readonly container: Container;
  readonly bytes: number;
  /** ffmpeg's codec name: h264, hevc, vp9, … */
  readonly codec: string;
  readonly pixelFormat: string;
  /** as stored, before rotation and pixel aspect */
  readonly coded: Size;
  /** as seen: rotation and pixel aspect applied; marks are pixels of this frame */
  readonly upright: Size;
  /** degrees clockwise that a player turns the coded picture */
  readonly rotation: 0 | 90 | 180 | 270;
  readonly pixelAspect: Rational;
  readonly dynamicRange: DynamicRange;
  readonly frameRate: MeasuredRate;
  /** frames that a player would show */
  readonly frameCount: number;
  /** from the first frame's instant to the end of the last */
  readonly duration: Seconds;
  /** the first frame's instant on the file's clock; the copies start at 0 */
  readonly startOffset: Timestamp;
  /** cover pictures beside the clip, which are left out */
  readonly attachedPictures: number;
  readonly hasSound: boolean;
}

/** The part of a clip to prepare, from its first frame on; `to` is not included. */
export interface Part {
  readonly from: Seconds;
  readonly to: Seconds;
}

export type PreparationStage = 'checking' | 'copying' | 'finishing';

export interface PreparationProgress {
  readonly stage: PreparationStage;
  /** 0–100, never falls */
  readonly percent: number;
  /** null until it can be told */
  readonly secondsLeft: number | null;
}

/** A prepared video: where it is, its size in pixels and in bytes. */
export interface PreparedCopy extends Size {
  readonly path: string;
  readonly bytes: number;
}

export interface BenchCopy extends PreparedCopy {
  /** frames from one key frame to the next; 1 = all intra */
  readonly gop: 1 | 5;
}

/** One picture holding `frames.length` thumbnails side by side. */
export interface PreviewStrip {
  readonly path: string;
  /** frame index of each thumbnail, left to right */
  readonly frames: readonly number[];
  /** of one thumbnail */
  readonly tile: Size;
}

/** A clip's copies, whole and renamed to their final names. */
export interface PreparedClip {
  readonly facts: ClipFacts;
  readonly bench: BenchCopy;
  readonly replay: PreparedCopy;
  readonly poster: { readonly path: string } & Size;
  readonly strip: PreviewStrip;
  /** read from the bench copy; starts at 0 */
  readonly frames: FrameTable;
  /** the original's own instant of frame 0; see `originalTimestamp` */
  readonly origin: Timestamp;
  /** set where only a part was asked for, or accepted after a cut */
  readonly part: Part | null;
  /** frames of the original that could not be decoded and are missing from the copies */
  readonly lostFrames: number;
}

export interface PrepareOptions {
  /** threads for decoding and for each encoder; 1 beside a web server */
  readonly threads?: number;
  /** the name it had on the sender's device; only its ending is read */
  readonly originalName?: string;
  /** prepare only this part: how a clip of more than 7,200 frames gets in */
  readonly part?: Part;
  /** use what can be decoded of a cut or damaged file, after the person agreed */
  readonly acceptRemains?: boolean;
}

export interface PrepareRequest extends PrepareOptions {
  readonly original: string;
  /** the folder that appears, whole, at the end; its parent may be made */
  readonly outDir: string;
  readonly onProgress?: (progress: PreparationProgress) => void;
  readonly signal?: AbortSignal;
}
