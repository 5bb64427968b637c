import { landmarksOf } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { LEAST_QUIET } from '#shared/measures/reference.ts';
import type { UsedRep } from './fit-rep.ts';

/** Squares of what marks scatter against their assumed errors, and how many free ones there are. */
export interface Scattered {
  readonly squares: number;
  readonly free: number;
}

/** Marks that scatter less than a tenth of their error were carried over, not placed anew. */
const CARRIED_OVER = 0.01;

interface Placed {
  readonly time: number;
  /** Height in the picture against the error assumed. */
  readonly height: number;
}

/** What part of their own error tracked marks share, on average over all pairs, each with itself. */
const together = (placed: readonly Placed[]): number => {
  const n = placed.length;
  let sum = 0;
  for (const a of placed)
    for (const b of placed)
      sum += Math.exp(-Math.abs(a.time - b.time) / CONSTANTS.trackedFor.value) / (n * n);
  return sum;
};

/** A person who stands still keeps the height of every landmark: what heights scatter is the marks' own. */
const ofLandmark = ({ course }: UsedRep, id: LandmarkId): Scattered | null => {
  const placed = course.setting.reference.frames.flatMap(({ time, marks }): readonly Placed[] => {
    const mark = marks[id];
    return mark && mark.error > 0 ? [{ time, height: mark.v / mark.error }] : [];
  });
  const n = placed.length;
  if (n < LEAST_QUIET) return null;
  const mean = placed.reduce((sum, { height }) => sum + height / n, 0);
  const squares = placed.reduce((sum, { height }) => sum + (height - mean) ** 2, 0);
  if (!(squares > CARRIED_OVER * (n - 1))) return null;
  const tracked = [...course.rep.frames, ...(course.rep.sharedQuiet ?? [])].some(({ marks }) => {
    const mark = marks[id];
    return mark?.hidden === false && mark.source === 'tracked';
  });
  // tracked marks err alike: they scatter by less than they err
  const shown = tracked ? n * (1 - together(placed)) : n - 1;
  return { squares: (squares * (n - 1)) / shown, free: n - 1 };
};

/** Over all landmarks of all reps; a quiet stance that several reps share counts once. */
export const quietScatter = (used: readonly UsedRep[]): Scattered => {
  const stances = new Map<string, UsedRep>();
  for (const rep of used) {
    const shared = rep.course.rep.sharedQuiet;
    const key = shared ? JSON.stringify(shared) : `rep ${stances.size}`;
    if (!stances.has(key)) stances.set(key, rep);
  }
  let squares = 0;
  let free = 0;
  for (const rep of stances.values())
    for (const id of landmarksOf(rep.course.set)) {
      const of = ofLandmark(rep, id);
      squares += of?.squares ?? 0;
      free += of?.free ?? 0;
    }
  return { squares, free };
};
