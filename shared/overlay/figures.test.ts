import { expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { liftText, plainDegrees, plusMinus, signedDegrees } from './figures.ts';

it('signs a turn with a true minus and one decimal', () => {
  expect(signedDegrees(degrees(6.74))).toBe('+6.7°');
  expect(signedDegrees(degrees(-0.44))).toBe('−0.4°');
});

it('gives no sign to what rounds to nothing', () => {
  expect(signedDegrees(degrees(-0.04))).toBe('0.0°');
  expect(plainDegrees(degrees(-0.01))).toBe('0.0°');
});

it('rounds where asked', () => {
  expect(plainDegrees(degrees(74.25), 0)).toBe('74°');
  expect(plusMinus(degrees(5.06))).toBe('± 5.1');
});

it('shows a lift under 20° as a number only from the side', () => {
  expect(liftText(degrees(19.9), true)).toBe('< 20°');
  expect(liftText(degrees(19.9), false)).toBe('19.9°');
  expect(liftText(degrees(20), true)).toBe('20.0°');
});
