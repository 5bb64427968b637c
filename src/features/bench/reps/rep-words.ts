import type { Exclusion } from '#shared/contracts/reps.ts';

export const EXCLUSION_WORDS: Readonly<Record<Exclusion, string>> = {
  'touched-support': 'Touched the support',
  hopped: 'Hopped',
  'foot-pivoted': 'The foot pivoted',
  'lost-balance': 'Lost balance',
  pain: 'Pain',
  'another-drill': 'Another drill',
  other: 'Another reason',
};
