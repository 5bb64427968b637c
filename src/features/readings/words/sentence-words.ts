import type { Side } from '#shared/contracts/primitives.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { degrees } from '#src/ui/figures.ts';
import { gateRange, levelWords } from '#src/ui/gate-words.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';

const way = (d: number): string => (d < 0 ? 'inwards' : 'outwards');
const size = (d: number): string => degrees(Math.abs(d));

/** The reading in one or two plain sentences, with its figure. */
export const readingSentence = (result: ReadingResult, side: Side): string => {
  const { figures, code, before60, rules } = result;
  const range = gateRange(gatesOf(rules));
  const lifted = otherSide(side);
  if (!figures)
    return code === 'lift-stops-short'
      ? `The ${lifted} thigh did not come near ${levelWords(rules.gateTo)}, so what the ${side} hip does there was not seen.`
      : `What the ${side} hip did cannot be measured from these marks.`;
  const { d, uC, pre } = figures;
  const rose = `While the ${lifted} thigh rose from ${range}, the ${side} hip, the one stood on, turned ${way(d)} by ${size(d)}, give or take ${degrees(1.96 * uC)}.`;
  switch (code) {
    case 'early-turn-out':
      return before60
        ? `The ${side} hip, the one stood on, turned out by ${size(pre.value)} already while the ${lifted} thigh rose from 30° to ${rules.gateFrom}°. From ${range} it turned ${way(d)} by ${size(d)}, give or take ${degrees(1.96 * uC)}.`
        : `${rose} Expected here is a hip that turns in.`;
    case 'expected-turn-in':
      return `${rose} That is what is expected here.`;
    case 'holds-still':
      return `${rose} No turn-in was seen, which is not a pass.`;
    case 'cannot-tell':
      return `${rose} That is too wide to say whether it turns out early, holds or turns in.`;
    default:
      return `${rose} That is too uncertain to read.`;
  }
};

/** What the probability beside the reading is of, `p` from 0 to 1 and where the reading begins. */
export interface Certainty {
  readonly p: number;
  readonly limit: number;
  readonly of: string;
}

/** The probability that decided; for an undecided reading the likelier of the two turns. Null where there is none. */
export const certaintyOf = ({ reason, rules }: ReadingResult): Certainty | null => {
  switch (reason.code) {
    case 'early-probable':
      return { p: reason.p, limit: reason.limit, of: 'for turning out early' };
    case 'before-60-probable':
      return { p: reason.p, limit: reason.limit, of: `for turning out before ${rules.gateFrom}°` };
    case 'turn-in-probable':
      return { p: reason.p, limit: reason.limit, of: 'for turning in' };
    case 'flat-probable':
      return { p: reason.p, limit: reason.limit, of: 'for less than 5° either way' };
    case 'nothing-probable-enough':
      return reason.pEarly >= reason.pIn
        ? { p: reason.pEarly, limit: rules.early, of: 'for turning out early' }
        : { p: reason.pIn, limit: rules.turnIn, of: 'for turning in' };
    default:
      return null;
  }
};
