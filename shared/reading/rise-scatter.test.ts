import { describe, expect, it } from 'vitest';
import { riseScatter, type ScatteringRep, scatterOf } from './rise-scatter.ts';

/** A rep of which only the scatter around its fit is known: 6 + Σ w r² = sFit² ν, ν = 6 + frames − 4. */
const repOf = (squares: number, frames: number, zero?: number): ScatteringRep => {
  const nu = 6 + frames - 4;
  return {
    fitted: { fit: { sFit: Math.sqrt((6 + squares) / nu), nu, used: frames } },
    course: {
      setting: {
        turnZero: zero === undefined ? null : { femurVariance: zero, pelvisVariance: 2 * zero },
      },
    },
  };
};

describe('the scatter of the rises', () => {
  it('is the squares that are left of the fits, and what is free of their frames', () => {
    const { squares, free } = riseScatter([repOf(20, 14), repOf(31, 24)]);
    expect(squares).toBeCloseTo(51, 9);
    expect(free).toBe(30);
  });

  it('is told from what is assumed by everything that was seen, the assumption counting six', () => {
    const seen = [
      { squares: 50, free: 20 },
      { squares: 40, free: 14 },
    ];
    const { scatter, nu } = scatterOf([repOf(50, 24)], ...seen);
    expect(nu).toBe(40);
    expect(scatter.factor).toBeCloseTo(96 / 40, 9);
  });

  it('is never taken as less than that of a hand: 1.7 times smaller at most', () => {
    expect(scatterOf([], { squares: 0, free: 1000 }).scatter.factor).toBeCloseTo(1 / 1.7 ** 2, 9);
  });

  it('makes the zero of each rep as much less sure, in degrees squared; none without a stance', () => {
    const { scatter } = scatterOf([repOf(0, 10, 0.0001), repOf(0, 10)], { squares: 14, free: 4 });
    const inDegrees = 0.0001 * (180 / Math.PI) ** 2;
    expect(scatter.factor).toBeCloseTo(2, 9);
    expect(scatter.zeroThigh[0]).toBeCloseTo(2 * inDegrees, 9);
    expect(scatter.zeroPelvis[0]).toBeCloseTo(4 * inDegrees, 9);
    expect([scatter.zeroThigh[1], scatter.zeroPelvis[1]]).toEqual([0, 0]);
  });
});
