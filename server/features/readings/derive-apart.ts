import { deriveReading } from '#shared/reading/derive.ts';
import type { ReadingInput, ReadingResult } from '#shared/reading/types.ts';

/** Lets the requests that wait have their turn before the Monte Carlo takes its own. */
export const deriveApart = (input: ReadingInput): Promise<ReadingResult> =>
  new Promise((resolve, reject) => {
    setImmediate(() => {
      try {
        resolve(deriveReading(input));
      } catch (error) {
        reject(error instanceof Error ? error : new Error(String(error)));
      }
    });
  });
