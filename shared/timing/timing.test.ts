import { describe, expect, it } from 'vitest';
import { frameDuration, frameRate, framesPerSecond, parseFrameRate } from './frame-rate.ts';
import { frameAt, timestampFault } from './timestamps.ts';
import { frameIndex, milliseconds, seconds, toMilliseconds, toSeconds } from './units.ts';

const times = (...values: number[]) => values.map(milliseconds);

describe('frame rates', () => {
  it('stay exact', () => {
    expect(parseFrameRate('30000/1001')).toEqual({ numerator: 30000, denominator: 1001 });
    expect(framesPerSecond({ numerator: 30000, denominator: 1001 })).toBeCloseTo(29.97003, 5);
    expect(frameDuration({ numerator: 240, denominator: 1 })).toBeCloseTo(1 / 240, 15);
    expect(parseFrameRate('60')).toEqual({ numerator: 60, denominator: 1 });
  });

  it('are unknown, never 0', () => {
    for (const text of ['0/0', '30/0', '0/1', '', 'fast', '29.97', '-30/1'])
      expect(parseFrameRate(text)).toBeNull();
    expect(frameRate(2 ** 60, 1)).toBeNull();
  });
});

describe('timestamps', () => {
  it('must rise', () => {
    expect(timestampFault(times())).toBeNull();
    expect(timestampFault(times(0, 16.7, 33.3))).toBeNull();
    expect(timestampFault(times(0, 16, 16))).toEqual({ code: 'time-repeated', at: 2, time: 16 });
    expect(timestampFault(times(0, 33, 16))).toEqual({
      code: 'time-runs-backward',
      at: 2,
      from: 33,
      to: 16,
    });
    expect(timestampFault(times(0, NaN))).toEqual({ code: 'time-not-a-number', at: 1 });
  });

  it('find the frame that is shown', () => {
    const clip = times(10, 30, 70);
    expect(frameAt(clip, milliseconds(9))).toBeNull();
    expect(frameAt(clip, milliseconds(10))).toBe(0);
    expect(frameAt(clip, milliseconds(69.9))).toBe(1);
    expect(frameAt(clip, milliseconds(1e6))).toBe(2);
    expect(frameAt(times(), milliseconds(5))).toBeNull();
    expect(frameAt(clip, milliseconds(NaN))).toBeNull();
  });
});

describe('units', () => {
  it('refuse what is not a frame', () => {
    expect(frameIndex(7)).toBe(7);
    for (const value of [-1, 1.5, NaN, Infinity])
      expect(() => frameIndex(value)).toThrow(RangeError);
  });

  it('turn seconds into milliseconds and back', () => {
    expect(toMilliseconds(seconds(1.25))).toBe(1250);
    expect(toSeconds(milliseconds(40))).toBe(0.04);
  });
});
