import { frontal } from './frontal.ts';
import { hipCentre } from './hip-centre.ts';
import { legTilt } from './leg-tilt.ts';
import { obliquity } from './pelvic-obliquity.ts';

/** Femur against pelvis: tilt of hip centre → knee-cap less the obliquity. */
export const supportHipAdduction = frontal({
  id: 'support-hip-adduction',
  label: 'Adduction of the support hip',
  sign: 'plus: adduction, the thigh leans inward under the pelvis or the lifted side drops',
  zero: 'straight leg',
  landmarks: ['asis-support', 'asis-lifted', 'kneecap'],
  smallestChange: 5.5,
  formula: ({ marks }, { rig, reference }) => {
    const { 'asis-support': support, 'asis-lifted': lifted, kneecap } = marks;
    if (!support || !lifted || !kneecap || reference.width === null) return null;
    const hip = hipCentre(support, lifted, reference.width);
    return legTilt(hip, kneecap, rig.sigma) - obliquity(support, lifted);
  },
});
