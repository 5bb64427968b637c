import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { ReadingRules } from '#shared/protocol/protocol.ts';
import type { Reason } from './reasons.ts';
import type { ReadingCode, ReadingFigures, ReadingResult } from './types.ts';

/** A turn before the lower gate must not come back before the upper one: from our model, no source. */
const NOT_BACK = 0.8;

export type Decision = Pick<ReadingResult, 'code' | 'line' | 'before60' | 'reason'>;

const decision = (
  line: Decision['line'],
  code: ReadingCode,
  reason: Reason,
  before60 = false,
): Decision => ({ line, code, before60, reason });

/** Line 1: no rep can be used. `highest` holds the highest lift of each rep, null where unknown. */
export const decideWithoutRep = (
  highest: readonly (Degrees | null)[],
  { liftShort }: ReadingRules,
): Decision => {
  const known = highest.flatMap((lift) => lift ?? []);
  const short = known.filter((lift) => lift < liftShort);
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
export const decide = (figures: ReadingFigures, rules: ReadingRules): Decision => {
  const { uC0, pEarly, pBefore60, pNotBack, pIn, pFlat } = figures;
  const limit = CONSTANTS.uncertainLimit.value;
  if (uC0 > limit)
    return decision(2, 'not-measurable', { code: 'too-uncertain', u: uC0, limit: degrees(limit) });
  if (pEarly >= rules.early)
    return decision(3, 'early-turn-out', {
      code: 'early-probable',
      p: pEarly,
      limit: rules.early,
    });
  if (pBefore60 >= rules.before && pNotBack >= NOT_BACK)
    return decision(
      4,
      'early-turn-out',
      {
        code: 'before-60-probable',
        p: pBefore60,
        limit: rules.before,
        pNotBack,
        limitNotBack: NOT_BACK,
      },
      true,
    );
  if (pIn >= rules.turnIn)
    return decision(5, 'expected-turn-in', {
      code: 'turn-in-probable',
      p: pIn,
      limit: rules.turnIn,
    });
  if (pFlat >= rules.flat)
    return decision(6, 'holds-still', { code: 'flat-probable', p: pFlat, limit: rules.flat });
  return decision(7, 'cannot-tell', { code: 'nothing-probable-enough', pEarly, pIn, pFlat });
};
