import { CONSTANTS } from '#shared/measures/constants.ts';
import { corner } from './corner.ts';
import { normalBelow, normalDensity } from './normal.ts';

/** How far apart two lifts are before their speeds of turning tell little of each other, degrees. */
const REACH = CONSTANTS.turnReach.value;

/**
 * ∫₀ˣ∫₀ʸ exp(−z²/2·REACH²) dz dy, up to a constant: from it follows the covariance of a curve
 * whose slope is as alike at two lifts as they are near.
 */
const doubleIntegral = (x: number): number => {
  const z = x / REACH;
  const root = Math.sqrt(2 * Math.PI);
  return REACH * REACH * root * (z * (normalBelow(z) - 0.5) + normalDensity(z));
};

const AT_ZERO = doubleIntegral(0);

const raw = (a: number, b: number): number =>
  doubleIntegral(a) + doubleIntegral(b) - doubleIntegral(a - b) - AT_ZERO;

/** Widths and variances are counted in stretches of 30° of lift. */
const SPAN = 30;
const [FROM, TO] = [60, 60 + SPAN];
const UNIT = raw(FROM, FROM) + raw(TO, TO) - 2 * raw(FROM, TO);

/**
 * Covariance of a smooth curve of the lift that is 0 at 0°, between its values at two lifts. Its
 * change over any 30° has the standard deviation 1: none is expected to be larger than another.
 */
export const turnCovariance = (a: number, b: number): number => raw(a, b) / UNIT;

/** Variance of that curve's change over a stretch of lift, wherever it lies: 1 over 30°. */
export const changeVariance = (width: number): number =>
  (doubleIntegral(width) - AT_ZERO) / (doubleIntegral(SPAN) - AT_ZERO);

/**
 * The same for a turn that begins and ends at the gates and is even between them; its change from
 * gate to gate has the variance of the smooth curve's.
 */
export const gatedCovariance = (from: number, to: number): ((a: number, b: number) => number) => {
  const bent = (lift: number): number => corner(lift - from) - corner(lift - to);
  const unit = changeVariance(to - from) / (bent(to) - bent(from)) ** 2;
  return (a, b) => bent(a) * bent(b) * unit;
};
