import { distance, type FramePoint } from './points.ts';
import { type Degrees, degrees, radians, toDegrees } from './units.ts';

/**
 * Angle of a line against the horizontal of the picture, 0° to 180°, the same in both directions:
 * counted from the image right, positive with the upper end to the right. Null of a single point.
 */
export const fromHorizontal = (a: FramePoint, b: FramePoint): Degrees | null => {
  if (!(distance(a, b) > 0)) return null;
  const angle = toDegrees(radians(Math.atan2(a.v - b.v, b.u - a.u)));
  return degrees((angle + 360) % 180);
};

/** Inner angle at a joint between its two neighbours, 0° to 180°. Null where points coincide. */
export const jointAngle = (
  above: FramePoint,
  joint: FramePoint,
  below: FramePoint,
): Degrees | null => {
  const a = { u: above.u - joint.u, v: above.v - joint.v };
  const b = { u: below.u - joint.u, v: below.v - joint.v };
  const cross = a.u * b.v - a.v * b.u;
  const along = a.u * b.u + a.v * b.v;
  if (!Number.isFinite(cross + along) || Math.hypot(a.u, a.v) * Math.hypot(b.u, b.v) === 0)
    return null;
  return toDegrees(radians(Math.atan2(Math.abs(cross), along)));
};

/**
 * Standard deviation of a joint angle from one error on every coordinate, px, by propagation:
 * the two ends turn their segments, the joint turns both. Lengths in px.
 */
export const jointAngleSpread = (
  lengthA: number,
  lengthB: number,
  angle: Degrees,
  errorPx: number,
): Degrees => {
  const a = 1 / lengthA;
  const b = 1 / lengthB;
  const ends = a * a + b * b;
  const joint = ends - 2 * a * b * Math.cos((angle * Math.PI) / 180);
  return toDegrees(radians(errorPx * Math.sqrt(ends + joint)));
};
