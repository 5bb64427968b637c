import type { Call, Seen, SeenSubstitution } from '#shared/contracts/calls.ts';

/** The trade's words for a call by eye, the same on every page and on paper. */

/** What was seen by eye: a call, never a reading. */
export const SEEN_WORDS = {
  early: 'Turned out early',
  'on-time': 'Turned in on time',
  still: 'Held still',
  unsure: 'Unsure',
} as const satisfies Record<Seen, string>;

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
