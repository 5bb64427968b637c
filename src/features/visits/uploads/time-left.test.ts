import { describe, expect, it } from 'vitest';
import { secondsLeft, withSample, type Sample } from './time-left.ts';

describe('secondsLeft', () => {
  it('is not known before there is something to go by', () => {
    expect(secondsLeft([], 100)).toBeNull();
    expect(
      secondsLeft(
        [
          { at: 0, bytes: 0 },
          { at: 1000, bytes: 50 },
        ],
        100,
      ),
    ).toBeNull();
    expect(
      secondsLeft(
        [
          { at: 0, bytes: 50 },
          { at: 5000, bytes: 50 },
        ],
        100,
      ),
    ).toBeNull();
  });
  it('follows the rate of the window', () => {
    expect(
      secondsLeft(
        [
          { at: 0, bytes: 0 },
          { at: 2000, bytes: 200 },
        ],
        1200,
      ),
    ).toBe(10);
  });
});

describe('withSample', () => {
  it('keeps the window and one sample before it', () => {
    let samples: Sample[] = [];
    for (let at = 0; at <= 30_000; at += 1000) samples = withSample(samples, { at, bytes: at });
    expect(samples[0]).toEqual({ at: 18_000, bytes: 18_000 });
    expect(samples.at(-1)?.at).toBe(30_000);
    expect(samples).toHaveLength(13);
  });
});
