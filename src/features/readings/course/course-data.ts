import type { RepResult } from '#shared/reading/types.ts';
import { LIFT_RANGE } from '#shared/plots/course-scale.ts';
import type { CoursePoint } from '#src/ui/plots/course-points.tsx';

/**
 * Reps whose points are drawn, in the order of their symbols: those that are used; where none is, those
 * that nobody has left out.
 */
export const drawnReps = (reps: readonly RepResult[]): readonly RepResult[] => {
  const used = reps.filter((rep) => rep.used);
  if (used.length > 0) return used;
  return reps.filter(
    ({ why, frames }) =>
      !why.some(({ code }) => code === 'excluded' || code === 'other-side') &&
      frames.some(({ phase, turn }) => phase === 'rise' && turn !== null),
  );
};

/** Points of the rises. */
export const coursePoints = (reps: readonly RepResult[]): CoursePoint[] =>
  drawnReps(reps).flatMap((rep, n) =>
    rep.frames.flatMap(({ phase, lift, turn, provisional }) =>
      phase === 'rise' &&
      lift !== null &&
      turn !== null &&
      lift >= LIFT_RANGE[0] &&
      lift <= LIFT_RANGE[1]
        ? [{ lift, turn, rep: n, hollow: provisional }]
        : [],
    ),
  );
