import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { smoothBothWays } from './butterworth.ts';
import { localLinear } from './local-linear.ts';
import { median } from './robust.ts';
import type { CourseFrame } from './types.ts';

const LEAST_RATE_HZ = 15;
/** A gap this much longer than the usual one makes a series uneven. */
const UNEVEN = 1.2;
const BREAK_MOVING_MS = 250;
const BREAK_STILL_MS = 500;

export const LIFT_CUT_OFF_HZ = 6;
export const TURN_CUT_OFF_HZ = 3;

interface Sample {
  readonly index: number;
  readonly time: number;
  readonly value: number;
}

/** Sampling rate of a dense and even run of samples, Hz; null of any other. */
const evenRate = (times: readonly number[]): number | null => {
  const gaps = times.slice(1).map((time, i) => time - (times[i] ?? time));
  const usual = median(gaps);
  if (usual === null || usual <= 0 || gaps.some((gap) => gap > UNEVEN * usual)) return null;
  const span = (times.at(-1) ?? 0) - (times[0] ?? 0);
  const rate = (1000 * gaps.length) / span;
  return rate >= LEAST_RATE_HZ ? rate : null;
};

/** Runs of samples between which the line is drawn: longer gaps break it. */
const runsOf = (
  samples: readonly Sample[],
  longest: (from: number, to: number) => number,
): readonly (readonly Sample[])[] => {
  const runs: Sample[][] = [];
  for (const sample of samples) {
    const run = runs.at(-1);
    const last = run?.at(-1);
    if (run && last && sample.time - last.time <= longest(last.index, sample.index))
      run.push(sample);
    else runs.push([sample]);
  }
  return runs;
};

/** One frame of a smoothed line; null where the frame has no value. */
export interface ShownPoint {
  readonly time: Milliseconds;
  readonly value: Degrees | null;
  /** True where the line does not continue from the last known value. */
  readonly startsRun: boolean;
}

/**
 * The line that is shown for lift or turn over time: for display only, the reading uses the raw
 * frames. Dense and even runs are filtered both ways, others by local straight lines. A gap of more
 * than 250 ms breaks the line, 500 ms in quiet stance or at the top.
 */
export const shownSeries = (
  frames: readonly CourseFrame[],
  quantity: 'lift' | 'turn',
  fMax: Degrees | null,
): readonly ShownPoint[] => {
  const still = (index: number): boolean => {
    const frame = frames[index];
    if (!frame) return false;
    const atTop =
      fMax !== null && frame.lift !== null && frame.lift >= fMax - CONSTANTS.plateau.value;
    return frame.phase === 'quiet' || atTop;
  };
  const samples = frames.flatMap((frame, index): readonly Sample[] => {
    const value = frame[quantity];
    return value === null ? [] : [{ index, time: frame.time, value }];
  });
  const cutOff = quantity === 'lift' ? LIFT_CUT_OFF_HZ : TURN_CUT_OFF_HZ;
  const shown: ShownPoint[] = frames.map(({ time }) => ({ time, value: null, startsRun: false }));
  const runs = runsOf(samples, (from, to) =>
    still(from) && still(to) ? BREAK_STILL_MS : BREAK_MOVING_MS,
  );
  for (const run of runs) {
    const times = run.map(({ time }) => time);
    const values = run.map(({ value }) => value);
    const rate = evenRate(times);
    const smooth =
      rate === null ? localLinear(times, values) : smoothBothWays(values, cutOff, rate);
    for (const [i, { index }] of run.entries()) {
      const frame = frames[index];
      const value = smooth[i];
      if (frame && value !== undefined)
        shown[index] = { time: frame.time, value: degrees(value), startsRun: i === 0 };
    }
  }
  return shown;
};
