import { expect, it } from 'vitest';
import { normalDraws } from './draws.ts';

const take = (seed: number, n: number): readonly number[] => {
  const next = normalDraws(seed);
  return Array.from({ length: n }, next);
};

it('repeats itself for one seed and differs for another', () => {
  expect(take(7, 50)).toEqual(take(7, 50));
  expect(take(7, 50)).not.toEqual(take(8, 50));
  expect(take(0, 4).every(Number.isFinite)).toBe(true);
});

it('has the moments and tails of a normal distribution', () => {
  const n = 200_000;
  const values = take(42, n);
  const mean = values.reduce((a, b) => a + b, 0) / n;
  const moment = (k: number) => values.reduce((sum, x) => sum + (x - mean) ** k, 0) / n;
  expect(Math.abs(mean)).toBeLessThan(0.01);
  expect(moment(2)).toBeCloseTo(1, 1);
  expect(Math.abs(moment(3))).toBeLessThan(0.03);
  expect(Math.abs(moment(4) - 3)).toBeLessThan(0.06);
  expect(values.filter((x) => x > 1.96).length / n).toBeCloseTo(0.025, 3);
});

it('does not depend on the draw before', () => {
  const values = take(3, 100_000);
  const pairs = values.slice(1).map((x, i) => x * (values[i] ?? 0));
  expect(Math.abs(pairs.reduce((a, b) => a + b, 0) / pairs.length)).toBeLessThan(0.01);
});
