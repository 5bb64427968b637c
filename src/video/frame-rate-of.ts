import type { Seconds } from '#shared/timing/units.ts';

/** What the times of a clip's frames say about its rate, frames per second. */
export type MeasuredRate =
  | { readonly kind: 'constant'; readonly fps: number; readonly gaps: number }
  | {
      readonly kind: 'variable';
      readonly averageFps: number;
      readonly lowestFps: number;
      readonly highestFps: number;
    };

/**
 * An interval counts as different when it is off the median by more than 15 % and by more than
 * 1.5 ms: WebM rounds times to whole milliseconds, so a steady 60 alternates between 16 and 17.
 */
const OFF_RELATIVE = 0.15;
const OFF_SECONDS = 0.0015;
/**
 * More than one interval in a hundred makes the rate variable; fewer, or a single one in a short
 * clip, are gaps in a steady rate. Common practice, no source.
 */
const VARIABLE_SHARE = 0.01;

/**
 * The rate by the times of the frames themselves, in any order, never by the container's claim.
 * Null where fewer than two frames or no positive interval leave it unknown.
 */
export const frameRateOf = (times: readonly Seconds[]): MeasuredRate | null => {
  const sorted = [...times].filter(Number.isFinite).sort((a, b) => a - b);
  const intervals: number[] = [];
  for (let k = 1; k < sorted.length; k += 1) {
    const interval = (sorted[k] ?? 0) - (sorted[k - 1] ?? 0);
    if (interval > 0) intervals.push(interval);
  }
  if (intervals.length === 0) return null;
  const ranked = [...intervals].sort((a, b) => a - b);
  const at = (share: number): number =>
    ranked[Math.min(ranked.length - 1, Math.floor(share * ranked.length))] ?? 0;
  const median = at(0.5);
  const isOff = (interval: number): boolean =>
    Math.abs(interval - median) > Math.max(OFF_RELATIVE * median, OFF_SECONDS);
  const off = intervals.filter(isOff).length;
  const mean = (values: readonly number[]): number =>
    values.reduce((sum, value) => sum + value, 0) / values.length;
  if (off > Math.max(1, VARIABLE_SHARE * intervals.length))
    return {
      kind: 'variable',
      averageFps: 1 / mean(intervals),
      lowestFps: 1 / at(1),
      highestFps: 1 / at(0),
    };
  return { kind: 'constant', fps: 1 / mean(intervals.filter((i) => !isOff(i))), gaps: off };
};
