import type { BenchResult } from '../entry.ts';
import { quantile } from '../median.ts';
import type { SideBySide } from './page.ts';

const round = (value: number | null): number | null =>
  value === null ? null : Math.round(value * 100) / 100;

/**
 * Medians in milliseconds. No ratio where either side is missing or ours showed one wrong frame:
 * a wrong frame is not fast.
 */
export const compare = ({ ours, browser }: SideBySide, bytes: number): BenchResult => {
  const a = quantile(ours.presented, 0.5);
  const b = quantile(browser.presented, 0.5);
  if (a === null) throw new Error('nothing of ours could be measured');
  return {
    ratio: b === null || ours.wrong > 0 ? null : a / b,
    a,
    b,
    info: {
      unit: 'ms',
      requests: ours.presented.length + ours.wrong,
      'p95 ours': round(quantile(ours.presented, 0.95)),
      'p95 browser': round(quantile(browser.presented, 0.95)),
      'ready ours': round(quantile(ours.ready, 0.5)),
      'ready browser': round(quantile(browser.ready, 0.5)),
      'wrong frames ours': ours.wrong,
      'wrong or late frames browser': browser.wrong,
      'copy MB': Math.round(bytes / 1e6),
    },
  };
};
