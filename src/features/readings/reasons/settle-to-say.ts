import type { Settle } from '#shared/reading/reasons.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { faultsToSay } from '../words/rep-fault-words.ts';

const FILMED_WRONG = new Set(['view-cannot-show-turn', 'other-side', 'excluded']);

/**
 * What is worth doing, in the engine's order: nothing that asks for marks on a rep which cannot count
 * however it is marked, and 'lift higher' once, from the highest lift.
 */
export const settleToSay = ({ settle, reps }: ReadingResult): Settle[] => {
  const hopeless = new Set(
    reps
      .filter(({ why }) => faultsToSay(why).some(({ code }) => FILMED_WRONG.has(code)))
      .map(({ id }) => id),
  );
  const all = hopeless.size === reps.length;
  const highest = Math.max(
    ...settle.flatMap((each) => (each.code === 'lift-higher' ? [each.reached] : [])),
  );
  return settle.filter((each) => {
    if ('rep' in each && hopeless.has(each.rep)) return false;
    if (each.code === 'stand-still-first' && all) return false;
    return each.code !== 'lift-higher' || each.reached === highest;
  });
};
