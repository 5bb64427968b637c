import { toDegrees, radians } from '#shared/geometry/units.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { forward, hanging } from './lift-from-side.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing } from './measure.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';

const PELVIS: readonly LandmarkId[] = ['asis', 'psis'];
const PELVIS_AND_THIGH: readonly LandmarkId[] = [...PELVIS, 'trochanter', 'knee-lateral'];

/** Slope of PSIS → ASIS, degrees, positive where the front is lower. */
const tilt = ({ marks: { asis, psis } }: LevelFrame): number =>
  asis && psis ? toDegrees(radians(Math.atan2(asis.v - psis.v, Math.abs(asis.u - psis.u)))) : NaN;

export const pelvicTilt: Measure = {
  id: 'pelvic-tilt',
  label: 'Pelvic tilt',
  unit: 'degrees',
  sign: 'plus: forward, the front of the pelvis is lower',
  views: ['support-side'],
  landmarks: () => PELVIS,
  zero: 'horizontal',
  substitution: true,
  againstQuiet: true,
  smallestChange: null,
  source: 'definition',
  value: (frame, { rig }) => {
    const { view } = rig.camera;
    if (view !== 'support-side') return missing({ code: 'view-cannot-show-it', view });
    const lack = lacks(frame, PELVIS);
    if (lack) return missing(lack);
    return measured(tilt(frame), 1.96 * propagate(frame, PELVIS, tilt));
  },
};

export const supportHipExtension: Measure = {
  ...pelvicTilt,
  id: 'support-hip-extension',
  label: 'Extension of the support hip',
  sign: 'plus: extension, the planted thigh lies further back against the pelvis',
  zero: 'straight leg',
  landmarks: () => PELVIS_AND_THIGH,
  value: (frame, setting) => {
    const { view } = setting.rig.camera;
    if (view !== 'support-side') return missing({ code: 'view-cannot-show-it', view });
    const lack = lacks(frame, PELVIS_AND_THIGH);
    if (lack) return missing(lack);
    const ahead = forward(setting);
    if (ahead === null) return missing({ code: 'toe-direction-missing' });
    const formula = (each: LevelFrame): number => {
      const { trochanter, 'knee-lateral': knee } = each.marks;
      return trochanter && knee ? -1 * hanging(trochanter, knee, ahead) - tilt(each) : NaN;
    };
    return measured(formula(frame), 1.96 * propagate(frame, PELVIS_AND_THIGH, formula));
  },
};
