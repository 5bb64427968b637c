import { describe, expect, it } from 'vitest';
import { taper } from './taper.ts';

describe('taper', () => {
  it('is a capsule where both ends are equally wide', () => {
    expect(taper([0, 0], [10, 0], 2, 2)).toBe('M0 2L10 2A2 2 0 0 0 10 -2L0 -2A2 2 0 1 0 0 2Z');
  });
  it('touches both circles, so that a thigh narrows to the knee without a step', () => {
    const numbers =
      taper([0, 0], [0, 40], 10, 6)
        .match(/-?\d+(\.\d+)?/g)
        ?.map(Number) ?? [];
    const [x1 = 0, y1 = 0, x2 = 0, y2 = 0] = numbers;
    expect(Math.hypot(x1, y1)).toBeCloseTo(10, 1);
    expect(Math.hypot(x2, y2 - 40)).toBeCloseTo(6, 1);
  });
});
