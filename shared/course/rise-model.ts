import { CONSTANTS } from '#shared/measures/constants.ts';
import { liftFromHeights } from '#shared/measures/lift-formula.ts';
import { yaw } from '#shared/measures/yaw.ts';
import { COORDINATES as AT, type RiseData } from './rise-data.ts';
import { fitter, TERMS } from './rise-fit.ts';

/** Coefficients of one fit: four of the thigh part, four of the pelvis part. */
export const COEFFICIENTS = 2 * TERMS;

const INWARD = CONSTANTS.hipInward.value;
const BELOW = CONSTANTS.hipBelow.value;
const DEGREES = 180 / Math.PI;

/** One rise that can be evaluated again and again with other marks. */
export interface RiseModel {
  /** Puts a frame's coordinates in: lift and both parts follow. */
  readonly setFrame: (frame: number, coordinates: Float64Array) => void;
  /** Fits the frames as they are; false where they carry no fit. */
  readonly fitInto: (out: Float64Array) => boolean;
}

/**
 * Lift and both parts of the turn from perturbed marks. Weights and the quiet stance stay as they
 * are; the parts are not zeroed, which moves every run alike and no difference.
 */
export const riseModel = (data: RiseData): RiseModel => {
  const { count, sigma, focal, centre, width } = data;
  const lifts = new Float64Array(count);
  const thighPart = new Float64Array(count);
  const pelvisPart = new Float64Array(count);
  const fit = fitter(data.gates);
  const belt = data.pelvis === 'belt';
  const setFrame = (i: number, x: Float64Array): void => {
    const liftedU = x[AT.liftedU] ?? NaN;
    const liftedV = x[AT.liftedV] ?? NaN;
    const supportU = x[AT.supportU] ?? NaN;
    const acrossU = supportU - liftedU;
    const acrossV = (x[AT.supportV] ?? NaN) - liftedV;
    const length = Math.sqrt(acrossU * acrossU + acrossV * acrossV);
    // the hip centre's height: see hipCentre, written out for speed
    const hipV = liftedV + (width * (INWARD * acrossV + BELOW * Math.abs(acrossU))) / length;
    const kneeV = x[AT.kneeV] ?? NaN;
    lifts[i] = data.liftIsTied
      ? kneeV
      : DEGREES * liftFromHeights(kneeV, hipV, data.thigh, data.horizon, focal);

    const femurFar = ((x[AT.femurA] ?? NaN) + (x[AT.femurB] ?? NaN)) / 2;
    const femurNear = x[AT.femurNear] ?? NaN;
    thighPart[i] = DEGREES * sigma * yaw(femurFar, femurNear, data.femurLength, focal, centre);

    const asis = (liftedU + supportU) / 2;
    const first = x[AT.pelvisFirst] ?? NaN;
    const far = belt ? asis : (first + (x[AT.pelvisSecond] ?? NaN)) / 2;
    const near = belt ? first : asis;
    pelvisPart[i] = -DEGREES * sigma * yaw(far, near, data.pelvisLength, focal, centre);
  };
  return {
    setFrame,
    fitInto: (out) => fit(lifts, data.weights, thighPart, pelvisPart, out),
  };
};
