import type { LandmarkId } from '#shared/landmarks/types.ts';
import { hipCentre } from './hip-centre.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing, type Setting } from './measure.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';

const LANDMARKS: readonly LandmarkId[] = ['asis-support', 'asis-lifted', 'lifted-knee'];

const drift = ({ marks }: LevelFrame, { rig }: Setting, width: number): number => {
  const { 'asis-support': support, 'asis-lifted': lifted, 'lifted-knee': knee } = marks;
  if (!support || !lifted || !knee) return NaN;
  return rig.sigma * rig.mmPerPx * (knee.u - hipCentre(lifted, support, width).u);
};

export const liftedKneeDrift: Measure = {
  id: 'lifted-knee-drift',
  label: 'Drift of the lifted knee',
  unit: 'millimetres',
  sign: 'plus: the knee drifts across, towards the support side; minus: away',
  views: ['front'],
  landmarks: () => LANDMARKS,
  zero: 'straight ahead',
  substitution: true,
  againstQuiet: true,
  smallestChange: null,
  source: 'definition',
  value: (frame, setting) => {
    const { view } = setting.rig.camera;
    if (view !== 'front') return missing({ code: 'view-cannot-show-it', view });
    const lack = lacks(frame, LANDMARKS);
    if (lack) return missing(lack);
    const { width } = setting.reference;
    if (width === null) return missing({ code: 'no-quiet-stance' });
    const formula = (each: LevelFrame): number => drift(each, setting, width);
    return measured(formula(frame), 1.96 * propagate(frame, LANDMARKS, formula));
  },
};
