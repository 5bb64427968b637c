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

/** Change from which on an early turn is called, with these errors. */
const calledFrom = (pEarlyOf: (d: number) => number): number => {
  let low = CLEAR;
  let high = 2 * CONSTANTS.prior.value;
  for (let i = 0; i < 40; i += 1) {
    const middle = (low + high) / 2;
    if (pEarlyOf(middle) < EARLY) low = middle;
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
  const { uC0, uS2, uC2, nu, m, sM } = believe(pooled, uncertain, gates);
  const before = ({ uPre }: Pooled, { variance }: Uncertain): number =>
    Math.sqrt(uPre ** 2 + variance);
  const beliefs: readonly Alternative[] = alternative
    ? [{ pooled, uncertain, chance: 1 - alternative.chance }, alternative]
    : [{ pooled, uncertain, chance: 1 }];
  const mixed = (of: (pooled: Pooled, uncertain: Uncertain) => number): number =>
    beliefs.reduce((sum, each) => sum + each.chance * of(each.pooled, each.uncertain), 0);
  const above = (x: number): number => mixed((one, errors) => believe(one, errors, gates).above(x));
  const earlyAt = (change: number): number =>
    mixed((one, errors) => believe({ ...one, d: degrees(change) }, errors, gates).above(CLEAR));
  const smallest = alternative
    ? calledFrom(earlyAt) + NINE_IN_TEN * uC0
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
    pBefore60: mixed((one, errors) => studentAbove((BEFORE - one.pre) / before(one, errors), nu)),
    pNotBack: above(0),
    mdt90: degrees(smallest),
    pelvis: { value: pooled.dPelvis, u: pooled.uPelvis },
    thigh: { value: pooled.dThigh, u: pooled.uThigh },
    pre: { value: pooled.pre, u: degrees(before(pooled, uncertain)) },
    lambda: thighTurnsLittle ? pooled.lambda : null,
  };
};
