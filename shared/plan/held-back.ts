import type { SafetyAnswer } from './cautions.ts';
import type { Exercise } from './exercise.ts';

/** Answers of the last safety check; null where none was given. */
export type SafetyAnswers = Readonly<Partial<Record<SafetyAnswer, boolean>>> | null;

/** The last safety check, with who cleared what was answered with yes; null where nobody did. */
export interface SafetyState {
  readonly answers: SafetyAnswers;
  readonly clearedBy: string | null;
}

/**
 * Why an exercise is held back for this person until somebody qualified has cleared it: each question answered with
 * yes, or not answered, that matters to it. Empty where nothing stands against it. Unknown is not no.
 */
export const heldBackBy = (
  { notWith }: Pick<Exercise, 'notWith'>,
  answers: SafetyAnswers,
): SafetyAnswer[] => notWith.filter((question) => answers?.[question] !== false);

/** Limits that whoever treats this person has set: a coach alone does not pass over them. */
export const SET_BY_OTHERS: readonly SafetyAnswer[] = [
  'hip-replacement-or-limits',
  'weight-bearing-limits',
  'recent-surgery-or-fracture',
];

/**
 * Why an exercise that is held back cannot be used all the same, however good the coach's reason: `ask-first` where
 * a question that matters was not answered, `needs-clearance` where somebody else set a limit and nobody is named
 * who cleared it. Null where the coach may decide.
 */
export const whyNotAllTheSame = (
  heldBy: readonly SafetyAnswer[],
  { answers, clearedBy }: SafetyState,
): 'ask-first' | 'needs-clearance' | null => {
  if (heldBy.some((question) => answers?.[question] !== true)) return 'ask-first';
  const limited = heldBy.some((question) => SET_BY_OTHERS.includes(question));
  return limited && clearedBy === null ? 'needs-clearance' : null;
};

/** Whether a decision to use an exercise all the same still covers all that stands against it. */
export const isCovered = (
  heldBy: readonly SafetyAnswer[],
  decidedOn: readonly SafetyAnswer[] | null,
): boolean => heldBy.every((question) => decidedOn?.includes(question) ?? false);
