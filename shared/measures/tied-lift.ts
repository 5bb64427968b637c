import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { CONSTANTS } from './constants.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from './inputs.ts';

/** Lift that a side clip shows, at a time of the front clip. */
export interface LiftSample {
  readonly time: Milliseconds;
  readonly lift: Degrees;
  /** Standard uncertainty from the marks of this frame of the side clip, placed with an error of 3 px. */
  readonly u: Degrees;
  /**
   * How far it moves with one standard error of each moment that the clocks are tied by: the frames of a
   * rep move together, so that many of them do not lessen it.
   */
  readonly byTie: readonly Degrees[];
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
  if (next.time === time) return { lift: next.lift, u: next.u, byTie: next.byTie };
  const before = samples[after - 1];
  if (!before || !(next.time - before.time <= CONSTANTS.tiedGap.value)) return null;
  const part = (time - before.time) / (next.time - before.time);
  const lift = before.lift + part * (next.lift - before.lift);
  const u = before.u + part * (next.u - before.u);
  return Number.isFinite(lift) && Number.isFinite(u)
    ? {
        lift: degrees(lift),
        u: degrees(u),
        byTie: next.byTie.map((shift, k) => {
          const from = before.byTie[k] ?? NaN;
          return degrees(from + part * (shift - from));
        }),
      }
    : null;
};

/** Standard uncertainty of one value: its marks and the tie. */
export const tiedUncertainty = ({ u, byTie }: Omit<LiftSample, 'time'>): number =>
  Math.hypot(u, ...byTie);

/** The same lift where the marks of the side clip are placed with another typical error. */
export const withMarkError = (lift: TiedLift, { anatomicalPx }: MarkError): TiedLift => {
  const factor = anatomicalPx / ASSUMED_MARK_ERROR.anatomicalPx;
  return factor === 1
    ? lift
    : { ...lift, samples: lift.samples.map((each) => ({ ...each, u: degrees(factor * each.u) })) };
};
