import type { ExclusionReason } from '#shared/course/types.ts';

/** Why a coach left a rep out, as the end of 'left out: …'. */
export const EXCLUSION_WORDS = {
  'touched-support': 'touched the support',
  hopped: 'hopped',
  'foot-pivoted': 'the foot pivoted',
  'lost-balance': 'lost balance',
  pain: 'pain',
  'another-drill': 'another drill',
  other: 'another reason',
} as const satisfies Record<ExclusionReason, string>;
