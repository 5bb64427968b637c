import { describe, expect, it } from 'vitest';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { pinRow, spacedLabels, stripLayout } from './strip-layout.ts';

// a variable rate: frame 2 stays three times as long
const TIMES = [0, 20, 40, 100, 120, 140].map(milliseconds);
const layout = stripLayout({ width: 1000, height: 172 }, [frameIndex(0), frameIndex(5)], TIMES);

describe('strip', () => {
  it('gives every frame the place of its exact time', () => {
    expect(layout.x(0)).toBe(layout.left);
    expect(layout.x(5)).toBe(layout.right);
    const third = (layout.x(3) - layout.x(2)) / (layout.x(1) - layout.x(0));
    expect(third).toBeCloseTo(3, 6);
  });

  it('finds the frame nearest to a place and stays inside the span', () => {
    for (const frame of [0, 1, 2, 3, 4, 5]) expect(layout.frameAtX(layout.x(frame))).toBe(frame);
    expect(layout.frameAtX(layout.x(2) + 1)).toBe(2);
    expect(layout.frameAtX(layout.x(3) - 1)).toBe(3);
    expect(layout.frameAtX(-500)).toBe(0);
    expect(layout.frameAtX(5000)).toBe(5);
  });

  it('draws a higher lift higher', () => {
    expect(layout.y(0)).toBe(layout.base);
    expect(layout.y(90)).toBeLessThan(layout.y(60));
  });

  it('survives a span of one frame', () => {
    const one = stripLayout({ width: 300, height: 100 }, [frameIndex(2), frameIndex(2)], TIMES);
    expect(one.frameAtX(150)).toBe(2);
    expect(Number.isFinite(one.x(2))).toBe(true);
  });
});

describe('labels and pins', () => {
  it('leaves out what would run into its neighbour', () => {
    const labels = [
      { x: 0, text: 'quiet' },
      { x: 20, text: 'foot off' },
      { x: 200, text: 'top' },
    ];
    expect(spacedLabels(labels).map((each) => each.text)).toEqual(['quiet', 'top']);
  });

  it('shows words only where there is room for them', () => {
    const pins = pinRow([0, 1, 5], (frame) => frame, { x: (frame) => frame * 50, right: 400 });
    expect(pins.map((pin) => pin.room)).toEqual([34, 190, 144]);
    const [late] = pinRow([7], () => 7, { x: () => 390, right: 400 });
    expect(late).toMatchObject({ x: 390, room: 34, left: 366 });
  });
});
