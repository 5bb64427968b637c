import type { Degrees } from '#shared/geometry/units.ts';
import type { Marks, View } from '#shared/landmarks/types.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';

/** One marked frame. A landmark that was never marked is absent; a covered one is hidden. */
export interface FrameInput {
  readonly frame: FrameIndex;
  readonly time: Milliseconds;
  readonly marks: Marks;
}

/** What is known of one clip's camera and of the sticks. Null is unknown and never guessed. */
export interface CameraInput {
  readonly view: View;
  /** Upright source frame, pixels. */
  readonly width: number;
  readonly height: number;
  /** Millimetres per source pixel where the athlete stands. */
  readonly mmPerPx: number | null;
  /** Lens to athlete. */
  readonly distanceMm: number | null;
  /** Lens above the floor. Without it lift is ± 7° instead of ± 2°. */
  readonly lensHeightMm: number | null;
  /** ASIS line to the tip of the belt pointer. */
  readonly beltPointerMm: number | null;
  /** Femur axis to the tip of the thigh pointer: see `thighPointerFromSkin`. */
  readonly thighPointerMm: number | null;
  /** Lean of a plumb line in the picture, positive with its lower end to the right. */
  readonly plumbTilt: Degrees | null;
  /** For warnings only. */
  readonly framesPerSecond: number | null;
  /** A selfie camera's picture, left and right swapped: its marks are turned back first. */
  readonly mirrored: boolean | null;
  /** Angle between straight ahead of the athlete and the way to the lens, where a floor line shows it. */
  readonly offFront: Degrees | null;
  readonly exposureMs: number | null;
  /** How far one exposure drew out a dot, px, where somebody measured it on the picture. */
  readonly smearPx?: number;
  /** Side views only: which way the toes point in the picture, a mirrored one turned back. */
  readonly toes: 'image-left' | 'image-right' | null;
}

/** What is known of the person, for measures that need it. */
export interface AthleteInput {
  readonly bodyHeightMm: number | null;
}

/** Typical error of one anatomical mark, px of the source: 3 until the coach's own is known. */
export interface MarkError {
  readonly anatomicalPx: number;
  /** Frames marked twice it rests on; 0 for the assumed 3 px. */
  readonly doublyMarkedFrames: number;
}

export const ASSUMED_MARK_ERROR: MarkError = { anatomicalPx: 3, doublyMarkedFrames: 0 };
