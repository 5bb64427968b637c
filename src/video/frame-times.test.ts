import { describe, expect, it } from 'vitest';
import { type FrameIndex, type Milliseconds } from '#shared/timing/units.ts';
import {
  checkFrameTable,
  checkIndex,
  checkPacketsAgainstTable,
  endOfFrame,
  frameTimes,
  middleOfFrame,
} from './frame-times.ts';

const table = (...times: number[]): Milliseconds[] => times as Milliseconds[];
const frame = (n: number): FrameIndex => n as FrameIndex;

describe('frameTimes', () => {
  it('turns ticks into milliseconds', () => {
    const times = frameTimes({ timeBase: { num: 1, den: 90_000 }, ticks: [0, 1500, 3003] });
    expect(times[1]).toBeCloseTo(16.6667, 3);
    expect(times[2]).toBeCloseTo(33.3667, 3);
  });
});

describe('checkFrameTable', () => {
  it('takes a table that rises', () => {
    expect(() => checkFrameTable(table(0, 16, 50))).not.toThrow();
  });

  it.each([
    ['empty', table()],
    ['repeated', table(0, 16, 16)],
    ['backward', table(0, 16, 15)],
    ['not a number', table(0, NaN)],
  ])('refuses a table that is %s', (_, times) => {
    expect(() => checkFrameTable(times)).toThrow(expect.objectContaining({ code: 'mismatch' }));
  });
});

describe('checkPacketsAgainstTable', () => {
  it('takes packets that are shifted as a whole and rounded', () => {
    const packets = table(100, 117, 133.2);
    expect(() => checkPacketsAgainstTable(packets, table(0, 16.667, 33.333))).not.toThrow();
  });

  it.each([
    ['fewer', table(0, 16.667)],
    ['more', table(0, 16.667, 33.333, 50)],
    ['elsewhere', table(0, 16.667, 35)],
  ])('refuses packets that are %s', (_, packets) => {
    expect(() => checkPacketsAgainstTable(packets, table(0, 16.667, 33.333))).toThrow(
      expect.objectContaining({ code: 'mismatch' }),
    );
  });
});

describe('the time a frame is shown', () => {
  const times = table(0, 10, 40);

  it('ends where the next begins, the last lasting as long as the one before', () => {
    expect([0, 1, 2].map((n) => endOfFrame(times, frame(n)))).toEqual([10, 40, 70]);
  });

  it('has its middle', () => {
    expect([0, 1, 2].map((n) => middleOfFrame(times, frame(n)))).toEqual([5, 25, 55]);
  });

  it('is a point where there is one frame only', () => {
    expect(middleOfFrame(table(7), frame(0))).toBe(7);
  });
});

describe('checkIndex', () => {
  it('takes the first and the last', () => {
    expect(() => checkIndex(table(0, 16), frame(0))).not.toThrow();
    expect(() => checkIndex(table(0, 16), frame(1))).not.toThrow();
  });

  it.each([-1, 2, 0.5, NaN])('refuses %s of two frames', (n) => {
    expect(() => checkIndex(table(0, 16), frame(n))).toThrow(
      expect.objectContaining({ code: 'no-such-frame' }),
    );
  });
});
