import type { Seen, SeenSubstitution } from '#shared/contracts/calls.ts';
import { CONFIDENCE_WORDS, SUBSTITUTION_WORDS } from '#shared/exports/call-words.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { levelWords } from '#src/ui/gate-words.ts';

/** What the eye may say of the hip that is stood on. It judges the same event as the reading. */
export const seenNotes = (gates: Gates | null): Record<Seen, string> => ({
  early: gates
    ? `swings outwards between ${gates.from}° and ${levelWords(gates.to)}`
    : 'swings outwards on the way up',
  'on-time': `turns in while the thigh comes ${gates ? `to ${levelWords(gates.to)}` : 'up'}`,
  still: 'no turn seen either way',
  unsure: 'could not tell',
});

export { CONFIDENCE_WORDS, SUBSTITUTION_WORDS };

export const SEEN_SUBSTITUTIONS = Object.keys(SUBSTITUTION_WORDS) as SeenSubstitution[];
