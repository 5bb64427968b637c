import { describe, expect, it } from 'vitest';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { pinRow, spacedLabels, spreadTargets, stripLayout } from './strip-layout.ts';

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
  it('leaves out what would run into a weightier neighbour, before it or behind it', () => {
    const labels = [
      { text: 'top', from: 200, to: 225 },
      { text: 'lower', from: 215, to: 254 },
      { text: 'foot down', from: 140, to: 195 },
      { text: 'quiet', from: 0, to: 39 },
      { text: 'foot off', from: 47, to: 107 },
      { text: 'quiet ends', from: 40, to: 114 },
    ];
    expect(spacedLabels(labels).map((each) => each.text)).toEqual(['top', 'quiet', 'foot off']);
  });

  it('gives each moment a place to press that no other lies on', () => {
    const wanted = [
      { from: -12, to: 12 },
      { from: 100, to: 160 },
      { from: 110, to: 134 },
      { from: 370, to: 394 },
      { from: 372, to: 396 },
    ];
    expect(spreadTargets(wanted, 400)).toEqual([
      { from: 0, to: 24 },
      { from: 100, to: 160 },
      { from: 160, to: 184 },
      { from: 352, to: 376 },
      { from: 376, to: 400 },
    ]);
  });

  it('shows words only where there is room for them', () => {
    const pins = pinRow([0, 1, 5], (frame) => frame, { x: (frame) => frame * 50, right: 400 });
    expect(pins.map((pin) => pin.room)).toEqual([34, 190, 144]);
    const [late] = pinRow([7], () => 7, { x: () => 390, right: 400 });
    expect(late).toMatchObject({ x: 390, room: 34, left: 366 });
  });

  it('puts pins of one moment beside each other, each with its line at its own moment', () => {
    const at = [100, 107, 110, 390];
    const pins = pinRow(at, (frame) => frame, { x: (frame) => frame, right: 400 });
    expect(pins.map(({ x }) => x)).toEqual(at);
    expect(pins.slice(0, 3).map(({ left }) => left)).toEqual([100, 136, 172]);
    const end = pinRow([380, 385, 390], (frame) => frame, { x: (frame) => frame, right: 400 });
    expect(end.map(({ left }) => left)).toEqual([294, 330, 366]);
  });
});
