import { type Degrees, degrees, radians, toDegrees } from '#shared/geometry/units.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { CONSTANTS } from './constants.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing, type Setting } from './measure.ts';
import type { Missing } from './missing.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';

export const SIDE_LANDMARKS: readonly LandmarkId[] = ['trochanter', 'knee-lateral'];
const THIGH_AND_TRUNK: readonly LandmarkId[] = ['trochanter', 'knee-lateral', 'acromion'];

/** +1 where the toes point to the image right; null where nobody said. */
export const forward = ({ rig }: Setting): 1 | -1 | null => {
  if (rig.camera.toes === null) return null;
  return rig.camera.toes === 'image-right' ? 1 : -1;
};

/** Angle of a line that hangs down from `top` against the vertical, positive towards the toes. */
export const hanging = (top: FramePoint, bottom: FramePoint, ahead: 1 | -1): Degrees =>
  toDegrees(radians(Math.atan2(ahead * (bottom.u - top.u), bottom.v - top.v)));

const thighAngle = (frame: LevelFrame, ahead: 1 | -1): number => {
  const { trochanter, 'knee-lateral': knee } = frame.marks;
  return trochanter && knee ? hanging(trochanter, knee, ahead) : NaN;
};

/** Forward lean of trochanter → acromion. */
const trunkLean = (frame: LevelFrame, ahead: 1 | -1): number => {
  const { trochanter, acromion } = frame.marks;
  return trochanter && acromion ? -1 * hanging(acromion, trochanter, ahead) : NaN;
};

const quietMean = (setting: Setting, read: (frame: LevelFrame) => number): number | null => {
  const values = setting.reference.frames.map(read).filter(Number.isFinite);
  return values.length < 3 ? null : values.reduce((a, b) => a + b, 0) / values.length;
};

/** Elevation of the thigh the side camera sees, degrees, minus its quiet mean. */
export const sideLift = (frame: LevelFrame, setting: Setting): Degrees | Missing => {
  const lack = lacks(frame, SIDE_LANDMARKS);
  if (lack) return lack;
  const ahead = forward(setting);
  if (ahead === null) return { code: 'toe-direction-missing' };
  const quiet = quietMean(setting, (each) => thighAngle(each, ahead));
  if (quiet === null) return { code: 'no-quiet-stance' };
  const lift = degrees(thighAngle(frame, ahead) - quiet);
  return Number.isFinite(lift) ? lift : { code: 'marks-coincide' };
};

export const sideLiftHalfWidth = (frame: LevelFrame, setting: Setting): Degrees => {
  const ahead = forward(setting) ?? 1;
  const spread = propagate(frame, SIDE_LANDMARKS, (each) => thighAngle(each, ahead));
  return degrees(Math.hypot(1.96 * spread, CONSTANTS.liftModelError.value));
};

export const thighAgainstTrunk: Measure = {
  id: 'thigh-against-trunk',
  label: 'Thigh against trunk',
  unit: 'degrees',
  sign: 'plus: the thigh is nearer to the trunk than in a straight line',
  views: ['lifted-side', 'support-side'],
  landmarks: () => THIGH_AND_TRUNK,
  zero: 'straight leg',
  substitution: false,
  againstQuiet: true,
  smallestChange: null,
  source: 'definition',
  value: (frame, setting) => {
    const lack = lacks(frame, THIGH_AND_TRUNK);
    if (lack) return missing(lack);
    const ahead = forward(setting);
    if (ahead === null) return missing({ code: 'toe-direction-missing' });
    const formula = (each: LevelFrame): number => thighAngle(each, ahead) + trunkLean(each, ahead);
    return measured(formula(frame), 1.96 * propagate(frame, THIGH_AND_TRUNK, formula));
  },
};
