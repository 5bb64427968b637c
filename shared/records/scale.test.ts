import { describe, expect, it } from 'vitest';
import { mmPerPxOf } from './scale.ts';

describe('millimetres per pixel', () => {
  it('comes from two points on a thing of known length', () => {
    const scale = { from: 'rod', a: { u: 100, v: 200 }, b: { u: 400, v: 600 }, lengthMm: 1200 };
    expect(mmPerPxOf({ ...scale, from: 'rod' })).toBeCloseTo(2.4, 12);
  });
  it('is taken as typed', () => {
    expect(mmPerPxOf({ from: 'typed', mmPerPx: 1.25 })).toBe(1.25);
  });
  it('is unknown without a scale and where the points coincide', () => {
    const point = { u: 5, v: 5 };
    expect(mmPerPxOf(null)).toBeNull();
    expect(mmPerPxOf({ from: 'rod', a: point, b: point, lengthMm: 1000 })).toBeNull();
  });
});
