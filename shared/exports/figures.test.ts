import { describe, expect, it } from 'vitest';
import { decimal, degrees, plusMinus, turn } from './figures.ts';

describe('figures', () => {
  it('have a true minus, and none at nought', () => {
    expect([1.54, -1.2, -0.04].map((value) => decimal(value))).toEqual(['1.5', '−1.2', '0.0']);
  });
  it('carry a sign only where they are a turn', () => {
    expect([6.84, -6.84, 0.04].map((value) => turn(value))).toEqual(['+6.8°', '−6.8°', '0.0°']);
    expect(degrees(62)).toBe('62.0°');
    expect(plusMinus(3.6)).toBe('±\u00a03.6');
  });
});
