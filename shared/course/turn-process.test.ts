import { describe, expect, it } from 'vitest';
import { changeVariance, gatedCovariance, turnCovariance } from './turn-process.ts';

/** Variance of the change between two lifts. */
const change = (from: number, to: number): number =>
  turnCovariance(to, to) + turnCovariance(from, from) - 2 * turnCovariance(from, to);

describe('the curve before anything is seen', () => {
  it('changes by as much over any 30° of lift, and by 1 over the window', () => {
    for (const from of [0, 15, 30, 60, 90]) expect(change(from, from + 30)).toBeCloseTo(1, 10);
  });

  it('is 0 where the thigh hangs', () => {
    for (const lift of [0, 20, 60, 110]) expect(turnCovariance(0, lift)).toBeCloseTo(0, 12);
  });

  it('has the covariance of a slope that is alike over 20°', () => {
    // midpoint rule over ∫₀ᵃ∫₀ᵇ exp(−(s−t)²/2·20²), against the closed form
    const steps = 400;
    const numeric = (a: number, b: number): number => {
      let sum = 0;
      for (let i = 0; i < steps; i += 1)
        for (let j = 0; j < steps; j += 1) {
          const away = (a * (i + 0.5) - b * (j + 0.5)) / steps;
          sum += Math.exp(-(away * away) / 800) * (a / steps) * (b / steps);
        }
      return sum;
    };
    const window = numeric(90, 90) + numeric(60, 60) - 2 * numeric(60, 90);
    for (const [a, b] of [
      [60, 90],
      [30, 100],
      [45, 45],
    ] as const)
      expect(turnCovariance(a, b)).toBeCloseTo(numeric(a, b) / window, 3);
  });

  it('is the same from both ends', () => {
    expect(turnCovariance(25, 95)).toBe(turnCovariance(95, 25));
  });
});

describe('a turn between the gates', () => {
  const changed = (gates: readonly [number, number], from: number, to: number): number => {
    const covariance = gatedCovariance(...gates);
    return covariance(to, to) + covariance(from, from) - 2 * covariance(from, to);
  };
  const turned = (from: number, to: number): number => changed([60, 90], from, to);

  it('changes by 1 over the window and hardly outside it', () => {
    expect(turned(60, 90)).toBeCloseTo(1, 12);
    expect(turned(60, 75)).toBeCloseTo(0.25, 2);
    for (const [from, to] of [
      [20, 50],
      [100, 120],
    ] as const)
      expect(turned(from, to)).toBeLessThan(0.001);
  });

  it('changes from gate to gate as much as the smooth curve, wherever the gates are', () => {
    for (const [from, to] of [
      [50, 95],
      [65, 85],
    ] as const)
      expect(changed([from, to], from, to)).toBeCloseTo(changeVariance(to - from), 12);
  });
});
