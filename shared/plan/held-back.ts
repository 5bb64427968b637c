import type { SafetyAnswer } from './cautions.ts';
import type { Exercise } from './exercise.ts';

/** Answers of the last safety check; null where none was given. */
export type SafetyAnswers = Readonly<Partial<Record<SafetyAnswer, boolean>>> | null;

/**
 * Why an exercise is held back for this person until somebody qualified has cleared it: each question answered with
 * yes, or not answered, that matters to it. Empty where nothing stands against it. Unknown is not no.
 */
export const heldBackBy = (
  { notWith }: Pick<Exercise, 'notWith'>,
  answers: SafetyAnswers,
): SafetyAnswer[] => notWith.filter((question) => answers?.[question] !== false);
