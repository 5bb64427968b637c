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
  it('smooths by 1-2-1 both ways and takes every second pixel', () => {
    const dot = planeOf(Float32Array.from([0, 0, 0, 0, 0, 0, 0, 16, 0, 0, 0, 0, 0, 0, 0]), 5, 3);
    // the dot lies at (2, 1), between the rows that are kept
    expect([...halve(dot, 0, 0, 3, 2).data]).toEqual([0, 2, 0, 0, 2, 0]);
  });

  it('lets the edge go on', () => {
    const even = planeOf(new Uint8Array(12).fill(7), 4, 3);
    expect([...halve(even, 0, 0, 2, 2).data]).toEqual([7, 7, 7, 7]);
  });

  it('begins where it is told to', () => {
    const [first] = halve(ramp(20, 20, 1, 10), 4, 6, 3, 3).data;
    expect(first).toBe(64);
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
    expect(half?.plane.width).toBeLessThanOrEqual(70);
    expect(half?.plane.height).toBeLessThanOrEqual(70);
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
