import { Problem } from './problem.ts';

/** What the reader of forms says of one that ends too early, and of one that is not written as a form. */
const ENDED = /unexpected end of form|aborted/i;
const UNREADABLE = /malformed|missing content-type|boundary not found|unsupported content type/i;

/** The problem that a form's reader names by its message alone; anything else as it was. */
export const formFault = (error: unknown): unknown => {
  if (!(error instanceof Error)) return error;
  if (ENDED.test(error.message)) return new Problem('upload-incomplete');
  if (UNREADABLE.test(error.message)) return new Problem('unreadable-body');
  return error;
};
