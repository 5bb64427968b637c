import { describe, expect, it } from 'vitest';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { PlayClock } from './play-clock.ts';

const frame = (n: number): FrameIndex => n as FrameIndex;
/** Frames of 10, 10, 50 and 10 ms, the last of 10 again. */
const table = [0, 10, 20, 70, 80] as Milliseconds[];
const clock = (
  options: { from?: number; span?: [number, number]; rate?: number; loop?: boolean } = {},
) => {
  const { from = 0, span = [0, 4], rate = 1, loop = false } = options;
  return new PlayClock(
    table,
    { span: { from: frame(span[0]), to: frame(span[1]) }, from: frame(from), rate, loop },
    1000,
  );
};

describe('PlayClock', () => {
  it('gives every frame its own time', () => {
    const c = clock();
    const due = [1000, 1009, 1010, 1020, 1069, 1070, 1080].map((now) => c.due(now).index);
    expect(due).toEqual([0, 0, 1, 2, 2, 3, 4]);
  });

  it('runs at a quarter of the speed', () => {
    const c = clock({ rate: 0.25 });
    expect([1039, 1040, 1279, 1280].map((now) => c.due(now).index)).toEqual([0, 1, 2, 3]);
  });

  it('ends on the last frame after its time', () => {
    const c = clock();
    expect(c.due(1089)).toEqual({ index: 4, ended: false });
    expect(c.due(1090)).toEqual({ index: 4, ended: true });
  });

  it('begins the span again where it loops', () => {
    const c = clock({ from: 2, span: [1, 2], loop: true });
    // from 20 to 70 ms, then 10 to 70 again and again
    expect([1049, 1050, 1060, 1109, 1110].map((now) => c.due(now).index)).toEqual([2, 1, 2, 2, 1]);
    expect(c.due(9999).ended).toBe(false);
  });

  it('stands still while it is held', () => {
    const c = clock();
    c.hold(1012);
    c.hold(1500);
    expect(c.due(2000).index).toBe(1);
    c.resume(2000);
    expect(c.due(2007).index).toBe(1);
    expect(c.due(2008).index).toBe(2);
  });

  it('does not step back when the heartbeat is older than its start', () => {
    expect(clock({ from: 2 }).due(990).index).toBe(2);
  });

  it.each([
    ['a rate of 0', { rate: 0 }],
    ['a start outside the span', { from: 0, span: [1, 2] as [number, number] }],
    ['a span outside the clip', { span: [0, 5] as [number, number] }],
  ])('refuses %s', (_, options) => {
    expect(() => clock(options)).toThrow(RangeError);
  });
});
