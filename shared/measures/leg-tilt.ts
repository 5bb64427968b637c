import { type Radians, radians } from '#shared/geometry/units.ts';
import type { FramePoint } from '#shared/geometry/points.ts';

/**
 * Lean of a leg segment in the frontal plane, radians, positive where its lower end lies nearer to
 * the midline than its upper one.
 */
export const legTilt = (upper: FramePoint, lower: FramePoint, sigma: number): Radians =>
  radians(sigma * Math.atan2(upper.u - lower.u, lower.v - upper.v));
