import { describe, expect, it } from 'vitest';
import { eigenvalues, solveSymmetric } from './solve.ts';

describe('solveSymmetric', () => {
  it('solves two by two', () => {
    const [x, y] = solveSymmetric([4, 2, 2, 3], [10, 8]) ?? [];
    expect(x).toBeCloseTo(1.75, 12);
    expect(y).toBeCloseTo(1.5, 12);
  });

  it('solves three by three', () => {
    const matrix = [4, 1, 0, 1, 3, 1, 0, 1, 2];
    const [x, y, z] = solveSymmetric(matrix, [6, 10, 8]) ?? [];
    expect([x, y, z].map((value) => Number(value?.toFixed(9)))).toEqual([1, 2, 3]);
  });

  it.each([
    ['two equal rows', [1, 1, 1, 1]],
    ['nothing at all', [0, 0, 0, 0]],
    ['a negative direction', [1, 0, 0, -1]],
    ['not a number', [NaN, 0, 0, 1]],
  ])('has no answer for %s', (_, matrix) => {
    expect(solveSymmetric(matrix, [1, 1])).toBeNull();
  });
});

describe('eigenvalues', () => {
  it('are the diagonal where nothing is shared', () => {
    expect(eigenvalues(5, 0, 2)).toEqual([2, 5]);
  });

  it('are 1 and 3 for [[2, 1], [1, 2]]', () => {
    expect(eigenvalues(2, 1, 2)).toEqual([1, 3]);
  });

  it('are 0 and the sum along an edge', () => {
    const [low, high] = eigenvalues(9, 3, 1);
    expect(low).toBeCloseTo(0, 12);
    expect(high).toBeCloseTo(10, 12);
  });
});
