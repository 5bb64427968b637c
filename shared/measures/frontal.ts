import { radians, toDegrees } from '#shared/geometry/units.ts';
import type { LandmarkId, View } from '#shared/landmarks/types.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing, type Setting } from './measure.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';

interface FrontalAngle {
  readonly id: string;
  readonly label: string;
  readonly sign: string;
  readonly zero: Measure['zero'];
  readonly landmarks: readonly LandmarkId[];
  readonly views?: readonly View[];
  readonly smallestChange: number | null;
  readonly source?: string;
  /** The angle in radians; null without the lengths of the quiet stance. */
  readonly formula: (frame: LevelFrame, setting: Setting) => number | null;
}

/** A substitution seen as an angle in the frontal plane: its ± follows from its marks. */
export const frontal = ({
  id,
  label,
  sign,
  zero,
  landmarks,
  views = ['front'],
  smallestChange,
  source = 'definition; smallest change from our model, no source',
  formula,
}: FrontalAngle): Measure => ({
  id,
  label,
  unit: 'degrees',
  sign,
  views,
  landmarks: () => landmarks,
  zero,
  substitution: true,
  againstQuiet: true,
  smallestChange,
  source,
  value: (frame, setting) => {
    const { view } = setting.rig.camera;
    if (!views.includes(view)) return missing({ code: 'view-cannot-show-it', view });
    const lack = lacks(frame, landmarks);
    if (lack) return missing(lack);
    const angle = formula(frame, setting);
    if (angle === null) return missing({ code: 'no-quiet-stance' });
    const inDegrees = (each: LevelFrame): number =>
      toDegrees(radians(formula(each, setting) ?? NaN));
    return measured(toDegrees(radians(angle)), 1.96 * propagate(frame, landmarks, inDegrees));
  },
});
