import { midpoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { hipMiddle } from './hip-centre.ts';
import { frontal } from './frontal.ts';

const LANDMARKS: readonly LandmarkId[] = [
  'asis-support',
  'asis-lifted',
  'acromion-support',
  'acromion-lifted',
];

/** Middle of the hip centres to the middle of the shoulder corners, against the vertical. */
export const trunkSideBend = frontal({
  id: 'trunk-side-bend',
  label: 'Trunk side-bend',
  sign: 'plus: the trunk leans to the support side',
  zero: 'vertical',
  landmarks: LANDMARKS,
  smallestChange: 2.5,
  formula: ({ marks }, { rig, reference }) => {
    const { 'asis-support': s, 'asis-lifted': l } = marks;
    const { 'acromion-support': as, 'acromion-lifted': al } = marks;
    if (!s || !l || !as || !al || reference.width === null) return null;
    const hips = hipMiddle(l, s, reference.width);
    const shoulders = midpoint(as, al);
    return rig.sigma * Math.atan2(shoulders.u - hips.u, hips.v - shoulders.v);
  },
});
