import { corner } from '#shared/course/corner.ts';
import { solveInPlace } from '#shared/course/linear.ts';
import type { RiseData } from '#shared/course/rise-data.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { Onset } from './types.ts';

const FIRST = 30;
const STEP = 2.5;
/** Frames this far over the upper gate still tell where the turn bends. */
const ABOVE = 7;
const LEAST_FRAMES = 5;
const RIDGE = [1e-9, 1 / 25, 1e-9] as const;
const SLOPE_SD = 5;
const NOT_OUTWARD = 6;
/** Reps of one clip share their systematic error: together they count for less than their sum. */
const TOGETHER = 0.4;

/** A rise and how much larger its scatter is than its marks explain. */
export interface OnsetRep {
  readonly data: RiseData;
  readonly sFit: number;
}

/** Log plausibility that the turn of one rep bends at κ; null with fewer than five frames. */
const bend = ({ data, sFit }: OnsetRep, kappa: number): number | null => {
  const { from, to } = data.gates;
  const rows: { x: readonly [number, number, number]; r: number; w: number }[] = [];
  for (let i = 0; i < data.count; i += 1) {
    const lift = data.lifts[i] ?? NaN;
    if (!(lift <= to + ABOVE)) continue;
    rows.push({
      x: [1, (lift - from) / 30, corner(lift - kappa)],
      r: (data.thighPart[i] ?? NaN) + (data.pelvisPart[i] ?? NaN),
      w: (data.weights[i] ?? NaN) / (sFit * sFit),
    });
  }
  if (rows.length < LEAST_FRAMES) return null;
  const a = new Float64Array(9);
  const b = new Float64Array(3);
  for (const { x, r, w } of rows)
    for (let i = 0; i < 3; i += 1) {
      const xi = x[i] ?? NaN;
      b[i] = (b[i] ?? 0) + w * xi * r;
      for (let j = 0; j < 3; j += 1) a[i * 3 + j] = (a[i * 3 + j] ?? 0) + w * xi * (x[j] ?? NaN);
    }
  for (let i = 0; i < 3; i += 1) a[i * 4] = (a[i * 4] ?? 0) + (RIDGE[i] ?? 0);
  if (!solveInPlace(a, b, 3, 1)) return null;
  const [b1 = NaN, b2 = NaN, b3 = NaN] = b;
  let log = -0.5 * (b2 / SLOPE_SD) ** 2 - (b3 > 0 ? 0 : NOT_OUTWARD);
  for (const { x, r, w } of rows) log -= 0.5 * w * (r - b1 * x[0] - b2 * x[1] - b3 * x[2]) ** 2;
  return log;
};

/**
 * Lift at which the turn outward starts, as a range: its own error is 7–10°. Null where a rep has
 * fewer than five frames between 25° and 7° over the upper gate.
 */
export const onsetOf = (reps: readonly OnsetRep[]): Onset | null => {
  const [first] = reps;
  if (!first) return null;
  const last = first.data.gates.to;
  const grid: { kappa: number; log: number }[] = [];
  for (let kappa = FIRST; kappa <= last; kappa += STEP) {
    let log = 0;
    for (const rep of reps) {
      const one = bend(rep, kappa);
      if (one === null || !Number.isFinite(one)) return null;
      log += one;
    }
    grid.push({ kappa, log: reps.length > 1 ? TOGETHER * log : log });
  }
  const best = Math.max(...grid.map(({ log }) => log));
  const weights = grid.map(({ log }) => Math.exp(log - best));
  const sum = weights.reduce((a, b) => a + b, 0);
  const mean = grid.reduce((m, { kappa }, i) => m + (kappa * (weights[i] ?? 0)) / sum, 0);
  const quantile = (p: number): number => {
    let below = 0;
    for (const [i, { kappa }] of grid.entries()) {
      below += (weights[i] ?? 0) / sum;
      if (below >= p) return kappa;
    }
    return last;
  };
  return { mean: degrees(mean), low: degrees(quantile(0.05)), high: degrees(quantile(0.95)) };
};
