import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { corner } from './corner.ts';
import { solveInPlace } from './linear.ts';

export const TERMS = 4;
/** Lift from which a turn before the lower gate is counted. */
export const BEFORE = degrees(30);
const RIDGE = [1e-9, 1e-7, 1e-7, 1e-5] as const;
/** Strength of the belief that marks err as assumed: counts like six further frames. */
const PRIOR_FRAMES = 6;

export type Beta = readonly [number, number, number, number];

/** With the gates 60° and 90°: [1, F−60, H(F−60), H(F−90)] of one lift. */
export const terms = (lift: Degrees, { from, to }: Gates): Beta => [
  1,
  lift - from,
  corner(lift - from),
  corner(lift - to),
];

const difference = (high: Degrees, low: Degrees, gates: Gates): Beta => {
  const a = terms(high, gates);
  const b = terms(low, gates);
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3]];
};

/** What the coefficients are multiplied by to get the change from gate to gate. */
export const changeTerms = (gates: Gates): Beta => difference(gates.to, gates.from, gates);

/** The same for the change from 30° to the lower gate. */
export const preTerms = (gates: Gates): Beta => difference(gates.from, BEFORE, gates);

export const dot = (a: Beta, b: Beta): number =>
  a[0] * b[0] + a[1] * b[1] + a[2] * b[2] + a[3] * b[3];

/** A workspace for fits of two curves at once over the same lifts and weights. */
export const fitter = ({
  from,
  to,
}: Gates): ((
  lifts: Float64Array,
  weights: Float64Array,
  first: Float64Array,
  second: Float64Array,
  out: Float64Array,
) => boolean) => {
  const matrix = new Float64Array(TERMS * TERMS);
  return (lifts, weights, first, second, out) => {
    matrix.fill(0);
    out.fill(0, 0, 2 * TERMS);
    let m00 = 0;
    let m10 = 0;
    let m11 = 0;
    let m20 = 0;
    let m21 = 0;
    let m22 = 0;
    let m30 = 0;
    let m31 = 0;
    let m32 = 0;
    let m33 = 0;
    for (let i = 0; i < lifts.length; i += 1) {
      const w = weights[i] ?? 0;
      const x1 = (lifts[i] ?? NaN) - from;
      const x2 = corner(x1);
      const x3 = corner(x1 + from - to);
      const w1 = w * x1;
      const w2 = w * x2;
      const w3 = w * x3;
      m00 += w;
      m10 += w1;
      m11 += w1 * x1;
      m20 += w2;
      m21 += w2 * x1;
      m22 += w2 * x2;
      m30 += w3;
      m31 += w3 * x1;
      m32 += w3 * x2;
      m33 += w3 * x3;
      const a = first[i] ?? NaN;
      const b = second[i] ?? NaN;
      out[0] = (out[0] ?? 0) + w * a;
      out[1] = (out[1] ?? 0) + w1 * a;
      out[2] = (out[2] ?? 0) + w2 * a;
      out[3] = (out[3] ?? 0) + w3 * a;
      out[4] = (out[4] ?? 0) + w * b;
      out[5] = (out[5] ?? 0) + w1 * b;
      out[6] = (out[6] ?? 0) + w2 * b;
      out[7] = (out[7] ?? 0) + w3 * b;
    }
    matrix[0] = m00 + RIDGE[0];
    matrix[4] = m10;
    matrix[5] = m11 + RIDGE[1];
    matrix[8] = m20;
    matrix[9] = m21;
    matrix[10] = m22 + RIDGE[2];
    matrix[12] = m30;
    matrix[13] = m31;
    matrix[14] = m32;
    matrix[15] = m33 + RIDGE[3];
    return solveInPlace(matrix, out, TERMS, 2);
  };
};

/** The fit of one rise without its uncertainty. */
export interface RiseFit {
  /** Coefficients of the thigh part, of the pelvis part, and of the turn, their sum. */
  readonly thigh: Beta;
  readonly pelvis: Beta;
  readonly turn: Beta;
  /** Frames with weight, and how much larger the scatter is than the marks explain. */
  readonly used: number;
  readonly sFit: number;
  readonly nu: number;
}

const four = (values: Float64Array, from: number): Beta => [
  values[from] ?? NaN,
  values[from + 1] ?? NaN,
  values[from + 2] ?? NaN,
  values[from + 3] ?? NaN,
];

/** Null where the frames do not carry a fit. Arrays hold the frames with weight only. */
export const fitRise = (
  lifts: Float64Array,
  weights: Float64Array,
  thighPart: Float64Array,
  pelvisPart: Float64Array,
  gates: Gates,
): RiseFit | null => {
  const out = new Float64Array(2 * TERMS);
  if (!fitter(gates)(lifts, weights, thighPart, pelvisPart, out)) return null;
  const thigh = four(out, 0);
  const pelvis = four(out, TERMS);
  const turn: Beta = [
    thigh[0] + pelvis[0],
    thigh[1] + pelvis[1],
    thigh[2] + pelvis[2],
    thigh[3] + pelvis[3],
  ];
  const used = lifts.length;
  const nu = PRIOR_FRAMES + used - TERMS;
  let squares = PRIOR_FRAMES;
  for (let i = 0; i < used; i += 1) {
    const rest =
      (thighPart[i] ?? NaN) +
      (pelvisPart[i] ?? NaN) -
      dot(terms(degrees(lifts[i] ?? NaN), gates), turn);
    squares += (weights[i] ?? NaN) * rest * rest;
  }
  const sFit = Math.sqrt(squares / nu);
  return Number.isFinite(sFit) && turn.every(Number.isFinite)
    ? { thigh, pelvis, turn, used, sFit, nu }
    : null;
};
