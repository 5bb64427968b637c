import { type Degrees, radians, toDegrees } from './units.ts';

/** Rows of a rotation matrix. */
export type Rotation = readonly [
  readonly [number, number, number],
  readonly [number, number, number],
  readonly [number, number, number],
];

export interface HipAngles {
  readonly flexion: Degrees;
  readonly adduction: Degrees;
  readonly internalRotation: Degrees;
}

/**
 * Angles of a right hip from femur against pelvis, R = Rz(flexion)·Rx(adduction)·Ry(internal), in
 * the axes of Wu et al. 2002 (J Biomech 35:543–548): x forward, y up, z to the right. Our external
 * rotation is its internal rotation with the other sign.
 */
export const rightHipAngles = (r: Rotation): HipAngles => ({
  flexion: toDegrees(radians(Math.atan2(-r[0][1], r[1][1]))),
  adduction: toDegrees(radians(Math.asin(Math.min(1, Math.max(-1, r[2][1]))))),
  internalRotation: toDegrees(radians(Math.atan2(-r[2][0], r[2][2]))),
});
