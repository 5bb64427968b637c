import { type FrameIndex, frameIndex, type Milliseconds } from './units.ts';

/** What is wrong with a list of timestamps, and at which place of the list (from 0). */
export type TimestampFault =
  | { readonly code: 'time-not-a-number'; readonly at: number }
  | { readonly code: 'time-repeated'; readonly at: number; readonly time: Milliseconds }
  | {
      readonly code: 'time-runs-backward';
      readonly at: number;
      readonly from: Milliseconds;
      readonly to: Milliseconds;
    };

/** The first fault of a list that must rise strictly, or null. */
export const timestampFault = (times: readonly Milliseconds[]): TimestampFault | null => {
  for (const [at, time] of times.entries()) {
    if (!Number.isFinite(time)) return { code: 'time-not-a-number', at };
    const before = times[at - 1];
    if (before === undefined) continue;
    if (time === before) return { code: 'time-repeated', at, time };
    if (time < before) return { code: 'time-runs-backward', at, from: before, to: time };
  }
  return null;
};

/** The frame shown at a time: the last one that began at or before it; null before the first. */
export const frameAt = (times: readonly Milliseconds[], time: Milliseconds): FrameIndex | null => {
  if (!Number.isFinite(time)) return null;
  let low = 0;
  let high = times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((times[middle] ?? Infinity) <= time) low = middle + 1;
    else high = middle;
  }
  return low === 0 ? null : frameIndex(low - 1);
};
