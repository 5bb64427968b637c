import { normalDraws } from '#shared/measures/draws.ts';
import { COORDINATES, type RiseData } from './rise-data.ts';
import { COEFFICIENTS, riseModel, type RiseModel } from './rise-model.ts';

/** Monte Carlo runs of engine 1. */
export const DRAWS = 2000;

/** How the eight coefficients (four of the thigh part, four of the pelvis part) vary over the runs. */
export interface RiseDraws {
  /** Runs whose marks carried a fit. */
  readonly count: number;
  /** 8 × 8, row by row. */
  readonly covariance: Float64Array;
}

/** Puts all frames of the model back to the marks as they were placed, their lifts moved by a part of a shift. */
const place = (
  data: RiseData,
  model: RiseModel,
  x: Float64Array,
  shift?: { readonly of: Float64Array; readonly by: number },
): void => {
  for (let i = 0; i < data.count; i += 1) {
    data.coordinates.forEach(({ at }, k) => (x[k] = at[i] ?? NaN));
    if (shift)
      x[COORDINATES.kneeV] = (x[COORDINATES.kneeV] ?? NaN) + shift.by * (shift.of[i] ?? NaN);
    model.setFrame(i, x);
  }
};

/**
 * Change of each coefficient per standard error of each coordinate, by central differences: eight
 * numbers per moment of a tie, then per coordinate, frame by frame. Zeros where a fit fails.
 */
const slopesOf = (data: RiseData, model: RiseModel): Float64Array => {
  const { count, coordinates } = data;
  const x = new Float64Array(coordinates.length);
  const up = new Float64Array(COEFFICIENTS);
  const down = new Float64Array(COEFFICIENTS);
  const slopes = new Float64Array((data.tie.length + count * coordinates.length) * COEFFICIENTS);
  let from = 0;
  const put = (): void => {
    for (let j = 0; j < COEFFICIENTS; j += 1)
      slopes[from + j] = ((up[j] ?? NaN) - (down[j] ?? NaN)) / 2;
    from += COEFFICIENTS;
  };
  for (const of of data.tie) {
    place(data, model, x, { of, by: 1 });
    const upper = model.fitInto(up);
    place(data, model, x, { of, by: -1 });
    if (!upper || !model.fitInto(down)) return slopes.fill(0);
    put();
  }
  place(data, model, x);
  for (let i = 0; i < count; i += 1) {
    coordinates.forEach(({ at }, k) => (x[k] = at[i] ?? NaN));
    for (const [k, { at, error }] of coordinates.entries()) {
      const home = at[i] ?? NaN;
      const step = error[i] ?? NaN;
      x[k] = home + step;
      model.setFrame(i, x);
      const upper = model.fitInto(up);
      x[k] = home - step;
      model.setFrame(i, x);
      const lower = model.fitInto(down);
      x[k] = home;
      if (!upper || !lower) return slopes.fill(0);
      put();
    }
    model.setFrame(i, x);
  }
  return slopes;
};

/** Adds `by` times the covariance of rows of eight. Two passes: means first. */
const addCovariance = (rows: Float64Array, count: number, by: number, into: Float64Array): void => {
  const means = new Float64Array(COEFFICIENTS);
  for (let n = 0; n < count * COEFFICIENTS; n += 1)
    means[n % COEFFICIENTS] = (means[n % COEFFICIENTS] ?? 0) + (rows[n] ?? NaN) / count;
  for (let run = 0; run < count; run += 1)
    for (let i = 0; i < COEFFICIENTS; i += 1) {
      const x = (rows[run * COEFFICIENTS + i] ?? NaN) - (means[i] ?? NaN);
      for (let j = 0; j < COEFFICIENTS; j += 1) {
        const y = (rows[run * COEFFICIENTS + j] ?? NaN) - (means[j] ?? NaN);
        const cell = i * COEFFICIENTS + j;
        into[cell] = (into[cell] ?? NaN) + (by * x * y) / (count - 1);
      }
    }
};

/** Adds the exact covariance of the straight-line answer to independent errors. */
const addExact = (slopes: Float64Array, into: Float64Array): void => {
  for (let from = 0; from < slopes.length; from += COEFFICIENTS)
    for (let i = 0; i < COEFFICIENTS; i += 1)
      for (let j = 0; j < COEFFICIENTS; j += 1) {
        const cell = i * COEFFICIENTS + j;
        into[cell] = (into[cell] ?? NaN) + (slopes[from + i] ?? NaN) * (slopes[from + j] ?? NaN);
      }
};

/**
 * Perturbs every mark of the rise with its random error, and all tied lifts together with that of the tie, and
 * fits again.
 *
 * The same draws are also put through the straight-line answer, whose covariance is known exactly:
 * only the difference of the two is estimated by the draws. With 2,000 runs this leaves about the
 * noise of tens of thousands, so that two readings of the same frames agree.
 */
export const drawRise = (data: RiseData, seed: number, runs: number = DRAWS): RiseDraws => {
  const next = normalDraws(seed);
  const { count, coordinates } = data;
  const model = riseModel(data);
  const slopes = slopesOf(data, model);
  const x = new Float64Array(coordinates.length);
  const out = new Float64Array(COEFFICIENTS);
  const line = new Float64Array(COEFFICIENTS);
  const betas = new Float64Array(runs * COEFFICIENTS);
  const lines = new Float64Array(runs * COEFFICIENTS);
  let kept = 0;
  for (let run = 0; run < runs; run += 1) {
    line.fill(0);
    let from = 0;
    const draw = (): number => {
      const z = next();
      for (let j = 0; j < COEFFICIENTS; j += 1)
        line[j] = (line[j] ?? NaN) + (slopes[from + j] ?? NaN) * z;
      from += COEFFICIENTS;
      return z;
    };
    const shared = data.tie.map((of) => ({ of, z: draw() }));
    for (let i = 0; i < count; i += 1) {
      for (let k = 0; k < coordinates.length; k += 1) {
        const coordinate = coordinates[k];
        x[k] = (coordinate?.at[i] ?? NaN) + (coordinate?.error[i] ?? NaN) * draw();
      }
      for (const { of, z } of shared)
        x[COORDINATES.kneeV] = (x[COORDINATES.kneeV] ?? NaN) + z * (of[i] ?? NaN);
      model.setFrame(i, x);
    }
    if (!model.fitInto(out)) continue;
    betas.set(out, kept * COEFFICIENTS);
    lines.set(line, kept * COEFFICIENTS);
    kept += 1;
  }
  const covariance = new Float64Array(COEFFICIENTS * COEFFICIENTS).fill(kept < 2 ? NaN : 0);
  if (kept >= 2) {
    addCovariance(betas, kept, 1, covariance);
    addCovariance(lines, kept, -1, covariance);
    addExact(slopes, covariance);
  }
  return { count: kept, covariance };
};

/** Standard deviation over the runs of a weighted sum of the eight coefficients; NaN without runs. */
export const drawnSpread = ({ covariance }: RiseDraws, weights: readonly number[]): number => {
  let variance = 0;
  for (let i = 0; i < COEFFICIENTS; i += 1)
    for (let j = 0; j < COEFFICIENTS; j += 1)
      variance += (weights[i] ?? 0) * (weights[j] ?? 0) * (covariance[i * COEFFICIENTS + j] ?? NaN);
  return Math.sqrt(Math.max(0, variance));
};
