import type { LandmarkId, Marks } from './types.ts';

/** Landmarks that exist on both legs and change their name with the side stood on. */
const PAIRS: readonly (readonly [LandmarkId, LandmarkId])[] = [
  ['asis-support', 'asis-lifted'],
  ['outline-support', 'outline-lifted'],
  ['ankle-support', 'ankle-lifted'],
  ['acromion-support', 'acromion-lifted'],
];

const OTHER = new Map<LandmarkId, LandmarkId>(
  PAIRS.flatMap(([a, b]) => [
    [a, b],
    [b, a],
  ]),
);

/** Landmarks of the midline, which belong to both. */
const SHARED: readonly LandmarkId[] = ['belt-tip'];

/**
 * The same marks for a rep of the other side: reps that alternate sides share one quiet stance.
 * Landmarks of one leg only (knee-cap, strap, foot) have no counterpart and are left out.
 */
export const swapRoles = (marks: Marks): Marks => {
  const swapped: Partial<Record<LandmarkId, Marks[LandmarkId]>> = {};
  for (const [from, to] of OTHER) if (marks[from]) swapped[to] = marks[from];
  for (const id of SHARED) if (marks[id]) swapped[id] = marks[id];
  return swapped;
};
