import type { RepResult } from '#shared/reading/types.ts';
import { turnAt } from '#src/ui/plots/course-shapes.ts';
import { LIFT_RANGE } from '#src/ui/plots/course-scale.ts';
import type { CoursePoint } from '#src/ui/plots/course-points.tsx';

/** Points of the rises; used reps first, in the order of their symbols. */
export const coursePoints = (reps: readonly RepResult[]): CoursePoint[] =>
  reps
    .filter(({ used }) => used)
    .flatMap((rep, n) =>
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

/** ± (95 %) of one rep's change from 60° to 90°, degrees: what its band says at 90°. */
export const repHalfWidth = ({ curve, fit }: RepResult): number => {
  const upper = turnAt(
    curve.map((point) => ({ ...point, turn: point.high })),
    90,
  );
  const line = turnAt(curve, 90);
  return upper === null || line === null ? 1.96 * (fit?.change.u ?? 0) : upper - line;
};
