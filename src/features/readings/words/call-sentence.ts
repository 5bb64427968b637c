import type { Call } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { roseWords } from '#src/ui/gate-words.ts';

/** A call by eye in one sentence; the eye judges the way of the thigh from gate to gate. */
export const callSentence = (
  { seen, gates }: Pick<Call, 'seen' | 'gates'>,
  side: Side,
  lifted: Side,
): string => {
  const hip = `To the eye the ${side} hip, the one stood on,`;
  const while_ = `while the ${lifted} thigh ${roseWords(gates)}`;
  switch (seen) {
    case 'early':
      return `${hip} swung outwards ${while_}.`;
    case 'on-time':
      return `${hip} turned in ${while_}.`;
    case 'still':
      return `${hip} did not turn either way ${while_}. No turn-in was seen, which is not a pass.`;
    case 'unsure':
      return `The eye could not tell what the ${side} hip, the one stood on, did ${while_}.`;
  }
};
