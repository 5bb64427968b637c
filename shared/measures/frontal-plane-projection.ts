import { frontal } from './frontal.ts';
import { hipCentre } from './hip-centre.ts';
import { legTilt } from './leg-tilt.ts';

/**
 * Femur tilt less shank tilt. A measure of the knee in the picture, not of hip rotation. Others'
 * smallest detectable difference: 7.5–8.9° (Munro 2012, J Sport Rehabil 21:7–11, seen).
 */
export const frontalPlaneProjection = frontal({
  id: 'frontal-plane-projection',
  label: 'Knee in the frontal plane (FPPA)',
  sign: 'plus: valgus, the knee lies inward of the line from hip to ankle',
  zero: 'straight leg',
  landmarks: ['asis-support', 'asis-lifted', 'kneecap', 'ankle-support'],
  smallestChange: 5,
  formula: ({ marks }, { rig, reference }) => {
    const { 'asis-support': support, 'asis-lifted': lifted, kneecap } = marks;
    const ankle = marks['ankle-support'];
    if (!support || !lifted || !kneecap || !ankle || reference.width === null) return null;
    const hip = hipCentre(support, lifted, reference.width);
    return legTilt(hip, kneecap, rig.sigma) - legTilt(kneecap, ankle, rig.sigma);
  },
});
