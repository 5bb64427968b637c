import type { Reason } from '#shared/reading/reasons.ts';
import { degrees, inWords } from '#src/ui/figures.ts';
import { outOfHundred } from '#src/ui/gate-words.ts';
import type { ReadingRules } from '#shared/protocol/protocol.ts';
import { inHundred } from './probability-words.ts';

const neededWords = ({ early, turnIn, flat }: ReadingRules): string =>
  early === turnIn
    ? `A reading needs ${outOfHundred(early)} for a turn, ${outOfHundred(flat)} for holding still.`
    : `A reading needs ${outOfHundred(early)} for turning out, ${outOfHundred(turnIn)} for turning in, ${outOfHundred(flat)} for holding still.`;

/** Why the reading is what it is: the line of the rule that held, with its figure and its limit. */
export const reasonWords = (reason: Reason, rules: ReadingRules): string => {
  switch (reason.code) {
    case 'no-usable-rep':
      if (reason.reps === 0)
        return 'No rep of this side counts: none was filmed from the front, or each was left out.';
      if (reason.reps === 0) return 'No rep of this side shows what the reading needs.';
      return reason.reps === 1
        ? 'The one rep of this side cannot be measured.'
        : `None of the ${inWords(reason.reps)} reps of this side can be measured.`;
    case 'lift-under-85':
      return `${reason.reps} of ${reason.of} ${reason.of === 1 ? 'rep' : 'reps'} stayed under ${rules.liftShort}° of lift; the highest reached ${degrees(reason.highest, 0)}. The turn is read up to ${rules.gateTo}°.`;
    case 'too-uncertain':
      return `With these landmarks the change of turn is known to ${degrees(reason.u)} (one standard uncertainty). Above ${degrees(reason.limit, 0)} nothing is read from it.`;
    case 'early-probable':
      return `The probability that the hip turns out by more than 1° is ${inHundred(reason.p)} in 100; a reading needs ${outOfHundred(reason.limit)}.`;
    case 'before-60-probable':
      return `The probability that the hip turned out by more than 8° already from 30° to ${rules.gateFrom}° of lift is ${inHundred(reason.p)} in 100; a reading needs ${outOfHundred(reason.limit)}. It does not come back before ${rules.gateTo}°: ${inHundred(reason.pNotBack)} in 100, ${outOfHundred(reason.limitNotBack)} needed.`;
    case 'turn-in-probable':
      return `The probability that the hip turns in by more than 1° is ${inHundred(reason.p)} in 100; a reading needs ${outOfHundred(reason.limit)}.`;
    case 'flat-probable':
      return `The probability that the hip turns by less than 5° either way is ${inHundred(reason.p)} in 100; this reading needs ${outOfHundred(reason.limit)}.`;
    case 'nothing-probable-enough':
      return `No answer is probable enough: turning out ${inHundred(reason.pEarly)}, turning in ${inHundred(reason.pIn)}, within 5° either way ${inHundred(reason.pFlat)} in 100. ${neededWords(rules)}`;
  }
};
