import type { Call, Seen, SeenSubstitution } from '#shared/contracts/calls.ts';
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

export const CONFIDENCE_WORDS = {
  guess: 'A guess',
  'fairly-sure': 'Fairly sure',
  sure: 'Sure',
} as const satisfies Record<Call['confidence'], string>;

/** Substitutions an eye can see, in pairs of opposites where there are any. */
export const SUBSTITUTION_WORDS = {
  'side-bend-to-support': 'Trunk bends to the support side',
  'side-bend-away': 'Trunk bends away',
  'pelvis-hikes': 'Pelvis hikes',
  'pelvis-drops': 'Pelvis drops',
  'knee-falls-in': 'Support knee falls in',
  'foot-turns-out': 'Support foot turns out',
  'heel-rises': 'Heel rises',
  'leans-back': 'Trunk leans back',
  'lifted-knee-drifts': 'Lifted knee drifts across or away',
  'lifted-foot-swings-in': 'Lifted foot swings to the midline',
} as const satisfies Record<SeenSubstitution, string>;

export const SEEN_SUBSTITUTIONS = Object.keys(SUBSTITUTION_WORDS) as SeenSubstitution[];
