import { mat3, quat } from 'gl-matrix';
import {
  cumulativeStdNormalProbability,
  linearRegression,
  standardDeviation,
} from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { butterworth, smoothBothWays } from '#shared/course/butterworth.ts';
import { localLinear } from '#shared/course/local-linear.ts';
import { normalBelow } from '#shared/course/normal.ts';
import { fitRise } from '#shared/course/rise-fit.ts';
import { floorMap } from '#shared/geometry/homography.ts';
import { rightHipAngles } from '#shared/geometry/joint-rotation.ts';
import { framePoint } from '#shared/geometry/points.ts';
import {
  logGamma,
  regularisedBeta,
  studentAbove,
  studentQuantile,
} from '#shared/reading/student.ts';
import { limitsOfAgreement, type Pair } from '#shared/reliability/agreement.ts';
import { fisherBelow, fisherQuantile } from '#shared/reliability/fisher.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { farthest, reference } from './reference.ts';

/** As printed, 13 digits, less what a sum in another order costs. */
const SAME = 1e-9;

describe('scipy and numpy agree on', () => {
  it.each(reference.butterworth)('the filter at $cutOff Hz of $rate', (its) => {
    const { b, a } = butterworth(its.cutOff, its.rate);
    expect(farthest(b, its.b)).toBeLessThan(SAME);
    expect(farthest(a, its.a)).toBeLessThan(SAME);
    expect(farthest(smoothBothWays(its.x, its.cutOff, its.rate), its.y)).toBeLessThan(SAME);
  });

  it('Student’s distribution and its quantiles', () => {
    const { student } = reference;
    const above = student.map(({ t, nu }) => studentAbove(t, nu));
    const quantiles = student.map(({ p, nu }) => studentQuantile(p, nu));
    expect(
      farthest(
        above,
        student.map((each) => each.above),
      ),
    ).toBeLessThan(SAME);
    expect(
      farthest(
        quantiles,
        student.map((each) => each.quantile),
      ),
    ).toBeLessThan(1e-7);
  });

  it('Fisher’s distribution and its quantiles', () => {
    const { fisher } = reference;
    const below = fisher.map((each) => fisherBelow(each.f, each.above, each.below));
    const quantiles = fisher.map((each) => fisherQuantile(each.p, each.above, each.below));
    expect(
      farthest(
        below,
        fisher.map(({ cdf }) => cdf),
      ),
    ).toBeLessThan(SAME);
    expect(
      farthest(
        quantiles,
        fisher.map((each) => each.quantile),
      ),
    ).toBeLessThan(1e-6);
  });

  it('the normal distribution, the gamma and the incomplete beta function', () => {
    const { normal, logGamma: gamma, beta } = reference;
    expect(
      farthest(
        normal.map(({ x }) => normalBelow(x)),
        normal.map((each) => each.below),
      ),
    ).toBeLessThan(SAME);
    expect(
      farthest(
        gamma.map(({ x }) => logGamma(x)),
        gamma.map(({ y }) => y),
      ),
    ).toBeLessThan(SAME);
    expect(
      farthest(
        beta.map(({ x, a, b }) => regularisedBeta(x, a, b)),
        beta.map(({ y }) => y),
      ),
    ).toBeLessThan(SAME);
  });

  it.each(reference.rise)('the fit over a rise of $lift.length frames', (its) => {
    const of = (list: readonly number[]): Float64Array => Float64Array.from(list);
    const fit = fitRise(
      of(its.lift),
      of(its.weight),
      of(its.thigh),
      of(its.pelvis),
      STANDARD_GATES,
    );
    // the corner comes from a table that is right to 1e−8
    expect(farthest(fit?.thigh ?? [], its.thighBeta)).toBeLessThan(1e-6);
    expect(farthest(fit?.pelvis ?? [], its.pelvisBeta)).toBeLessThan(1e-6);
    expect(fit?.sFit).toBeCloseTo(its.sFit, 6);
  });

  it.each(reference.floor)('where on the floor a point lies', ({ seen, floor, at, x, z }) => {
    const map = floorMap(
      seen.map(([u, v]) => framePoint(u, v)),
      floor.map(([a, b]) => ({ x: a, z: b })),
    );
    const point = map?.(framePoint(...at));
    expect(point?.x).toBeCloseTo(x, 8);
    expect(point?.z).toBeCloseTo(z, 8);
  });

  it.each(reference.lines)('a line through $times.length uneven times', (its) => {
    expect(farthest(localLinear(its.times, its.values), its.smooth)).toBeLessThan(1e-8);
  });
});

/** Numerical Recipes' quick generator, so that every run has the same input. */
const seeded = (seed: number): (() => number) => {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
};

describe('packages for rotations and statistics agree on', () => {
  it('the angles of a right hip, over 500 rotations', () => {
    const next = seeded(1);
    const radians = (low: number, high: number): number =>
      ((low + (high - low) * next()) * Math.PI) / 180;
    for (let k = 0; k < 500; k += 1) {
      // adduction short of a right angle, where flexion and rotation cannot be told apart
      const [flexion, adduction, internal] = [
        radians(-170, 170),
        radians(-80, 80),
        radians(-170, 170),
      ];
      const turn = quat.create();
      quat.rotateZ(turn, turn, flexion);
      quat.rotateX(turn, turn, adduction);
      quat.rotateY(turn, turn, internal);
      const m = mat3.fromQuat(mat3.create(), turn);
      const [m00 = NaN, m10 = NaN, m20 = NaN, m01 = NaN, m11 = NaN, m21 = NaN, m02, m12, m22] = m;
      const angles = rightHipAngles([
        [m00, m01, m02 ?? NaN],
        [m10, m11, m12 ?? NaN],
        [m20, m21, m22 ?? NaN],
      ]);
      // single precision is what that package computes in
      expect(angles.flexion).toBeCloseTo((flexion * 180) / Math.PI, 3);
      expect(angles.adduction).toBeCloseTo((adduction * 180) / Math.PI, 3);
      expect(angles.internalRotation).toBeCloseTo((internal * 180) / Math.PI, 3);
    }
  });

  it('the normal distribution, to the three digits of their table', () => {
    for (let z = -3; z <= 3; z += 0.01)
      expect(Math.abs(normalBelow(z) - cumulativeStdNormalProbability(z))).toBeLessThan(2e-3);
  });

  it('bias and spread of differences', () => {
    const next = seeded(2);
    const pairs: Pair[] = Array.from({ length: 40 }, () => [100 * next(), 100 * next()]);
    const limits = limitsOfAgreement(pairs);
    const differences = pairs.map(([a, b]) => a - b);
    const mean = differences.reduce((sum, each) => sum + each, 0) / differences.length;
    // theirs divides by n, limits of agreement by n − 1
    const sd = standardDeviation(differences) * Math.sqrt(40 / 39);
    expect(limits?.bias).toBeCloseTo(mean, 10);
    expect(limits?.sd).toBeCloseTo(sd, 10);
  });

  it('a straight line, where the smoother sees no other', () => {
    const next = seeded(3);
    const line = { m: 0.07, b: -3 };
    const times = Array.from({ length: 30 }, (_, k) => 40 * k + 30 * next());
    const values = times.map((time) => line.m * time + line.b);
    const theirs = linearRegression(times.map((time, i) => [time, values[i] ?? NaN]));
    expect(
      farthest(
        localLinear(times, values),
        times.map((time) => theirs.m * time + theirs.b),
      ),
    ).toBeLessThan(SAME);
  });
});
