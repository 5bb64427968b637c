import { type Degrees, degrees } from '#shared/geometry/units.ts';

/** Change of turn of one reading and its total standard uncertainty. */
export interface Compared {
  readonly d: Degrees;
  readonly uC: Degrees;
}

export interface Difference {
  readonly value: Degrees;
  /** ± (95 %) of the difference; it counts only beyond this. */
  readonly halfWidth: Degrees;
  readonly shown: boolean;
}

const difference = (from: Compared, to: Compared): Difference | null => {
  const value = to.d - from.d;
  const halfWidth = 1.96 * Math.hypot(from.uC, to.uC);
  if (!Number.isFinite(value) || !Number.isFinite(halfWidth)) return null;
  return {
    value: degrees(value),
    halfWidth: degrees(halfWidth),
    shown: Math.abs(value) > halfWidth,
  };
};

/**
 * Left less right. Not shown: 'no difference that this test can show'. Sides are never averaged.
 * Null where a figure is not finite.
 */
export const sidesDifference = (left: Compared, right: Compared): Difference | null =>
  difference(right, left);

/** Later less earlier. Not shown: 'no change that this test can show'. */
export const retestChange = (earlier: Compared, later: Compared): Difference | null =>
  difference(earlier, later);
