import type * as z from 'zod';
import { safetyBody, SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';

/** The contract, and for a minor somebody they trust in the room. */
export const safetyFormFor = (minor: boolean) =>
  safetyBody.refine((value) => !minor || value.chaperone === true, {
    path: ['chaperone'],
    message: 'A minor is not filmed alone: ask a guardian or a chaperone into the room.',
  });

export type SafetyTyped = z.input<typeof safetyBody>;
export type SafetyValues = z.output<typeof safetyBody>;

/** Every question starts unanswered: nobody is assumed to be well. */
export const unanswered = (minor: boolean) => ({
  answers: {},
  supportWithinReach: false,
  knowsWhenToStop: false,
  chaperone: minor ? false : null,
  clearedBy: null,
});

/** The questions answered with yes, in their order. */
export const yesAnswers = (answers: Partial<Record<string, boolean>>) =>
  SAFETY_QUESTIONS.filter((question) => answers[question] === true);
