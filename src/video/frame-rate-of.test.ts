import { describe, expect, it } from 'vitest';
import type { Seconds } from '#shared/timing/units.ts';
import { frameRateOf } from './frame-rate-of.ts';

const steady = (fps: number, count: number): Seconds[] =>
  Array.from({ length: count }, (_, n) => (n / fps) as Seconds);

describe('frameRateOf', () => {
  it.each([24, 30, 60, 120, 240])('finds a steady %i', (fps) => {
    const rate = frameRateOf(steady(fps, 100));
    expect(rate).toEqual({ kind: 'constant', fps: expect.closeTo(fps, 6), gaps: 0 });
  });

  it('finds 30000/1001', () => {
    const rate = frameRateOf(steady(30_000 / 1001, 300));
    expect(rate).toMatchObject({ kind: 'constant', fps: expect.closeTo(29.97003, 5) });
  });

  it('takes a steady 60 rounded to milliseconds for what it is', () => {
    const rounded = steady(60, 601).map((t) => (Math.round(t * 1000) / 1000) as Seconds);
    expect(frameRateOf(rounded)).toMatchObject({ kind: 'constant', fps: expect.closeTo(60, 1) });
  });

  it('does not mind the order: packets with B-frames come in decoding order', () => {
    const [a, b, c, d, ...rest] = steady(30, 60);
    const shuffled = [a, d, b, c, ...rest].filter((t) => t !== undefined);
    expect(frameRateOf(shuffled)).toMatchObject({ kind: 'constant', gaps: 0 });
  });

  it('counts the gap of a dropped frame in a steady clip', () => {
    const times = steady(60, 300).filter((_, n) => n !== 100);
    expect(frameRateOf(times)).toEqual({
      kind: 'constant',
      fps: expect.closeTo(60, 6),
      gaps: 1,
    });
  });

  it('says variable, with the slowest and the fastest', () => {
    const times = [0, 1, 2, 3, 5, 7, 9].map((n) => (n / 60) as Seconds);
    expect(frameRateOf(times)).toEqual({
      kind: 'variable',
      averageFps: expect.closeTo(40, 6),
      lowestFps: expect.closeTo(30, 6),
      highestFps: expect.closeTo(60, 6),
    });
  });

  it('does not know the rate of a single frame, of none, or of repeated times', () => {
    expect(frameRateOf([])).toBeNull();
    expect(frameRateOf([0 as Seconds])).toBeNull();
    expect(frameRateOf([1, 1, 1] as Seconds[])).toBeNull();
  });
});
