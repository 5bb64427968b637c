import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { CONSTANTS } from './constants.ts';

/** Lift that a side clip shows, at a time of the front clip. */
export interface LiftSample {
  readonly time: Milliseconds;
  readonly lift: Degrees;
  /** Standard uncertainty from the marks and from the tie of the clocks. */
  readonly u: Degrees;
}

/** Lift of a front rep as the side clip of the same moment shows it. */
export interface TiedLift {
  /** Id of the side clip's rep. */
  readonly from: string;
  /** In order of time. */
  readonly samples: readonly LiftSample[];
}

/** Straight between the two frames of the side clip around it; null outside them and across a long gap. */
export const tiedLiftAt = (
  { samples }: TiedLift,
  time: Milliseconds,
): Omit<LiftSample, 'time'> | null => {
  const after = samples.findIndex((sample) => sample.time >= time);
  const next = samples[after];
  if (!next) return null;
  if (next.time === time) return { lift: next.lift, u: next.u };
  const before = samples[after - 1];
  if (!before || !(next.time - before.time <= CONSTANTS.tiedGap.value)) return null;
  const part = (time - before.time) / (next.time - before.time);
  const lift = before.lift + part * (next.lift - before.lift);
  const u = before.u + part * (next.u - before.u);
  return Number.isFinite(lift) && Number.isFinite(u)
    ? { lift: degrees(lift), u: degrees(u) }
    : null;
};
