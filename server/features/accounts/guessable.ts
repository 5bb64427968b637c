import type { ZxcvbnFactory } from '@zxcvbn-ts/core';
import { Problem } from '../../http/problem.ts';

/** Of the estimate's steps from 0 to 4: below this a million guesses are enough. */
const LEAST_SCORE = 2;

const newEstimate = async (): Promise<ZxcvbnFactory> => {
  const [{ ZxcvbnFactory }, { adjacencyGraphs, dictionary }] = await Promise.all([
    import('@zxcvbn-ts/core'),
    import('@zxcvbn-ts/language-common'),
  ]);
  return new ZxcvbnFactory({ dictionary, graphs: adjacencyGraphs });
};
// read once and only where a password is set: the list is long
let estimate: Promise<ZxcvbnFactory> | undefined;

/**
 * Refuses what is on the list of common passwords, or close to it: repeated, with a year, as the keys lie, or made
 * of what everybody knows about the account.
 * @param known such as name and address of the person
 * @param field where the password stands in what was sent
 * @throws Problem 'invalid-input'
 */
export const needHardToGuess = async (
  password: string,
  known: readonly (string | null | undefined)[],
  field: string,
): Promise<void> => {
  estimate ??= newEstimate();
  const words = known.flatMap((one) => {
    const parts = one?.split(/[^\p{L}\p{N}]+/u) ?? [];
    return [...parts, parts.join('')];
  });
  const { score } = (await estimate).check(password, ['redshank', ...words]);
  if (score >= LEAST_SCORE) return;
  throw new Problem('invalid-input', undefined, [
    {
      path: `body.${field}`,
      message: 'This one is guessed easily. A few words in a row that nobody expects are good.',
    },
  ]);
};
