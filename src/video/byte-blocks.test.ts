import { describe, expect, it } from 'vitest';
import { blocksOf, missingRuns, nearestMissing } from './byte-blocks.ts';

describe('blocksOf', () => {
  it.each([
    [0, 1, 0, 0],
    [0, 10, 0, 0],
    [0, 11, 0, 1],
    [9, 11, 0, 1],
    [10, 20, 1, 1],
  ])('bytes %i to %i lie in blocks %i to %i', (start, end, first, last) => {
    expect(blocksOf(start, end, 10)).toEqual({ first, last });
  });
});

describe('missingRuns', () => {
  it('joins neighbours and skips what is there', () => {
    const has = new Set([2, 5]);
    expect(missingRuns({ first: 1, last: 6 }, (b) => !has.has(b))).toEqual([
      { first: 1, last: 1 },
      { first: 3, last: 4 },
      { first: 6, last: 6 },
    ]);
  });

  it('is empty where nothing is missing', () => {
    expect(missingRuns({ first: 1, last: 6 }, () => false)).toEqual([]);
  });
});

describe('nearestMissing', () => {
  const next = (centre: number, missing: readonly number[]) =>
    nearestMissing(centre, 10, 3, (b) => missing.includes(b));

  it('takes a run ahead, no longer than allowed', () => {
    expect(next(2, [3, 4, 5, 6])).toEqual({ first: 3, last: 5 });
  });

  it('takes ahead before behind at the same distance', () => {
    expect(next(4, [3, 5])).toEqual({ first: 5, last: 5 });
  });

  it('goes behind when that is nearer', () => {
    expect(next(5, [4, 9])).toEqual({ first: 4, last: 4 });
  });

  it('is nothing when all is there', () => {
    expect(next(5, [])).toBeNull();
  });
});
