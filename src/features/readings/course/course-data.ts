import type { Degrees } from '#shared/geometry/units.ts';
import type { RepResult } from '#shared/reading/types.ts';
import { turnAt } from '#src/ui/plots/course-shapes.ts';
import { LIFT_RANGE } from '#src/ui/plots/course-scale.ts';
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

/** ± (95 %) of one rep's change, degrees: what its band says at the upper gate. */
export const repHalfWidth = ({ curve, fit }: RepResult, gateTo: Degrees): number => {
  const upper = turnAt(
    curve.map((point) => ({ ...point, turn: point.high })),
    gateTo,
  );
  const line = turnAt(curve, gateTo);
  return upper === null || line === null ? 1.96 * (fit?.change.u ?? 0) : upper - line;
};
