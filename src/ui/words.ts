import type { Purpose } from '#shared/contracts/consents.ts';
import type { Side, View } from '#shared/contracts/primitives.ts';

/** The trade's words for the contract's codes, the same on every page. */

/** `right support`: the leg stood on. */
export const supportWords = (side: Side): string => `${side} support`;

export const VIEW_WORDS = {
  front: 'front view',
  back: 'back view',
  'lifted-side': 'from the lifted side',
  'support-side': 'from the support side',
} as const satisfies Record<View, string>;

export { SEEN_WORDS } from '#shared/exports/call-words.ts';

export const PURPOSE_WORDS = {
  assessment: 'Filming and marking in this practice',
  supervision: 'Review by a supervisor',
  teaching: 'Use in teaching, face covered',
  'sharing-by-link': 'A replay behind a link, for the athlete',
} as const satisfies Record<Purpose, string>;

export const PURPOSES = Object.keys(PURPOSE_WORDS) as Purpose[];

/** A clip by what it shows: `Right support, front view`; both sides in one take where no side is given. */
export const clipWords = (clip: { supportSide: Side | null; view: View }): string => {
  const side =
    clip.supportSide === null
      ? 'Both sides'
      : clip.supportSide === 'left'
        ? 'Left support'
        : 'Right support';
  return `${side}, ${VIEW_WORDS[clip.view]}`;
};
