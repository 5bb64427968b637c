import type { Call } from '#shared/contracts/calls.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';

export interface AgreementWords {
  readonly head: string;
  readonly tail: string;
}

/** The reading that says the same as what was seen. */
const SAME: Partial<Record<Call['seen'], ReadingCode>> = {
  early: 'early-turn-out',
  'on-time': 'expected-turn-in',
  still: 'holds-still',
};
const FIRM: ReadonlySet<ReadingCode> = new Set([
  'early-turn-out',
  'expected-turn-in',
  'holds-still',
]);

/** Whether eye and measurement say the same; where one of them says nothing there is nothing to compare. */
export const agreementWords = (seen: Call['seen'], code: ReadingCode): AgreementWords => {
  const eye = SAME[seen] !== undefined;
  const measured = FIRM.has(code);
  if (!eye && !measured)
    return {
      head: 'Neither says.',
      tail: 'There is nothing to compare, and it counts for nobody.',
    };
  if (!eye)
    return {
      head: 'The eye was unsure.',
      tail: 'The measurement stands alone and counts for nobody.',
    };
  if (!measured)
    return {
      head: 'The measurement does not say.',
      tail: 'The call by eye stands alone and counts for nobody.',
    };
  return SAME[seen] === code
    ? { head: 'Eye and measurement agree.', tail: '' }
    : {
        head: 'Eye and measurement differ.',
        tail: 'Look at the clip again before you decide; neither is always right.',
      };
};
