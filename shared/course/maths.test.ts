import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { brokenLine } from './broken-line.ts';
import { corner, cornerExactly } from './corner.ts';
import { crossings, parabolaTop } from './crossings.ts';
import { probabilityBelow } from './limits.ts';
import { solveInPlace } from './linear.ts';
import { normalBelow } from './normal.ts';
import { changeTerms, preTerms, terms } from './rise-fit.ts';
import { median, medianOfThree, robustSpread } from './robust.ts';

describe('the normal distribution', () => {
  it('gives tabulated values (definition)', () => {
    expect(normalBelow(0)).toBe(0.5);
    expect(normalBelow(1.959963985)).toBeCloseTo(0.975, 9);
    expect(normalBelow(-1.2815515655)).toBeCloseTo(0.1, 9);
    expect(normalBelow(-6) / 9.865876450377e-10).toBeCloseTo(1, 9);
    expect(normalBelow(4.000001)).toBeCloseTo(normalBelow(3.999999), 8);
    expect(normalBelow(Infinity)).toBe(1);
    expect(normalBelow(-Infinity)).toBe(0);
    expect(normalBelow(NaN)).toBeNaN();
  });
});

describe('a decision at a limit', () => {
  // JCGM 106:2012, guard bands (computed from the standard's normal case)
  it('is possible at 85 and not at 87 with a limit of 90 and u = 3', () => {
    const below = (estimate: number): number =>
      probabilityBelow(degrees(90), degrees(estimate), degrees(3));
    expect(below(85)).toBeCloseTo(0.952, 3);
    expect(below(87)).toBeCloseTo(0.841, 3);
    expect(below(85)).toBeGreaterThan(0.95);
    expect(below(87)).toBeLessThan(0.95);
  });

  it('is unknown without an uncertainty', () => {
    expect(probabilityBelow(degrees(90), degrees(85), degrees(0))).toBeNaN();
  });
});

describe('the rounded corner', () => {
  it('is nought before, a line after, and rounded between', () => {
    expect(corner(-60)).toBe(0);
    expect(corner(60)).toBe(60);
    expect(corner(0)).toBeCloseTo(5 / Math.sqrt(2 * Math.PI), 8);
  });

  it('comes from its table within 1e−8', () => {
    for (let x = -45; x <= 45; x += 0.0137)
      expect(Math.abs(corner(x) - cornerExactly(x))).toBeLessThan(1e-8);
  });

  it('makes the change between the gates from four terms', () => {
    expect(terms(degrees(60), STANDARD_GATES)[1]).toBe(0);
    expect(changeTerms(STANDARD_GATES).slice(0, 2)).toEqual([0, 30]);
    expect(preTerms(STANDARD_GATES)[1]).toBe(30);
    const gates = { from: degrees(50), to: degrees(75) };
    expect(changeTerms(gates).slice(0, 2)).toEqual([0, 25]);
    expect(preTerms(gates)[1]).toBe(20);
  });
});

describe('solving', () => {
  it('answers two right sides at once', () => {
    const a = Float64Array.of(4, 2, 2, 3);
    const b = Float64Array.of(10, 8, 4, 2);
    expect(solveInPlace(a, b, 2, 2)).toBe(true);
    expect([...b].map((x) => Math.round(x * 1e9) / 1e9)).toEqual([1.75, 1.5, 1, 0]);
  });

  it('says so where the matrix is not positive definite', () => {
    expect(solveInPlace(Float64Array.of(1, 2, 2, 1), Float64Array.of(1, 1), 2, 1)).toBe(false);
    expect(solveInPlace(Float64Array.of(NaN), Float64Array.of(1), 1, 1)).toBe(false);
  });
});

describe('robust middles', () => {
  it('are unknown of nothing', () => {
    expect(median([])).toBeNull();
    expect(robustSpread([])).toBeNull();
    expect(median([3, 1, 2, 10])).toBe(2.5);
    expect(robustSpread([1, 2, 3, 4, 100])).toBeCloseTo(1.4826, 9);
  });

  it('let no single outlier be a top, keep gaps, and take the lower of two at the ends', () => {
    expect(medianOfThree([1, 90, 3, null, 5, 4, 8])).toEqual([1, 3, 5, null, 4, 5, 4]);
    expect(medianOfThree([])).toEqual([]);
    expect(medianOfThree([7])).toEqual([7]);
  });
});

describe('a hip angle over a gait cycle', () => {
  // Olshen et al. 1989, one child, data set 'gait' in R's fda package (data seen, results computed)
  const hip = [37, 36, 33, 29, 23, 18, 15, 12, 9, 6, 4, 6, 13, 22, 31, 38, 43, 44, 40, 35];
  const at = hip.map((_, i) => 0.025 + 0.05 * i);

  it('is highest at .875, lowest at .525, and crosses 20° down at .255 and up at .664', () => {
    expect(at[hip.indexOf(Math.max(...hip))]).toBeCloseTo(0.875, 9);
    expect(at[hip.indexOf(Math.min(...hip))]).toBeCloseTo(0.525, 9);
    const [down, up, ...more] = crossings(at, hip, 20);
    expect(more).toEqual([]);
    expect(down?.direction).toBe('down');
    expect(down?.at).toBeCloseTo(0.255, 3);
    expect(up?.direction).toBe('up');
    expect(up?.at).toBeCloseTo(0.664, 3);
  });

  it('has its parabola’s top of 44.225 at .860', () => {
    const top = parabolaTop(0.875, 0.05, [43, 44, 40]);
    expect(top?.at).toBeCloseTo(0.86, 9);
    expect(top?.value).toBeCloseTo(44.225, 9);
    expect(parabolaTop(0, 1, [1, 2, 3])).toBeNull();
  });

  it('is not crossed inside a gap', () => {
    expect(crossings([0, 1, 2], [0, null, 10], 5)).toEqual([]);
    expect(crossings([0, 1, 2], [0, 5, 10], 5)).toEqual([{ at: 1, direction: 'up' }]);
  });
});

describe('two lines that meet', () => {
  // Bacon & Watts 1971, Biometrika 58:525–534, flow-rate data (second-hand; least squares computed)
  const x = [
    -1.39, -1.39, -1.08, -1.08, -0.94, -0.8, -0.63, -0.63, -0.25, -0.25, -0.12, -0.12, 0.01, 0.11,
    0.11, 0.11, 0.25, 0.25, 0.34, 0.34, 0.44, 0.59, 0.7, 0.7, 0.85, 0.85, 0.99, 0.99, 1.19,
  ];
  const y = [
    1.12, 1.12, 0.99, 1.03, 0.92, 0.9, 0.81, 0.83, 0.65, 0.67, 0.6, 0.59, 0.51, 0.44, 0.43, 0.43,
    0.33, 0.3, 0.25, 0.24, 0.13, -0.01, -0.13, -0.14, -0.3, -0.33, -0.46, -0.43, -0.65,
  ];

  it('break where least squares puts them', () => {
    const fit = brokenLine(x, y);
    expect(fit?.at).toBeCloseTo(0.0359, 4);
    expect(fit?.before).toBeCloseTo(-0.4221, 4);
    expect(fit?.after).toBeCloseTo(-1.0166, 4);
    expect(fit?.height).toBeCloseTo(0.5295, 4);
    expect(fit?.squares).toBeCloseTo(0.009381, 6);
  });

  it('break near the paper’s own Bayesian estimate: .0256, −.417, −1.015, .538', () => {
    const fit = brokenLine(x, y);
    expect(Math.abs((fit?.at ?? NaN) - 0.0256)).toBeLessThan(0.015);
    expect(Math.abs((fit?.before ?? NaN) + 0.417)).toBeLessThan(0.01);
    expect(Math.abs((fit?.after ?? NaN) + 1.015)).toBeLessThan(0.01);
    expect(Math.abs((fit?.height ?? NaN) - 0.538)).toBeLessThan(0.01);
  });

  it('need five points that are spread', () => {
    expect(brokenLine([1, 2, 3, 4], [1, 2, 3, 4])).toBeNull();
    expect(brokenLine([1, 1, 1, 1, 1], [1, 2, 3, 4, 5])).toBeNull();
  });
});
