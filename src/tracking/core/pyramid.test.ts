import { describe, expect, it } from 'vitest';
import { planeOf, sampleAt } from './plane.ts';
import { halve, pyramidAround, toLevelX, toLevelY } from './pyramid.ts';

/** Grey rises by `a` to the right and by `b` downwards. */
const ramp = (width: number, height: number, a: number, b: number) =>
  planeOf(
    Float32Array.from(
      { length: width * height },
      (_, k) => a * (k % width) + b * Math.floor(k / width),
    ),
    width,
    height,
  );

describe('halve', () => {
  it('is the mean of two by two', () => {
    const picture = planeOf(
      Uint8Array.from([1, 3, 10, 20, 5, 7, 30, 40, 9, 9, 9, 9, 9, 9, 9, 9]),
      4,
      4,
    );
    expect([...halve(picture, 0, 0, 2, 2).data]).toEqual([4, 25, 9, 9]);
  });

  it('begins where it is told to', () => {
    const [first] = halve(ramp(20, 20, 1, 10), 4, 6, 3, 3).data;
    // columns 4 and 5, rows 6 and 7
    expect(first).toBe(69.5);
  });
});

describe('pyramidAround', () => {
  it('knows on every level where a place of the picture lies', () => {
    const picture = ramp(200, 160, 1, 0.5);
    const levels = pyramidAround(picture, 101.3, 77.8, 60, 4);
    expect(levels).toHaveLength(4);
    for (const level of levels) {
      const grey = sampleAt(level.plane, toLevelX(level, 101.3), toLevelY(level, 77.8));
      expect(grey).toBeCloseTo(101.3 + 77.8 / 2, 3);
    }
  });

  it('looks at no more than the square asked for', () => {
    const [, half] = pyramidAround(ramp(2000, 1000, 1, 1), 900, 500, 64, 2);
    expect(half?.plane.width).toBeLessThanOrEqual(66);
    expect(half?.plane.height).toBeLessThanOrEqual(66);
  });

  it.each([
    [-500, -500],
    [5000, 20],
    [50, 5000],
  ])('holds a piece of the picture even for a place outside, %d %d', (x, y) => {
    const levels = pyramidAround(ramp(200, 160, 1, 1), x, y, 60, 4);
    for (const { plane } of levels) expect(plane.data.every(Number.isFinite)).toBe(true);
  });
});
