import { framePoint, rotateAbout } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import { landmark } from '#shared/landmarks/table.ts';
import {
  type ErrorClass,
  LANDMARK_IDS,
  type LandmarkId,
  type PlacedMark,
} from '#shared/landmarks/types.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { CONSTANTS } from './constants.ts';
import type { CameraInput, FrameInput, MarkError } from './inputs.ts';

/** A mark made ready for the formulas: level, seen as from the front, with its random error. */
export interface LevelMark {
  readonly u: number;
  readonly v: number;
  /** Standard deviation of each coordinate from frame to frame, px of the source. */
  readonly error: number;
  /** Tracked and not looked at. */
  readonly hollow: boolean;
}

export interface LevelFrame {
  readonly frame: FrameIndex;
  readonly time: Milliseconds;
  readonly marks: Readonly<Partial<Record<LandmarkId, LevelMark>>>;
  readonly hidden: readonly LandmarkId[];
}

const classError = (errorClass: ErrorClass, error: MarkError): number => {
  switch (errorClass) {
    case 'anatomical':
      return error.anatomicalPx;
    case 'outline':
      return error.anatomicalPx * CONSTANTS.outlineFactor.value;
    case 'pointer':
      return CONSTANTS.pointerError.value;
  }
};

/** Random error of one mark, px: its class, the picture it was placed on, and who placed it. */
export const markErrorPx = (id: LandmarkId, mark: PlacedMark, error: MarkError): number =>
  CONSTANTS.randomPart.value *
  classError(landmark(id).errorClass, error) *
  Math.max(1, mark.scale) *
  (mark.source === 'tracked' ? CONSTANTS.trackedFactor.value : 1);

/** Far outside any picture, or placed on one a thousand times coarser: a fault, not a mark. */
const FURTHEST_PX = 1e6;
const COARSEST = 1000;

/** False for a mark that no picture can hold: not a number, or absurdly far. */
export const isPlausible = ({ point, scale }: PlacedMark): boolean =>
  Math.abs(point.u) <= FURTHEST_PX &&
  Math.abs(point.v) <= FURTHEST_PX &&
  Math.abs(scale) <= COARSEST;

/**
 * Rotates the marks of a frame so that the plumb line is vertical, turns a mirrored picture back, and
 * mirrors one taken from behind: each negates every u difference, both together leave it. Marks that
 * no picture can hold are left out.
 */
export const levelFrame = (
  input: FrameInput,
  camera: CameraInput,
  error: MarkError,
): LevelFrame => {
  const centre = framePoint(camera.width / 2, camera.height / 2);
  const tilt = camera.plumbTilt ?? degrees(0);
  const flip = (camera.view === 'back') !== (camera.mirrored === true);
  const marks: Partial<Record<LandmarkId, LevelMark>> = {};
  const hidden: LandmarkId[] = [];
  for (const id of LANDMARK_IDS) {
    const mark = input.marks[id];
    if (!mark) continue;
    if (mark.hidden) {
      hidden.push(id);
      continue;
    }
    const point = tilt === 0 ? mark.point : rotateAbout(mark.point, centre, tilt);
    const scaled = markErrorPx(id, mark, error);
    if (!Number.isFinite(point.u) || !Number.isFinite(point.v) || !Number.isFinite(scaled))
      continue;
    marks[id] = {
      u: flip ? camera.width - point.u : point.u,
      v: point.v,
      error: markErrorPx(id, mark, error),
      hollow: mark.source === 'tracked' && !mark.looked,
    };
  }
  return { frame: input.frame, time: input.time, marks, hidden };
};
