import { describe, expect, it } from 'vitest';
import { daysLater, isMinor } from './days.ts';

describe('a minor', () => {
  it.each([
    ['2008-06-15', '2026-06-14', true],
    ['2008-06-15', '2026-06-15', false],
    ['2008-02-29', '2026-02-28', true],
    ['2008-02-29', '2026-03-01', false],
    ['1950-01-01', '2026-01-01', false],
  ])('born %s is one on %s: %s', (born, on, minor) => {
    expect(isMinor(born, on)).toBe(minor);
  });
});

describe('days later', () => {
  it('crosses months and leap days', () => {
    expect(daysLater('2028-02-28', 2)).toBe('2028-03-01');
    expect(daysLater('2026-12-31', 1)).toBe('2027-01-01');
    expect(daysLater('2026-03-29', -1)).toBe('2026-03-28');
  });
});
