import type { CourseDifference } from '#shared/reading/compare-courses.ts';
import type { Difference } from '#shared/reading/compare.ts';
import { plusMinus, turn } from '#src/ui/figures.ts';
import type { Relation } from '../ends.ts';

/** `+3.4° ± 7.1` */
export const differenceFigure = ({ value, halfWidth }: Difference): string =>
  `${turn(value)} ${plusMinus(halfWidth)}`;

const NONE = {
  reps: 'No difference that this test can show.',
  sides: 'No difference that this test can show.',
  visits: 'No change that this test can show.',
  both: 'No difference that this test can show.',
} as const satisfies Record<Relation, string>;

const SHOWN = {
  reps: 'They differ by more than the error.',
  sides: 'The sides differ by more than the error.',
  visits: 'Changed by more than the error.',
  both: 'They differ by more than the error.',
} as const satisfies Record<Relation, string>;

export const saysOf = (difference: Difference | null, relation: Relation): string => {
  if (!difference) return 'Not known: no marked frames there on both.';
  return difference.shown ? SHOWN[relation] : NONE[relation];
};

/** The sentence above the table: what the change from gate to gate says. */
export const verdict = (difference: CourseDifference | null, relation: Relation): string => {
  if (!difference)
    return 'They were read between different gates and cannot be compared: read the older one again.';
  if (!difference.change)
    return 'Nothing could be fitted on one of them, so their changes cannot be compared.';
  return `${saysOf(difference.change, relation)} Second less first: ${differenceFigure(difference.change)}.`;
};

export const WHAT = {
  reps: 'Each rep by itself: one rep is less sure than all of its side together.',
  sides: 'All usable reps of each side together. Sides are never averaged.',
  visits: 'All usable reps of each visit together.',
  both: 'Another side and another day at once: a difference cannot be put down to either.',
} as const satisfies Record<Relation, string>;
