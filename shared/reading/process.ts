import { solveFactored, solveInPlace } from '#shared/course/linear.ts';
import { gatedCovariance, turnCovariance } from '#shared/course/turn-process.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { SeenLift } from './process-frames.ts';
import {
  type Belief,
  believedCovariance,
  frameCovariance,
  type Scatter,
  type Slopes,
} from './process-matrices.ts';

/** Mean and variance of a change of direction, degrees. */
export interface Moments {
  readonly mean: number;
  readonly variance: number;
}

/** A change of turn between two lifts, and its parts, whose means add up to its mean. */
export interface Believed extends Moments {
  readonly thigh: Moments;
  readonly pelvis: Moments;
  /** How far the mean would vary if the same frames were marked again, degrees². */
  readonly random: number;
}

/** The person's true turn as seen through all frames of all reps. */
export interface TurnProcess {
  readonly change: (from: number, to: number) => Believed;
  /** Variance of a change before anything is seen. */
  readonly prior: (from: number, to: number) => number;
  /** How well the belief explains what is seen: logarithm, up to a constant. */
  readonly logLikelihood: number;
}

interface Solved {
  /** Covariance of the errors of single frames. */
  readonly frames: Float64Array;
  /** Triangle of the covariance of all that is seen, and its answer to what is seen. */
  readonly triangle: Float64Array;
  readonly answer: Float64Array;
}

const inner = (a: Float64Array, b: Float64Array): number => {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += (a[i] ?? NaN) * (b[i] ?? NaN);
  return sum;
};

/** xᵀ M x */
const squareForm = (matrix: Float64Array, x: Float64Array): number => {
  const n = x.length;
  let sum = 0;
  for (let i = 0; i < n; i += 1) sum += (x[i] ?? NaN) * inner(matrix.subarray(i * n, i * n + n), x);
  return sum;
};

const logLikelihoodOf = (values: Float64Array, { triangle, answer }: Solved): number => {
  const size = values.length;
  let sum = -inner(values, answer) / 2;
  for (let i = 0; i < size; i += 1) sum -= Math.log(triangle[i * size + i] ?? NaN);
  return sum;
};

/**
 * Gaussian regression over all reps at once. Each part of the turn is the person's own smooth curve
 * of the lift, the slip of its skin, what differs from rep to rep, and the error of each frame; the
 * answer is what the frames leave to believe of the person's own curve. Null where they carry none.
 */
export const turnProcess = (
  seen: readonly SeenLift[],
  belief: Belief,
  scatter: Scatter,
  { from, to }: Gates,
): TurnProcess | null => {
  const n = seen.length;
  const believed = believedCovariance(seen, belief, scatter, { from, to });
  const { across, gated } = belief;
  const betweenGates = gatedCovariance(from, to);
  const covariance = (a: number, b: number): number => {
    const k = turnCovariance(a, b);
    return k + gated * (betweenGates(a, b) - k);
  };
  const values = new Float64Array(2 * n);
  for (const [i, { thigh, pelvis }] of seen.entries()) {
    values[i] = thigh;
    values[n + i] = pelvis;
  }

  const solve = (slopes: Slopes): Solved | null => {
    const frames = frameCovariance(seen, scatter.factor, slopes);
    const triangle = believed.map((value, i) => value + (frames[i] ?? NaN));
    const answer = Float64Array.from(values);
    return solveInPlace(triangle, answer, 2 * n, 1) ? { frames, triangle, answer } : null;
  };

  const unitOf = (low: number, high: number): number =>
    covariance(high, high) + covariance(low, low) - 2 * covariance(low, high);

  const changeIn = ({ frames, triangle, answer }: Solved, from: number, to: number): Believed => {
    const thigh = new Float64Array(2 * n);
    const pelvis = new Float64Array(2 * n);
    for (const [i, { lift }] of seen.entries()) {
      const k = covariance(lift, to) - covariance(lift, from);
      thigh[i] = belief.thigh.own * k;
      thigh[n + i] = across.own * k;
      pelvis[i] = across.own * k;
      pelvis[n + i] = belief.pelvis.own * k;
    }
    const unit = unitOf(from, to);
    const sides = new Float64Array(4 * n);
    sides.set(thigh, 0);
    sides.set(pelvis, 2 * n);
    solveFactored(triangle, sides, 2 * n, 2);
    const [byThigh, byPelvis] = [sides.subarray(0, 2 * n), sides.subarray(2 * n)];
    const ofThigh = belief.thigh.own * unit - inner(thigh, byThigh);
    const ofPelvis = belief.pelvis.own * unit - inner(pelvis, byPelvis);
    const means = { thigh: inner(thigh, answer), pelvis: inner(pelvis, answer) };
    return {
      mean: means.thigh + means.pelvis,
      variance: ofThigh + ofPelvis + 2 * (across.own * unit - inner(thigh, byPelvis)),
      thigh: { mean: means.thigh, variance: ofThigh },
      pelvis: { mean: means.pelvis, variance: ofPelvis },
      random: squareForm(
        frames,
        byThigh.map((weight, i) => weight + (byPelvis[i] ?? NaN)),
      ),
    };
  };

  // how steep the turn is has to be known for the errors of the lift: a first answer tells
  const flat = solve({ thigh: 0, pelvis: 0 });
  if (!flat) return null;
  const rough = changeIn(flat, from, to);
  const solved = solve({
    thigh: rough.thigh.mean / (to - from),
    pelvis: rough.pelvis.mean / (to - from),
  });
  return (
    solved && {
      change: (low, high) => changeIn(solved, low, high),
      prior: (low, high) =>
        (belief.thigh.own + belief.pelvis.own + 2 * across.own) * unitOf(low, high),
      logLikelihood: logLikelihoodOf(values, solved),
    }
  );
};
