import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import type { FramePair } from './types.ts';

/** Between rise and fall both leave what they share: the pause there is no longer than this, ms of the film. */
const LONGEST_PAUSE_MS = 200;
/** Moments follow each other strictly. */
const LEAST_STEP_MS = 1;

/** When each moment is due, on a clock of the two films' mean: neither is hurried more than the other. */
export const scheduleOf = (
  moments: readonly FramePair[],
  firstTimes: readonly Milliseconds[],
  secondTimes: readonly Milliseconds[],
): Milliseconds[] => {
  const at = ({ first, second }: FramePair): number =>
    ((firstTimes[first.frame] ?? 0) + (secondTimes[second.frame] ?? 0)) / 2;
  let due = 0;
  return moments.map((moment, n) => {
    const before = moments[n - 1];
    if (before) {
      const step = at(moment) - at(before);
      due += Math.min(LONGEST_PAUSE_MS, Math.max(LEAST_STEP_MS, step));
    }
    return milliseconds(due);
  });
};
