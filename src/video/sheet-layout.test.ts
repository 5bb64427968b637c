import { describe, expect, it } from 'vitest';
import type { FrameIndex } from '#shared/timing/units.ts';
import { sheetCount, tileOf } from './sheet-layout.ts';

const layout = {
  sheetUrl: (n: number) => `/sheets/${n}`,
  framesPerSheet: 6,
  columns: 3,
  tileWidth: 40,
  tileHeight: 20,
};

describe('tileOf', () => {
  it.each([
    [0, 0, 0, 0],
    [2, 0, 80, 0],
    [3, 0, 0, 20],
    [5, 0, 80, 20],
    [6, 1, 0, 0],
    [10, 1, 40, 20],
  ])('frame %i lies on sheet %i at %i, %i', (index, sheet, x, y) => {
    const tile = { x, y, width: 40, height: 20 };
    expect(tileOf(layout, index as FrameIndex)).toEqual({ sheet, tile });
  });
});

describe('sheetCount', () => {
  it('rounds up', () => {
    expect([1, 6, 7, 12].map((count) => sheetCount(layout, count))).toEqual([1, 1, 2, 2]);
  });
});
