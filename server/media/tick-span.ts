import { secondsOf } from './rational.ts';
import type { Rational } from './types.ts';

/** Whole ticks of the original's clock: the first one wanted, and the first one no longer wanted. */
export interface TickSpan {
  readonly from: number;
  readonly to: number;
}

/**
 * Starts at the key frame before the span and keeps the original's clock, so that `trim` can compare
 * whole ticks; the seconds only need to lie before the span.
 */
export function seekArgs({ from }: TickSpan, timeBase: Rational): string[] {
  const before = secondsOf({ ticks: from, timeBase }) - 0.01;
  // at the very start there is nothing to jump over
  const jump = before > 0 ? ['-seek_timestamp', '1', '-ss', before.toFixed(6)] : [];
  return ['-copyts', '-noaccurate_seek', ...jump];
}

export const trim = ({ from, to }: TickSpan): string => `trim=start_pts=${from}:end_pts=${to}`;
