import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { Reason } from './reasons.ts';
import type { ReadingCode, ReadingFigures, ReadingResult } from './types.ts';

export const LIMITS = {
  early: 0.95,
  before60: 0.975,
  notBack: 0.8,
  turnIn: 0.95,
  flat: 0.8,
  /** Lift under which a rep stopped short. */
  liftShort: 85,
} as const;

export type Decision = Pick<ReadingResult, 'code' | 'line' | 'before60' | 'reason'>;

const decision = (
  line: Decision['line'],
  code: ReadingCode,
  reason: Reason,
  before60 = false,
): Decision => ({ line, code, before60, reason });

/** Line 1: no rep can be used. `highest` holds the highest lift of each rep, null where unknown. */
export const decideWithoutRep = (highest: readonly (Degrees | null)[]): Decision => {
  const known = highest.flatMap((lift) => lift ?? []);
  const short = known.filter((lift) => lift < LIMITS.liftShort);
  if (short.length > 0 && 2 * short.length >= highest.length)
    return decision(1, 'lift-stops-short', {
      code: 'lift-under-85',
      reps: short.length,
      of: highest.length,
      highest: degrees(Math.max(...known)),
    });
  return decision(1, 'not-measurable', { code: 'no-usable-rep', reps: highest.length });
};

/** Lines 2 to 7: the first that holds. */
export const decide = (figures: ReadingFigures): Decision => {
  const { uC0, pEarly, pBefore60, pNotBack, pIn, pFlat } = figures;
  const limit = CONSTANTS.uncertainLimit.value;
  if (uC0 > limit)
    return decision(2, 'not-measurable', { code: 'too-uncertain', u: uC0, limit: degrees(limit) });
  if (pEarly >= LIMITS.early)
    return decision(3, 'early-turn-out', {
      code: 'early-probable',
      p: pEarly,
      limit: LIMITS.early,
    });
  if (pBefore60 >= LIMITS.before60 && pNotBack >= LIMITS.notBack)
    return decision(
      4,
      'early-turn-out',
      {
        code: 'before-60-probable',
        p: pBefore60,
        limit: LIMITS.before60,
        pNotBack,
        limitNotBack: LIMITS.notBack,
      },
      true,
    );
  if (pIn >= LIMITS.turnIn)
    return decision(5, 'expected-turn-in', {
      code: 'turn-in-probable',
      p: pIn,
      limit: LIMITS.turnIn,
    });
  if (pFlat >= LIMITS.flat)
    return decision(6, 'holds-still', { code: 'flat-probable', p: pFlat, limit: LIMITS.flat });
  return decision(7, 'cannot-tell', { code: 'nothing-probable-enough', pEarly, pIn, pFlat });
};
