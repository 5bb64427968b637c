/** A trial that is not what its schema says; the message names the place and what to put there. */
export class TrialError extends Error {
  override readonly name = 'TrialError';
}
