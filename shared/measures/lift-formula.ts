import { clamp, type Radians, radians } from '#shared/geometry/units.ts';

/**
 * Elevation of the lifted thigh from the vertical, front view, from heights in the picture (px).
 * `thigh` is hip centre to knee down the picture at quiet stance. A knee above or below the lens
 * is seen from below or above: the arc tangent undoes that, the root how much nearer it came.
 */
export const liftFromHeights = (
  vKnee: number,
  vHip: number,
  thigh: number,
  horizon: number,
  focal: number,
): Radians => {
  const t = (vKnee - horizon) / focal;
  const cosine = clamp((vKnee - vHip) / (thigh * Math.sqrt(1 + t * t)), -1, 1);
  return radians(Math.acos(cosine) + Math.atan(t));
};
