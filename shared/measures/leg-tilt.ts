import type { FramePoint } from '#shared/geometry/points.ts';

/**
 * Lean of a leg segment in the frontal plane, radians, positive where its lower end lies nearer to
 * the midline than its upper one.
 */
export const legTilt = (upper: FramePoint, lower: FramePoint, sigma: number): number =>
  sigma * Math.atan2(upper.u - lower.u, lower.v - upper.v);
