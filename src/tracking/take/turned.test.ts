import { describe, expect, it } from 'vitest';
import { planeOf } from '../core/plane.ts';
import { turned } from './turned.ts';

describe('turned', () => {
  // rows of 3, the fourth value of each is padding
  const plane = planeOf(Uint8Array.from([1, 2, 3, 0, 4, 5, 6, 0]), 3, 2, 4);

  it.each([
    [90, 2, [4, 1, 5, 2, 6, 3]],
    [180, 3, [6, 5, 4, 3, 2, 1]],
    [270, 2, [3, 6, 2, 5, 1, 4]],
  ] as const)('by %d° clockwise', (by, width, values) => {
    const after = turned(plane, by);
    expect(after.width).toBe(width);
    expect([...after.data]).toEqual(values);
  });

  it('leaves an upright picture as it is', () => {
    expect(turned(plane, 0)).toBe(plane);
  });
});
