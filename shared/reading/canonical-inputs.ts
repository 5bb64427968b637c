import { sameRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { canonicalText } from './canonical.ts';
import type { ReadingInput } from './types.ts';

/**
 * The text that a reading's hash and its draws come from. The standard rules are left out: what was
 * read before a practice could set its own is the same input, and gives the same figures, today.
 */
export const canonicalInputs = ({ rules, ...rest }: ReadingInput): string =>
  canonicalText(sameRules(rules, STANDARD_RULES) ? rest : { ...rest, rules });
