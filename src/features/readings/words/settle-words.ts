import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import type { Settle } from '#shared/reading/reasons.ts';
import { capital, decimal, degrees, inWords, plusMinus } from '#src/ui/figures.ts';
import { landmarkNames } from './landmark-words.ts';
import type { NameOf } from './rep-names.ts';

export interface SettleWords {
  /** What to do. */
  readonly act: string;
  /** What it would bring, where that is known. */
  readonly gain: string | null;
}

const becomes = (from: number, to: number): string =>
  `${plusMinus(1.96 * from)}° would become about ${plusMinus(1.96 * to)}°`;
const percent = (share: number): string => `${decimal(100 * share, 0)} %`;
const scaleErrorWords = `a scale that is ${percent(LIMITS.scaleError.value)} off`;
const frames = (count: number, kind = ''): string =>
  `${inWords(count)} more ${kind}${count === 1 ? 'frame' : 'frames'}`;

/** A stretch of lift as narrow as this is one end of the window, degrees. */
const END_WIDTH = 30;

/** `from 54° to 66°`; a bound beyond what a leg can do is none. */
export const liftRange = (from: number, to: number): string =>
  to >= 170 ? `of ${degrees(from, 0)} or more` : `from ${degrees(from, 0)} to ${degrees(to, 0)}`;

/** What would settle a reading that is not settled. */
export const settleWords = (settle: Settle, nameOf: NameOf): SettleWords => {
  switch (settle.code) {
    case 'mark-frames':
      return {
        act: `Mark ${frames(settle.more)} of ${nameOf(settle.rep)} with a lift ${liftRange(settle.from, settle.to)}`,
        gain:
          settle.to - settle.from <= END_WIDTH
            ? 'Marks at the ends of the window are worth most.'
            : null,
      };
    case 'mark-quiet-frames':
      return {
        act: `Mark ${frames(settle.more, 'quiet ')} of ${nameOf(settle.rep)}`,
        gain: 'They say where zero is.',
      };
    case 'give-scale':
      return {
        act: 'Give the scale: two ends of the rod, or the body height',
        gain: `Without it no turn can be computed; ${scaleErrorWords} makes it ${percent(LIMITS.turnErrorByScale.value)} wrong.`,
      };
    case 'give-distance':
      return {
        act: 'Give the distance from the lens to the athlete',
        gain: 'Without it no turn can be computed.',
      };
    case 'give-pointer-length':
      return {
        act: `Give the length of the ${settle.pointer} pointer`,
        gain: 'The pointer then counts.',
      };
    case 'mark-landmarks':
      return {
        act: `Mark on ${nameOf(settle.rep)}: ${landmarkNames(settle.landmarks)}`,
        gain: null,
      };
    case 'film-from-front':
      return {
        act: 'Film the lift from the front',
        gain: 'The turn cannot be measured from another view.',
      };
    case 'lift-higher':
      return {
        act: `Lift higher: ${degrees(settle.reached, 0)} was reached, ${degrees(settle.needed, 0)} is needed`,
        gain: 'Only as far as it goes without pain.',
      };
    case 'stand-still-first':
      return {
        act: 'Stand still for three seconds first, then film again',
        gain: 'Zero is the athlete’s own quiet stance.',
      };
    case 'another-rep':
      return { act: 'Add another rep', gain: capital(becomes(settle.from, settle.u)) };
    case 'richer-set':
      return {
        act:
          settle.set === 'belt+thigh'
            ? 'Film once more with belt and thigh pointers'
            : 'Film once more with a belt pointer',
        gain: capital(becomes(settle.from, settle.u)),
      };
  }
};
