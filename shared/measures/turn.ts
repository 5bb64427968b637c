import { type Degrees, degrees, radians, toDegrees } from '#shared/geometry/units.ts';
import { SYSTEMATIC } from './constants.ts';
import type { LevelFrame } from './level.ts';
import { type Measure, measured, missing, type Setting, type Value } from './measure.ts';
import type { Missing } from './missing.ts';
import { femurYaw, isYaw, pelvisYaw, turnLandmarks } from './turn-parts.ts';

/** Turn of one frame and its parts, degrees, external positive, zero at quiet stance. */
export interface Turn {
  readonly turn: Degrees;
  readonly thighPart: Degrees;
  readonly pelvisPart: Degrees;
  /** Directions of femur and pelvis, positive to the athlete's left, not zeroed. */
  readonly femurYaw: Degrees;
  readonly pelvisYaw: Degrees;
  /** Variance of this frame alone, and of the quiet stance's mean, degrees². */
  readonly variance: number;
  readonly zeroVariance: number;
  readonly thighVariance: number;
  readonly pelvisVariance: number;
  /** What of `variance` is the thigh's. */
  readonly thighFrameVariance: number;
}

const DEGREES2 = (180 / Math.PI) ** 2;
const inDegrees = (angle: number): Degrees => toDegrees(radians(angle));

export const turnOf = (frame: LevelFrame, setting: Setting): Turn | Missing => {
  if (setting.rig.camera.view !== 'front')
    return { code: 'view-cannot-show-it', view: setting.rig.camera.view };
  const femur = femurYaw(frame, setting);
  if (!isYaw(femur)) return femur;
  const pelvis = pelvisYaw(frame, setting);
  if (!isYaw(pelvis)) return pelvis;
  const zero = setting.turnZero;
  if (!zero) return { code: 'no-quiet-stance' };
  const { sigma } = setting.rig;
  const thighPart = inDegrees(sigma * (femur.yaw - zero.femur));
  const pelvisPart = inDegrees(-sigma * (pelvis.yaw - zero.pelvis));
  const variance = (femur.variance + pelvis.variance) * DEGREES2;
  if (!Number.isFinite(thighPart + pelvisPart + variance)) return { code: 'marks-coincide' };
  return {
    turn: degrees(thighPart + pelvisPart),
    thighPart,
    pelvisPart,
    femurYaw: toDegrees(femur.yaw),
    pelvisYaw: toDegrees(pelvis.yaw),
    variance,
    zeroVariance: (zero.femurVariance + zero.pelvisVariance) * DEGREES2,
    thighVariance: (femur.variance + zero.femurVariance) * DEGREES2,
    pelvisVariance: (pelvis.variance + zero.pelvisVariance) * DEGREES2,
    thighFrameVariance: femur.variance * DEGREES2,
  };
};

export const isTurn = (result: Turn | Missing): result is Turn => 'turn' in result;

/** ± of a turn beside one frame (95 %) from its variance in degrees²: the frame, the quiet stance it is counted from, the model. */
export const turnHalfWidth = (variance: number, setting: Setting): Degrees =>
  degrees(1.96 * Math.sqrt(variance + SYSTEMATIC[setting.set].u ** 2));

const pick = (
  frame: LevelFrame,
  setting: Setting,
  read: (turn: Turn) => readonly [value: number, variance: number],
): Value => {
  const turn = turnOf(frame, setting);
  if (!isTurn(turn)) return missing(turn);
  const [value, variance] = read(turn);
  return measured(value, turnHalfWidth(variance, setting));
};

const SOURCE =
  'from our model, no source; no published study of stance-hip rotation against the lifted hip was found';

export const turn: Measure = {
  id: 'turn',
  label: 'Turn of the support hip',
  unit: 'degrees',
  sign: 'plus: external rotation, the pelvis turns away from the support side over the planted thigh',
  views: ['front'],
  landmarks: turnLandmarks,
  zero: 'quiet stance',
  substitution: false,
  againstQuiet: true,
  smallestChange: null,
  source: SOURCE,
  value: (frame, setting) => pick(frame, setting, (t) => [t.turn, t.variance + t.zeroVariance]),
};

export const pelvisPart: Measure = {
  ...turn,
  id: 'pelvis-part',
  label: 'Pelvis part of the turn',
  sign: 'plus: the pelvis turns so that the support hip rotates outward',
  value: (frame, setting) => pick(frame, setting, (t) => [t.pelvisPart, t.pelvisVariance]),
};

export const thighPart: Measure = {
  ...turn,
  id: 'thigh-part',
  label: 'Thigh part of the turn',
  sign: 'plus: the planted thigh turns outward',
  value: (frame, setting) => pick(frame, setting, (t) => [t.thighPart, t.thighVariance]),
};
