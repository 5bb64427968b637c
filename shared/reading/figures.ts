import { changeVariance } from '#shared/course/turn-process.ts';
import { degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Pooled } from './pool.ts';
import { studentAbove, studentQuantile } from './student.ts';
import type { ReadingFigures } from './types.ts';

/** Systematic error of a landmark set: u and its growth q with the change itself. */
export interface Systematic {
  readonly u: number;
  readonly q: number;
}

const REP2 = CONSTANTS.repSpread.value ** 2;
const PRIOR2 = CONSTANTS.prior.value ** 2;
const SYSTEMATIC_NU = 20;
const CLEAR = 1;
const FLAT = 5;
const BEFORE = 8;
/** Probability at which an early turn is called; a practice's own limit moves the rule, not this figure. */
const EARLY = 0.95;
const NINE_IN_TEN = 1.2816;

/** Variance of the weak prior of the change of turn between the gates: (8°)² over 30°. */
export const priorVariance = ({ from, to }: Gates): number => PRIOR2 * changeVariance(to - from);

/**
 * The assumed errors are those of 60° to 90°. Over a wider window skin slips further, as far as our
 * model says; over a narrower one nothing is taken off.
 */
export const widening = ({ from, to }: Gates): number => Math.max(1, changeVariance(to - from));

/** u₀²: a part that all reps share, a part that differs, and true spread between reps. */
export const systematicVariance = ({ u }: Systematic, reps: number, gates: Gates): number =>
  (u * u * (0.7 + 0.3 / reps) + REP2 / reps) * widening(gates);

/** Welch–Satterthwaite, with 20 degrees of freedom for the systematic part. */
export const freedom = (uR2: number, nuR: number, uS2: number): number =>
  (uR2 + uS2) ** 2 / (uR2 ** 2 / nuR + uS2 ** 2 / SYSTEMATIC_NU);

/** Systematic part of the change, degrees², for no true turn, and its growth with the change. */
export interface Uncertain {
  readonly variance: number;
  readonly q: number;
}

/** What would be believed if something else were true, and how likely that is. */
export interface Alternative {
  readonly pooled: Pooled;
  readonly uncertain: Uncertain;
  readonly chance: number;
}

/** Belief in the change after the weak prior. */
const believe = ({ d, uR, nuR }: Pooled, { variance: u02, q }: Uncertain, gates: Gates) => {
  const uR2 = uR * uR;
  const uS2 = u02 + (q * d) ** 2;
  const uC2 = uR2 + uS2;
  const nu = freedom(uR2, nuR, uS2);
  const prior = priorVariance(gates);
  const g = prior / (prior + uC2);
  const m = g * d;
  const sM = Math.sqrt(g * uC2);
  const uC0 = Math.sqrt(uR2 + u02);
  return { uC0, uS2, uC2, nu, m, sM, above: (x: number) => studentAbove((x - m) / sM, nu) };
};

/** Change from which on an early turn is called, with these errors, where `needed` is probable enough. */
const calledFrom = (pEarlyOf: (d: number) => number, needed: number): number => {
  let low = CLEAR;
  let high = 2 * CONSTANTS.prior.value;
  for (let i = 0; i < 40; i += 1) {
    const middle = (low + high) / 2;
    if (pEarlyOf(middle) < needed) low = middle;
    else high = middle;
  }
  return high;
};

interface Assumed {
  readonly thighTurnsLittle: boolean;
  readonly gates: Gates;
  readonly alternative?: Alternative | undefined;
}

/**
 * Uncertainty, belief after the weak prior, probabilities, and the smallest turn found.
 * Probabilities count an `alternative` as far as it is likely; all else stands for what is assumed.
 */
export const figuresOf = (
  pooled: Pooled,
  uncertain: Uncertain,
  { thighTurnsLittle, gates, alternative }: Assumed,
): ReadingFigures => {
  const { d, uR } = pooled;
  const u02 = uncertain.variance;
  const { uC0, uS2, uC2, nu, m, sM, above: aboveAssumed } = believe(pooled, uncertain, gates);
  const uPre = Math.sqrt(pooled.uPre ** 2 + u02);
  const chance = alternative?.chance ?? 0;
  const mixed = (assumed: number, other: (alternative: Alternative) => number): number =>
    alternative ? (1 - chance) * assumed + chance * other(alternative) : assumed;
  const aboveOther = alternative && believe(alternative.pooled, alternative.uncertain, gates).above;
  const above = (x: number): number => mixed(aboveAssumed(x), () => aboveOther?.(x) ?? NaN);
  const earlyAt = (change: number): number => {
    const at = (of: Pooled, errors: Uncertain): number =>
      believe({ ...of, d: degrees(change) }, errors, gates).above(CLEAR);
    return mixed(at(pooled, uncertain), (other) => at(other.pooled, other.uncertain));
  };
  const smallestFound = (): number =>
    alternative
      ? calledFrom(earlyAt, EARLY) + NINE_IN_TEN * uC0
      : CLEAR + (studentQuantile(EARLY, nu) + NINE_IN_TEN) * uC0;
  return {
    d,
    uC: degrees(Math.sqrt(uC2)),
    uR,
    uS: degrees(Math.sqrt(uS2)),
    uC0: degrees(uC0),
    nu,
    m: degrees(m),
    sM: degrees(sM),
    pEarly: above(CLEAR),
    pIn: 1 - above(-CLEAR),
    pFlat: above(-FLAT) - above(FLAT),
    pBefore60: mixed(studentAbove((BEFORE - pooled.pre) / uPre, nu), (other) =>
      studentAbove(
        (BEFORE - other.pooled.pre) / Math.sqrt(other.pooled.uPre ** 2 + other.uncertain.variance),
        nu,
      ),
    ),
    pNotBack: above(0),
    mdt90: degrees(smallestFound()),
    pelvis: { value: pooled.dPelvis, u: pooled.uPelvis },
    thigh: { value: pooled.dThigh, u: pooled.uThigh },
    pre: { value: pooled.pre, u: degrees(uPre) },
    lambda: thighTurnsLittle ? pooled.lambda : null,
  };
};
