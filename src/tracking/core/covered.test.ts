import { describe, expect, it } from 'vitest';
import { compare } from './align.ts';
import { coveredShare } from './covered.ts';
import { planeOf } from './plane.ts';
import { makeTemplate } from './template.ts';
import { atPlace } from './warp.ts';

const SIZE = 17;
const MIDDLE = atPlace(8, 8);
const pictureOf = (grey: (x: number, y: number) => number) =>
  planeOf(
    Uint8Array.from({ length: SIZE * SIZE }, (_, k) => grey(k % SIZE, Math.floor(k / SIZE))),
    SIZE,
    SIZE,
  );
/** Contrast 50, both ways alike. */
const checks = (x: number, y: number) => ((x + y) % 2 === 0 ? 50 : 150);
const template = makeTemplate(pictureOf(checks), MIDDLE, 5, 'move');
const shareOn = (grey: (x: number, y: number) => number) => {
  const picture = pictureOf(grey);
  return coveredShare(picture, template, compare(picture, template, MIDDLE));
};

describe('how much of a patch shows something else', () => {
  it('nothing of it, in any light', () => {
    expect(shareOn(checks)).toBe(0);
    expect(shareOn((x, y) => 0.6 * checks(x, y) + 30)).toBe(0);
  });

  it('its two right columns of cells: 32 of the 97 pixels of the round', () => {
    // columns 2 to 5 right of the middle hold 11, 9, 7 and 5 pixels; all eleven 5, 7, 9, 11, 11, 11, 11, 11, 9, 7, 5
    expect(shareOn((x, y) => (x >= 10 ? 255 : checks(x, y)))).toBeCloseTo(32 / 97, 10);
  });

  it('all of it where the light and the dark have changed places in one half', () => {
    const share = shareOn((x, y) => (x < 8 ? 200 - checks(x, y) : checks(x, y)));
    expect(share).toBeGreaterThan(0.4);
  });
});
