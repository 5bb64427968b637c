import type { RepResult } from '#shared/reading/types.ts';
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
