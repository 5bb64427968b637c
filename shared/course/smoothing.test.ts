import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { butterworth, smoothBothWays, TWO_PASS_CORRECTION } from './butterworth.ts';
import { bandwidthOf, localLinear } from './local-linear.ts';
import { shownSeries } from './shown-series.ts';
import type { CourseFrame, FramePhase } from './types.ts';

describe('the Butterworth filter', () => {
  it('is corrected for two passes by .80224 (Winter, second-hand)', () => {
    expect(TWO_PASS_CORRECTION).toBeCloseTo(0.80224, 5);
  });

  // computed, to 1e−5; Debian's python3-scipy gives the same from butter()
  it.each([
    [60, [0.094447, 0.188893, 0.094447], [-0.962641, 0.340428]],
    [100, [0.040595, 0.081189, 0.040595], [-1.354749, 0.517128]],
    [30, [0.264494, 0.528988, 0.264494], [-0.115977, 0.173952]],
  ])('has the coefficients of 6 Hz at %d Hz', (rate, b, a) => {
    // 6 Hz is exactly 0.4 of half of 30 Hz, where the limit sits
    const filter = butterworth(6, rate);
    for (const [i, value] of b.entries())
      expect(Math.abs((filter.b[i] ?? NaN) - value)).toBeLessThan(1e-5);
    for (const [i, value] of a.entries())
      expect(Math.abs((filter.a[i] ?? NaN) - value)).toBeLessThan(1e-5);
  });

  it('lets .7071 through at the cut-off, both passes together', () => {
    const { b, a } = butterworth(6, 60);
    const w = (2 * Math.PI * 6) / 60;
    const size = (c: readonly number[]): number =>
      Math.hypot(
        c.reduce((sum, x, n) => sum + x * Math.cos(n * w), 0),
        c.reduce((sum, x, n) => sum + x * Math.sin(n * w), 0),
      );
    expect((size(b) / size([1, ...a])) ** 2).toBeCloseTo(0.7071, 4);
  });

  it('keeps a constant and a slope, edges included, and moves nothing in time', () => {
    const flat = smoothBothWays([3, 3, 3, 3, 3, 3], 3, 60);
    for (const value of flat) expect(value).toBeCloseTo(3, 12);
    const line = Array.from({ length: 60 }, (_, i) => 2 * i);
    const smooth = smoothBothWays(line, 3, 60);
    for (const [i, value] of smooth.entries()) expect(Math.abs(value - 2 * i)).toBeLessThan(1);
    const bump = Array.from({ length: 61 }, (_, i) => Math.exp(-(((i - 30) / 8) ** 2)));
    const out = smoothBothWays(bump, 6, 60);
    expect(out.indexOf(Math.max(...out))).toBe(30);
  });

  it('leaves three values and fewer alone', () => {
    expect(smoothBothWays([1, 5, 2], 6, 60)).toEqual([1, 5, 2]);
    expect(smoothBothWays([], 6, 60)).toEqual([]);
  });
});

describe('local lines', () => {
  it('give a straight line back, whatever the spacing', () => {
    const times = [0, 40, 200, 230, 500, 520, 900];
    const values = times.map((t) => 3 + t / 10);
    for (const [i, value] of localLinear(times, values).entries())
      expect(value).toBeCloseTo(values[i] ?? NaN, 9);
  });

  it('use a window of 150 ms or two and a half gaps', () => {
    expect(bandwidthOf([0, 33, 66])).toBe(150);
    expect(bandwidthOf([0, 100, 200])).toBe(250);
  });

  it('pull a literal outlier in', () => {
    const out = localLinear([0, 50, 100, 150, 200], [0, 0, 10, 0, 0]);
    // weights 1, .8929 and .3485 (tricube at 0, 1/3 and 2/3): 10 / 3.4829
    expect(out[2]).toBeCloseTo(2.8712, 4);
  });

  it('leave three values and fewer alone', () => {
    expect(localLinear([0, 1, 2], [5, 9, 1])).toEqual([5, 9, 1]);
  });
});

const frame = (time: number, lift: number | null, phase: FramePhase = 'rise'): CourseFrame => ({
  frame: frameIndex(Math.round(time)),
  time: milliseconds(time),
  phase,
  lift: lift === null ? null : degrees(lift),
  liftHalfWidth: null,
  turn: null,
  turnHalfWidth: null,
  femurYaw: null,
  pelvisYaw: null,
  thighPart: null,
  pelvisPart: null,
  weight: null,
  inFit: false,
  provisional: false,
  missing: { lift: null, turn: { code: 'no-quiet-stance' } },
});

describe('the line that is shown', () => {
  const starts = (frames: readonly CourseFrame[], fMax = 120): readonly number[] =>
    shownSeries(frames, 'lift', degrees(fMax)).flatMap(({ startsRun, time }) =>
      startsRun ? [time] : [],
    );

  it('breaks at a gap of more than 250 ms in the rise', () => {
    expect(starts([frame(0, 10), frame(250, 20), frame(500, 30)])).toEqual([0]);
    expect(starts([frame(0, 10), frame(251, 20), frame(500, 30)])).toEqual([0, 251]);
  });

  it('filters a dense and even run both ways at 6 Hz, and a sparse one by local lines', () => {
    const lifts = Array.from({ length: 40 }, (_, i) => 50 + 3 * i + (i % 2 === 0 ? 2 : -2));
    const dense = shownSeries(
      lifts.map((lift, i) => frame((i * 1000) / 60, lift)),
      'lift',
      degrees(400),
    ).map(({ value }) => value);
    for (const [i, value] of smoothBothWays(lifts, 6, 60).entries())
      expect(dense[i]).toBeCloseTo(value, 9);
    const sparse = lifts.map((lift, i) => frame(i * 100, lift));
    const lines = localLinear(
      sparse.map(({ time }) => time),
      lifts,
    );
    expect(shownSeries(sparse, 'lift', degrees(400)).map(({ value }) => value)).toEqual(lines);
  });

  it('breaks at 500 ms in quiet stance and at the top', () => {
    expect(starts([frame(0, 0, 'quiet'), frame(500, 0, 'quiet'), frame(1001, 0, 'quiet')])).toEqual(
      [0, 1001],
    );
    expect(starts([frame(0, 98), frame(400, 99)], 100)).toEqual([0]);
  });

  it('leaves frames without a value empty and bridges short ones', () => {
    const shown = shownSeries([frame(0, 10), frame(33, null), frame(66, 12)], 'lift', null);
    expect(shown.map(({ value }) => value)).toEqual([10, null, 12]);
    expect(shown.map(({ startsRun }) => startsRun)).toEqual([true, false, false]);
    expect(shownSeries([], 'turn', null)).toEqual([]);
  });
});
