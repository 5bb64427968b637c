import { describe, expect, it } from 'vitest';
import { planeOf } from './plane.ts';
import { search } from './search.ts';
import { makeTemplate } from './template.ts';
import { atPlace } from './warp.ts';

const WIDTH = 19;
const HEIGHT = 11;
const THING = [
  [10, 200, 30],
  [180, 90, 240],
  [60, 20, 150],
];

/** Grey 100 but for the thing, whose middle lies on each of the places. */
const pictureWith = (...places: readonly (readonly [x: number, y: number])[]) => {
  const data = new Uint8Array(WIDTH * HEIGHT).fill(100);
  for (const [x, y] of places)
    for (const [row, greys] of THING.entries())
      for (const [column, grey] of greys.entries())
        data[(y + row - 1) * WIDTH + x + column - 1] = grey;
  return planeOf(data, WIDTH, HEIGHT);
};
const template = makeTemplate(pictureWith([4, 5]), atPlace(4, 5), 2, 'move');

describe('a wide look', () => {
  it('finds the pixel on which the thing lies now, and nothing else like it', () => {
    const found = search(pictureWith([10, 6]), template, atPlace(8, 5), 4);
    expect(found?.warp).toMatchObject({ tx: 10, ty: 6 });
    expect(found?.correlation).toBeCloseTo(1, 6);
    expect(found?.second).toBeLessThan(0.7);
  });

  it('says where there is another just like it', () => {
    const found = search(pictureWith([6, 5], [12, 5]), template, atPlace(9, 5), 4);
    expect(found?.correlation).toBeCloseTo(1, 6);
    expect(found?.second).toBeCloseTo(1, 6);
  });

  it('looks no farther than it may', () => {
    const found = search(pictureWith([12, 5]), template, atPlace(6, 5), 3);
    expect(found?.correlation ?? 0).toBeLessThan(0.7);
  });

  it('finds nothing where nothing stands out', () => {
    expect(search(pictureWith(), template, atPlace(8, 5), 4)).toBeNull();
  });
});
