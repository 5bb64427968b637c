import { radians, toDegrees } from '#shared/geometry/units.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing, type Setting } from './measure.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';
import { yaw } from './yaw.ts';

const LANDMARKS: readonly LandmarkId[] = ['ankle-support', 'toe-support'];

const turnOut = ({ marks }: LevelFrame, { rig }: Setting, length: number): number => {
  const { 'ankle-support': ankle, 'toe-support': toe } = marks;
  if (!ankle || !toe) return NaN;
  return rig.sigma * toDegrees(radians(yaw(ankle.u, toe.u, length, rig.focal, rig.centre)));
};

export const footTurnOut: Measure = {
  id: 'foot-turn-out',
  label: 'Turn-out of the support foot',
  unit: 'degrees',
  sign: 'plus: the toes point away from the midline',
  views: ['front'],
  landmarks: () => LANDMARKS,
  zero: 'straight ahead',
  substitution: true,
  againstQuiet: true,
  smallestChange: 4,
  source: 'from our model, no source',
  value: (frame, setting) => {
    const { view } = setting.rig.camera;
    if (view !== 'front') return missing({ code: 'view-cannot-show-it', view });
    const length = setting.rig.footPx;
    if (length === null) return missing({ code: 'body-height-missing' });
    const lack = lacks(frame, LANDMARKS);
    if (lack) return missing(lack);
    const formula = (each: LevelFrame): number => turnOut(each, setting, length);
    return measured(formula(frame), 1.96 * propagate(frame, LANDMARKS, formula));
  },
};
