import { describe, expect, it } from 'vitest';
import { seconds } from '#shared/timing/units.ts';
import { divide, microseconds, parseRational, rational, tickAtOrAfter } from './rational.ts';

describe('exact fractions', () => {
  it('come in lowest terms with a positive denominator', () => {
    expect(rational(30, -90)).toEqual({ num: -1, den: 3 });
    expect(divide({ num: 1, den: 600 }, { num: 1, den: 19200 })).toEqual({ num: 32, den: 1 });
    expect(() => rational(1, 0)).toThrow(RangeError);
  });

  it.each([
    ['1/15360', { num: 1, den: 15360 }],
    ['4:3', { num: 4, den: 3 }],
    ['0:1', null],
    ['0/0', null],
    ['N/A', null],
    [undefined, null],
  ])('are read from %j', (text, value) => {
    expect(parseRational(text)).toEqual(value);
  });

  it('turn into whole microseconds, also where a product would pass 2⁵³', () => {
    expect(microseconds(1, { num: 1, den: 30 })).toBe(33333);
    expect(microseconds(2, { num: 1, den: 30 })).toBe(66667);
    expect(microseconds(-2, { num: 1, den: 30 })).toBe(-66667);
    expect(microseconds(9_000_000_000_001, { num: 1, den: 1_000_000_000 })).toBe(9_000_000_000);
  });

  it('find the first tick at or after a time', () => {
    expect(tickAtOrAfter(seconds(0.1), { num: 1, den: 30 })).toBe(3);
    expect(tickAtOrAfter(seconds(0.101), { num: 1, den: 30 })).toBe(4);
  });
});
