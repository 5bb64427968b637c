import type { BenchResult } from '../entry.ts';
import type { SideBySide } from './page.ts';

const at = (values: readonly number[], share: number): number | null => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? null;
};

export const median = (values: readonly number[]): number | null => at(values, 0.5);

const round = (value: number | null): number | null =>
  value === null ? null : Math.round(value * 100) / 100;

/**
 * Medians in milliseconds. No ratio where either side is missing or ours showed one wrong frame:
 * a wrong frame is not fast.
 */
export const compare = ({ ours, browser }: SideBySide, bytes: number): BenchResult => {
  const a = median(ours.presented);
  const b = median(browser.presented);
  if (a === null) throw new Error('nothing of ours could be measured');
  return {
    ratio: b === null || ours.wrong > 0 ? null : a / b,
    a,
    b,
    info: {
      unit: 'ms',
      requests: ours.presented.length + ours.wrong,
      'p95 ours': round(at(ours.presented, 0.95)),
      'p95 browser': round(at(browser.presented, 0.95)),
      'ready ours': round(median(ours.ready)),
      'ready browser': round(median(browser.ready)),
      'wrong frames ours': ours.wrong,
      'wrong or late frames browser': browser.wrong,
      'copy MB': Math.round(bytes / 1e6),
    },
  };
};
