import {
  distance,
  framePoint,
  type FramePoint,
  midpoint,
  rotateAbout,
} from '#shared/geometry/points.ts';
import { type Degrees, degrees, radians, toDegrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from './constants.ts';
import type { CameraInput } from './inputs.ts';

/** How far the lens stood from dead front, and the standard uncertainty of that. */
export interface OffFront {
  /** Positive: the lens stood to the image right of dead front. */
  readonly by: Degrees;
  readonly u: Degrees;
}

/** Shorter than this, px, or steeper than 45° in the picture, two points are no line across the floor. */
const SHORTEST_PX = 20;

/**
 * The angle between straight ahead of someone whose heels stand on a floor line and the way to the
 * lens, from two touches on that line. A level camera at a known height and distance sees each point of
 * the floor at one place only: the farther one lies higher in the picture. Null where the scale, the
 * distance or the lens height is not known, or the touches are no line across the floor.
 */
export const offFrontOf = (
  line: { readonly a: FramePoint; readonly b: FramePoint },
  camera: Pick<
    CameraInput,
    'width' | 'height' | 'mmPerPx' | 'distanceMm' | 'lensHeightMm' | 'plumbTilt'
  >,
): OffFront | null => {
  const { mmPerPx, distanceMm, lensHeightMm, plumbTilt } = camera;
  if (mmPerPx === null || distanceMm === null || lensHeightMm === null || lensHeightMm <= 0)
    return null;
  const centre = framePoint(camera.width / 2, camera.height / 2);
  const level = (point: FramePoint) =>
    plumbTilt === null ? point : rotateAbout(point, centre, plumbTilt);
  const ends = [level(line.a), level(line.b)].sort((a, b) => a.u - b.u);
  const [left, right] = ends;
  if (!left || !right) return null;
  const across = right.u - left.u;
  if (across < SHORTEST_PX || Math.abs(right.v - left.v) > across) return null;

  const focal = distanceMm / mmPerPx;
  const middle = midpoint(left, right);
  const horizon = middle.v - lensHeightMm / mmPerPx;
  const onFloor = ({ u, v }: FramePoint) => {
    const depth = (focal * lensHeightMm) / (v - horizon);
    return { across: (depth * (u - centre.u)) / focal, depth };
  };
  if (left.v <= horizon || right.v <= horizon) return null;
  const [from, to] = [onFloor(left), onFloor(right)];
  const ahead = Math.atan2(to.depth - from.depth, to.across - from.across);
  const toLens = Math.atan2(-(middle.u - centre.u), focal);
  const slopeError =
    (Math.SQRT2 * CONSTANTS.randomPart.value * CONSTANTS.anatomicalError.value) /
    distance(left, right);
  return {
    by: toDegrees(radians(toLens - ahead)),
    u: degrees(toDegrees(radians((slopeError * distanceMm * Math.cos(ahead) ** 2) / lensHeightMm))),
  };
};
