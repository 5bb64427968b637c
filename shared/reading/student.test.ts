import { describe, expect, it } from 'vitest';
import { logGamma, regularisedBeta, studentAbove, studentQuantile } from './student.ts';

describe('the gamma function', () => {
  it('is a factorial at whole numbers and √π at a half (definition)', () => {
    expect(logGamma(1)).toBeCloseTo(0, 12);
    expect(logGamma(11)).toBeCloseTo(Math.log(3628800), 11);
    expect(logGamma(0.5)).toBeCloseTo(0.5 * Math.log(Math.PI), 12);
  });
});

describe('the incomplete beta function', () => {
  it('has closed forms at small whole parameters (definition)', () => {
    expect(regularisedBeta(0.3, 1, 1)).toBeCloseTo(0.3, 13);
    expect(regularisedBeta(0.3, 2, 1)).toBeCloseTo(0.09, 13);
    expect(regularisedBeta(0.3, 2, 2)).toBeCloseTo(3 * 0.09 - 2 * 0.027, 13);
    expect(regularisedBeta(0.5, 7.3, 7.3)).toBeCloseTo(0.5, 12);
  });

  it('is symmetric and ends at 0 and 1', () => {
    for (const x of [0.01, 0.2, 0.77, 0.999])
      expect(regularisedBeta(x, 3.1, 0.5) + regularisedBeta(1 - x, 0.5, 3.1)).toBeCloseTo(1, 12);
    expect(regularisedBeta(0, 2, 3)).toBe(0);
    expect(regularisedBeta(1, 2, 3)).toBe(1);
    expect(regularisedBeta(1.1, 2, 3)).toBeNaN();
  });
});

describe('Student’s distribution', () => {
  // table of critical values printed in statistics textbooks (memory)
  it.each([
    [1, 0.975, 12.706],
    [2, 0.95, 2.92],
    [5, 0.975, 2.571],
    [10, 0.95, 1.812],
    [10, 0.975, 2.228],
    [20, 0.95, 1.725],
    [30, 0.99, 2.457],
    [60, 0.975, 2.0],
    [120, 0.95, 1.658],
  ])('has with ν = %d below share %d the printed t', (nu, share, t) => {
    expect(studentQuantile(share, nu)).toBeCloseTo(t, 3);
    expect(studentAbove(studentQuantile(share, nu), nu)).toBeCloseTo(1 - share, 10);
  });

  it('is the Cauchy distribution at ν = 1 and closed at ν = 2 (definition)', () => {
    for (const t of [-3, -0.2, 0, 1, 40]) {
      expect(studentAbove(t, 1)).toBeCloseTo(0.5 - Math.atan(t) / Math.PI, 12);
      expect(studentAbove(t, 2)).toBeCloseTo(0.5 - t / (2 * Math.sqrt(2 + t * t)), 12);
    }
  });

  it('takes degrees of freedom that are not whole, and tends to the normal one', () => {
    expect(studentQuantile(0.95, 2.5)).toBeGreaterThan(studentQuantile(0.95, 3));
    expect(studentQuantile(0.95, 1e6)).toBeCloseTo(1.644856, 4);
  });

  it('has ends, and no value without sense', () => {
    expect(studentAbove(Infinity, 5)).toBe(0);
    expect(studentAbove(-Infinity, 5)).toBe(1);
    expect(studentAbove(1, 0)).toBeNaN();
    expect(studentAbove(NaN, 5)).toBeNaN();
    expect(studentQuantile(1, 5)).toBeNaN();
    expect(studentQuantile(0.5, 5)).toBeCloseTo(0, 9);
    expect(studentQuantile(0.05, 10)).toBeCloseTo(-1.812, 3);
  });
});
