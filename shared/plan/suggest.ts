import type { ExerciseId } from './library.ts';
import type { PlanBasis, PlanRule } from './rules.ts';

/** One exercise of a suggestion, in the stage in which its turn comes (from 1). */
export interface Suggested {
  readonly exercise: ExerciseId;
  readonly stage: number;
}

export type Suggestion =
  | {
      readonly kind: 'plan';
      readonly rule: string;
      readonly because: string;
      readonly exercises: readonly Suggested[];
    }
  | { readonly kind: 'retest'; readonly because: string };

/**
 * What the practice's rules suggest. The first rule that fits decides; nothing else does.
 * What is not known leads to a retest: no exercise is chosen from a reading that says nothing.
 */
export function suggest(basis: PlanBasis, rules: readonly PlanRule[]): Suggestion {
  if (basis.kind === 'call' && basis.seen === 'unsure')
    return { kind: 'retest', because: 'The coach was not sure: test again before a plan is made.' };
  if (basis.kind === 'reading' && (basis.code === 'cannot-tell' || basis.code === 'not-measurable'))
    return {
      kind: 'retest',
      because: 'The reading does not tell yet: see what would settle it, and test again first.',
    };
  const rule = rules.find((each) => fits(each, basis));
  if (!rule)
    return { kind: 'retest', because: 'No rule of this practice answers to this finding.' };
  return {
    kind: 'plan',
    rule: rule.id,
    because: rule.because,
    exercises: rule.stages.flatMap((stage, n) =>
      stage.map((exercise) => ({ exercise, stage: n + 1 })),
    ),
  };
}

const fits = ({ when }: PlanRule, basis: PlanBasis): boolean =>
  basis.kind === 'call'
    ? when.carrier === null && when.calls.includes(basis.seen)
    : when.readings.includes(basis.code) &&
      (when.carrier === null || when.carrier === basis.carrier);

/** A part of the turn and its standard uncertainty, degrees. */
interface Part {
  readonly value: number;
  readonly u: number;
}

/**
 * Which part of a turn is the larger one, by more than chance (1.96 of the difference's uncertainty, the parts'
 * errors taken as independent). Null where it is not shown, and always without both pointers.
 */
export const carrierOf = (
  parts: { readonly pelvis: Part; readonly thigh: Part } | null,
): 'pelvis' | 'thigh' | null => {
  if (parts === null) return null;
  const { pelvis, thigh } = parts;
  const larger = pelvis.value - thigh.value;
  if (!(Math.abs(larger) > 1.96 * Math.hypot(pelvis.u, thigh.u))) return null;
  return larger > 0 ? 'pelvis' : 'thigh';
};
