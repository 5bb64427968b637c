import { describe, expect, it } from 'vitest';
import { compare } from './align.ts';
import { leastAlikeHalf } from './halves.ts';
import { planeOf } from './plane.ts';
import { makeTemplate } from './template.ts';
import { atPlace } from './warp.ts';

const SIZE = 23;
const MIDDLE = atPlace(11, 11);
const pictureOf = (grey: (x: number, y: number) => number) =>
  planeOf(
    Uint8Array.from({ length: SIZE * SIZE }, (_, k) => grey(k % SIZE, Math.floor(k / SIZE))),
    SIZE,
    SIZE,
  );
/** Stripes of two pixels across, far from alike when they are moved by two. */
const stripes = (x: number, y: number): number => ((x + 2 * y) % 4 < 2 ? 80 : 140);
const half = (then: (x: number, y: number) => number, first = stripes) => {
  const template = makeTemplate(pictureOf(first), MIDDLE, 8, 'move');
  const picture = pictureOf(then);
  return leastAlikeHalf(picture, template, compare(picture, template, MIDDLE));
};

describe('the half of a patch that is least alike', () => {
  it('is alike in any light, and in another on each side', () => {
    expect(half(stripes)).toBeCloseTo(1, 6);
    expect(half((x, y) => 0.5 * stripes(x, y) + 20)).toBeCloseTo(1, 6);
  });

  it('is the one that went another way', () => {
    expect(half((x, y) => stripes(x > 11 ? x + 2 : x, y))).toBeCloseTo(-1, 6);
  });

  it('is unlike where it turned even', () => {
    expect(half((x, y) => (x > 11 ? 100 : stripes(x, y)))).toBe(0);
  });

  it('is not one that never had anything to be known by', () => {
    const bare = (x: number, y: number) => (x > 10 ? 110 : stripes(x, y));
    const gone = (x: number, y: number) => (x > 14 ? 108 + (y % 2) : bare(x, y));
    expect(half(gone, bare)).toBeGreaterThan(0.95);
  });
});
