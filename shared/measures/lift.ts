import { type Degrees, degrees, toDegrees } from '#shared/geometry/units.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { CONSTANTS } from './constants.ts';
import { normalDraws } from './draws.ts';
import { hipCentre } from './hip-centre.ts';
import type { LevelFrame } from './level.ts';
import { liftFromHeights } from './lift-formula.ts';
import { sideLift, sideLiftHalfWidth, SIDE_LANDMARKS } from './lift-from-side.ts';
import { type Measure, measured, missing, type Setting, type Value } from './measure.ts';
import type { Missing } from './missing.ts';
import { lacks } from './need.ts';
import { propagate } from './propagate.ts';
import { tiedLiftAt, tiedUncertainty } from './tied-lift.ts';

const FRONT_LANDMARKS: readonly LandmarkId[] = ['asis-support', 'asis-lifted', 'lifted-knee'];
const DRAWS = 200;
const PER_DRAW = 5;
const SEED = 6090;

/** Lift of one frame of a front clip, degrees, numeric also where it is too low to be shown. */
const frontLift = (frame: LevelFrame, { rig, reference }: Setting): Degrees | Missing => {
  const lack = lacks(frame, FRONT_LANDMARKS);
  if (lack) return lack;
  const { 'asis-support': support, 'asis-lifted': lifted, 'lifted-knee': knee } = frame.marks;
  const { width, thigh, horizon } = reference;
  if (width === null || thigh === null || horizon === null) return { code: 'no-quiet-stance' };
  if (!support || !lifted || !knee) return { code: 'marks-coincide' };
  const hip = hipCentre(lifted, support, width);
  const lift = toDegrees(liftFromHeights(knee.v, hip.v, thigh, horizon, rig.focal));
  return Number.isFinite(lift) ? lift : { code: 'marks-coincide' };
};

/** Lift of one frame in the view of its clip, degrees; or why there is none. */
export const liftOf = (frame: LevelFrame, setting: Setting): Degrees | Missing => {
  const { view } = setting.rig.camera;
  if (setting.tiedLift)
    return tiedLiftAt(setting.tiedLift, frame.time)?.lift ?? { code: 'not-in-side-clip' };
  if (view === 'front') return frontLift(frame, setting);
  if (view === 'back') return { code: 'view-cannot-show-it', view };
  return sideLift(frame, setting);
};

/** Deviates of every draw: the same for each frame, so that a dragged mark moves its ± smoothly. */
const deviates = ((): Float64Array => {
  const next = normalDraws(SEED);
  return Float64Array.from({ length: DRAWS * PER_DRAW }, next);
})();

/** Standard deviation of lift from the random errors of the frame's marks, degrees. */
const liftSpread = (frame: LevelFrame, { rig, reference }: Setting): number => {
  const { 'asis-support': support, 'asis-lifted': lifted, 'lifted-knee': knee } = frame.marks;
  const { width, thigh, horizon } = reference;
  if (!support || !lifted || !knee || width === null || thigh === null || horizon === null)
    return NaN;
  let mean = 0;
  let squares = 0;
  for (let n = 0; n < DRAWS; n += 1) {
    const z = (k: number): number => deviates[n * PER_DRAW + k] ?? NaN;
    const hip = hipCentre(
      { u: lifted.u + lifted.error * z(0), v: lifted.v + lifted.error * z(1) },
      { u: support.u + support.error * z(2), v: support.v + support.error * z(3) },
      width,
    );
    const kneeV = knee.v + knee.error * z(4);
    const lift = toDegrees(liftFromHeights(kneeV, hip.v, thigh, horizon, rig.focal));
    const away = lift - mean;
    mean += away / (n + 1);
    squares += away * (lift - mean);
  }
  return Math.sqrt(squares / (DRAWS - 1));
};

/**
 * Standard uncertainty of lift from the random errors of its marks, for small errors, degrees. Of a tied lift
 * without the error of the tie, which all frames of the rep share.
 */
export const liftUncertainty = (frame: LevelFrame, setting: Setting): number => {
  if (setting.tiedLift) return tiedLiftAt(setting.tiedLift, frame.time)?.u ?? NaN;
  const ids = setting.rig.camera.view === 'front' ? FRONT_LANDMARKS : SIDE_LANDMARKS;
  return propagate(frame, ids, (moved) => {
    const lift = liftOf(moved, setting);
    return typeof lift === 'number' ? lift : NaN;
  });
};

/** ± of lift beside one frame (95 %): marks, and the model with or without the lens height. */
export const liftHalfWidth = (frame: LevelFrame, setting: Setting): Degrees => {
  if (setting.tiedLift) {
    const tied = tiedLiftAt(setting.tiedLift, frame.time);
    const u = tied ? tiedUncertainty(tied) : NaN;
    return degrees(Math.hypot(1.96 * u, CONSTANTS.liftModelError.value));
  }
  if (setting.rig.camera.view !== 'front') return sideLiftHalfWidth(frame, setting);
  const model =
    setting.rig.lensHeightMm === null
      ? CONSTANTS.liftModelErrorNoLens.value
      : CONSTANTS.liftModelError.value;
  return degrees(Math.hypot(1.96 * liftSpread(frame, setting), model));
};

const value = (frame: LevelFrame, setting: Setting): Value => {
  const lift = liftOf(frame, setting);
  return typeof lift === 'number' ? measured(lift, liftHalfWidth(frame, setting)) : missing(lift);
};

export const lift: Measure = {
  id: 'lift',
  label: 'Lift of the thigh',
  unit: 'degrees',
  sign: 'plus: the lifted thigh rises forward from the vertical',
  views: ['front', 'lifted-side', 'support-side'],
  landmarks: (_set, view) => (view === 'front' ? FRONT_LANDMARKS : SIDE_LANDMARKS),
  zero: 'quiet stance',
  substitution: false,
  againstQuiet: true,
  smallestChange: null,
  source: 'from our model, no source',
  value,
};
