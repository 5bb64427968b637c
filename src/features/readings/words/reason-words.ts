import type { Reason } from '#shared/reading/reasons.ts';
import { degrees, inWords } from '#src/ui/figures.ts';
import { inHundred } from './probability-words.ts';

/** Why the reading is what it is: the line of the rule that held, with its figure and its limit. */
export const reasonWords = (reason: Reason): string => {
  switch (reason.code) {
    case 'no-usable-rep':
      if (reason.reps === 0)
        return 'No rep of this side counts: none was filmed from the front, or each was left out.';
      if (reason.reps === 0) return 'No rep of this side shows what the reading needs.';
      return reason.reps === 1
        ? 'The one rep of this side cannot be measured.'
        : `None of the ${inWords(reason.reps)} reps of this side can be measured.`;
    case 'lift-under-85':
      return `${reason.reps} of ${reason.of} ${reason.of === 1 ? 'rep' : 'reps'} stayed under 85° of lift; the highest reached ${degrees(reason.highest, 0)}. The turn is read up to 90°.`;
    case 'too-uncertain':
      return `With these landmarks the change of turn is known to ${degrees(reason.u)} (one standard uncertainty). Above ${degrees(reason.limit, 0)} nothing is read from it.`;
    case 'early-probable':
      return `The probability that the hip turns out by more than 1° is ${inHundred(reason.p)} in 100; a reading needs ${Math.round(100 * reason.limit)}.`;
    case 'before-60-probable':
      return `The probability that the hip turned out by more than 8° already from 30° to 60° of lift is ${inHundred(reason.p)} in 100; a reading needs ${100 * reason.limit}. It does not come back before 90°: ${inHundred(reason.pNotBack)} in 100, ${Math.round(100 * reason.limitNotBack)} needed.`;
    case 'turn-in-probable':
      return `The probability that the hip turns in by more than 1° is ${inHundred(reason.p)} in 100; a reading needs ${Math.round(100 * reason.limit)}.`;
    case 'flat-probable':
      return `The probability that the hip turns by less than 5° either way is ${inHundred(reason.p)} in 100; this reading needs ${Math.round(100 * reason.limit)}.`;
    case 'nothing-probable-enough':
      return `No answer is probable enough: turning out ${inHundred(reason.pEarly)}, turning in ${inHundred(reason.pIn)}, within 5° either way ${inHundred(reason.pFlat)} in 100. A reading needs 95 for a turn, 80 for holding still.`;
  }
};
