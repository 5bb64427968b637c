import { clamp, type Radians, radians } from '#shared/geometry/units.ts';
import { CONSTANTS } from './constants.ts';

/**
 * Direction, seen from above, of a segment whose near end points at the camera. Positive: its near
 * end points to the athlete's left. All lengths in px; `focal` = distance/scale, px; `centre` = u of
 * the image centre.
 *
 * The root and the arc tangent undo perspective: the same stick looks turned where it stands beside
 * the lens axis.
 */
export const yaw = (
  uFar: number,
  uNear: number,
  length: number,
  focal: number,
  centre: number,
): Radians => {
  const t = (uNear - centre) / focal;
  const limit = CONSTANTS.sineLimit.value;
  const sine = clamp((uNear - uFar) / (length * Math.sqrt(1 + t * t)), -limit, limit);
  return radians(Math.asin(sine) - Math.atan(t));
};

/** Square of the length that an error across the picture is divided by, floored, px². */
export const yawLever = (
  angle: Radians,
  uNear: number,
  length: number,
  focal: number,
  centre: number,
): number => {
  const cosine = Math.cos(angle + Math.atan((uNear - centre) / focal));
  return (length * Math.max(cosine, CONSTANTS.cosineFloor.value)) ** 2;
};

/**
 * Size of a turn from how much narrower a known width looks. Its sign is unknown and it is blind
 * near zero, so it is at most a note. A width that looks wider than it is gives 0 with a note.
 */
export const turnFromWidth = (
  seen: number,
  known: number,
): { readonly size: Radians; readonly wider: boolean } | null => {
  const ratio = seen / known;
  if (!Number.isFinite(ratio) || ratio < 0) return null;
  return { size: radians(Math.acos(Math.min(ratio, 1))), wider: ratio > 1 };
};
