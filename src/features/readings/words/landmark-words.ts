import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId, LandmarkSetId } from '#shared/landmarks/types.ts';

/** `tip of the belt pointer, middle of the lifted knee and 2 more` */
export const landmarkNames = (ids: readonly LandmarkId[], most = 3): string => {
  const names = ids.map((id) => landmark(id).label.replace(/^./, (first) => first.toLowerCase()));
  const shown = names.length <= most ? names : names.slice(0, most - 1);
  const rest = names.length - shown.length;
  const parts = rest > 0 ? [...shown, `${rest} more`] : shown;
  return parts.length < 2
    ? (parts[0] ?? '')
    : `${parts.slice(0, -1).join('; ')} and ${parts.at(-1) ?? ''}`;
};

export const SET_WORDS = {
  bare: 'bare landmarks, without pointers',
  belt: 'the belt pointer',
  'belt+thigh': 'belt and thigh pointers',
} as const satisfies Record<LandmarkSetId, string>;
