import type { ReadingCode } from '#shared/reading/types.ts';
import type { ExerciseId } from './library.ts';

/** What a plan starts from: what the marks said, or what the coach saw. */
export type PlanBasis =
  | {
      readonly kind: 'reading';
      readonly code: ReadingCode;
      /**
       * Which part of the turn is the larger one beyond doubt; null where that is not known, as without both
       * pointers it never is.
       */
      readonly carrier: 'pelvis' | 'thigh' | null;
    }
  | { readonly kind: 'call'; readonly seen: 'early' | 'on-time' | 'still' | 'unsure' };

/** Codes of a reading and of a call by eye to which a rule answers. */
export interface RuleWhen {
  readonly readings: readonly Extract<PlanBasis, { kind: 'reading' }>['code'][];
  readonly calls: readonly Extract<PlanBasis, { kind: 'call' }>['seen'][];
  /** Set where the rule needs to know which part carries the turn. */
  readonly carrier: 'pelvis' | 'thigh' | null;
}

/** A rule that anybody can read: when this was found, these come in this order. */
export interface PlanRule {
  readonly id: string;
  readonly when: RuleWhen;
  /** In stages: the next begins when the criteria to go on are met. */
  readonly stages: readonly (readonly ExerciseId[])[];
  readonly because: string;
}

const EARLY = { readings: ['early-turn-out'], calls: ['early'] } as const;

/** The rules that a practice starts with; all common practice, no source. The first that fits is used. */
export const STANDARD_RULES: readonly PlanRule[] = [
  {
    id: 'early-by-the-pelvis',
    when: { ...EARLY, carrier: 'pelvis' },
    stages: [
      ['foot-tripod', 'supported-hinge'],
      ['half-kneeling-shift', 'staggered-hinge'],
      ['single-leg-hinge', 'hold-to-60'],
    ],
    because:
      'The pelvis turns away from the standing leg early: it first learns to turn back over it with the hands to help, then with one knee down or feet apart, then on one leg.',
  },
  {
    id: 'early-by-the-thigh',
    when: { ...EARLY, carrier: 'thigh' },
    stages: [
      ['foot-tripod', 'supported-hinge'],
      ['split-squat', 'half-kneeling-shift'],
      ['hold-to-60', 'step-up'],
    ],
    because:
      'The standing thigh turns out early while the pelvis stays: foot and thigh are first held while the hip bends with help, then under load with both feet down, then on one leg.',
  },
  {
    id: 'early',
    when: { ...EARLY, carrier: null },
    stages: [
      ['foot-tripod', 'supported-hinge'],
      ['half-kneeling-shift', 'staggered-hinge'],
      ['single-leg-hinge', 'hold-to-60'],
    ],
    because:
      'The standing hip turns out early: the pelvis first turns back over the standing leg with the hands to help, then with one knee down or feet apart, then on one leg.',
  },
  {
    id: 'still',
    when: { readings: ['holds-still'], calls: ['still'], carrier: null },
    stages: [
      ['foot-tripod', 'half-kneeling-shift'],
      ['hold-to-60', 'staggered-hinge'],
      ['hold-to-90', 'step-up'],
    ],
    because:
      'No turn in was seen, which is not a pass: the turn is practised with one knee down, then carried into the hold and the step.',
  },
  {
    id: 'on-time',
    when: { readings: ['expected-turn-in'], calls: ['on-time'], carrier: null },
    stages: [
      ['single-leg-hinge', 'hold-to-90'],
      ['step-up', 'wall-march'],
      ['march-drill', 'skip-drill'],
    ],
    because: 'The standing hip turns in on time: load and speed come next.',
  },
  {
    id: 'stops-short',
    when: { readings: ['lift-stops-short'], calls: [], carrier: null },
    stages: [['lying-knee-lift'], ['hold-to-60'], ['hold-to-90']],
    because:
      'The lift stops before the upper gate, so nothing is known beyond: the lift is made free lying down, then standing.',
  },
];
