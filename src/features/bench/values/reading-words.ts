import { readingLabel as labelOf } from '#shared/contracts/readings.ts';
import { landmark } from '#shared/landmarks/table.ts';
import type { Settle } from '#shared/reading/reasons.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { degrees } from '#src/ui/figures.ts';
import { countWords } from '../lead/lead-words.ts';

/** `“Can’t tell yet”`, and before the lower gate where it is so. */
export const readingLabel = ({ code, before60, rules }: ReadingResult): string =>
  labelOf(code, before60, rules.gateFrom);

/** The first thing that would settle the reading, in one sentence; `nameOf` gives a rep its number. */
export const settleWords = (settle: Settle, nameOf: (rep: string) => string | null): string => {
  const of = (rep: string) => {
    const name = nameOf(rep);
    return name === null ? '' : ` of ${name}`;
  };
  switch (settle.code) {
    case 'mark-frames':
      return `${countWords(settle.more, 'more frame')}${of(settle.rep)} with a lift from ${degrees(settle.from, 0)} to ${degrees(settle.to, 0)}.`;
    case 'mark-quiet-frames':
      return `${countWords(settle.more, 'more quiet frame')}${of(settle.rep)}.`;
    case 'give-scale':
      return 'The scale: two ends of the rod, or the body height.';
    case 'give-distance':
      return 'The distance from the lens to the athlete.';
    case 'give-pointer-length':
      return `The length of the ${settle.pointer} pointer.`;
    case 'mark-landmarks': {
      const [first, ...more] = settle.landmarks;
      if (first === undefined) return '';
      const others = more.length > 0 ? ` and ${more.length} more` : '';
      return `On the marked frames${of(settle.rep)}: ${landmark(first).label.toLowerCase()}${others}.`;
    }
    case 'film-from-front':
      return 'A clip from the front: the turn is not seen from here.';
    case 'lift-higher':
      return `A higher lift: it reached ${degrees(settle.reached, 0)} of ${degrees(settle.needed, 0)}.`;
    case 'stand-still-first':
      return 'Stand still for three seconds first, then film again.';
    case 'another-rep':
      return `Another rep: ±${degrees(1.96 * settle.from)} would become ±${degrees(1.96 * settle.u)}.`;
    case 'richer-set':
      return settle.set === 'belt+thigh'
        ? `Belt and thigh pointers: about ±${degrees(1.96 * settle.u)}.`
        : `A belt pointer: about ±${degrees(1.96 * settle.u)}.`;
  }
};
