import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import type { StoredResult } from './reading.entity.ts';

/** What was read before a practice could set its own rules does not name them: it was read with the standard. */
export const resultOf = (stored: StoredResult): ReadingResult => ({
  rules: STANDARD_RULES,
  ...stored,
});
