import type { FramePoint } from '#shared/geometry/points.ts';
import { type Radians, radians } from '#shared/geometry/units.ts';
import { frontal } from './frontal.ts';

/** Slope of the ASIS line, radians, positive where the lifted side is higher. */
export const obliquity = (support: FramePoint, lifted: FramePoint): Radians =>
  radians(Math.atan2(support.v - lifted.v, Math.abs(support.u - lifted.u)));

export const pelvicObliquity = frontal({
  id: 'pelvic-obliquity',
  label: 'Pelvic obliquity',
  sign: 'plus: hike, the lifted side of the pelvis is higher',
  zero: 'horizontal',
  landmarks: ['asis-support', 'asis-lifted'],
  smallestChange: 4,
  formula: ({ marks }) => {
    const { 'asis-support': support, 'asis-lifted': lifted } = marks;
    return support && lifted ? obliquity(support, lifted) : null;
  },
});
