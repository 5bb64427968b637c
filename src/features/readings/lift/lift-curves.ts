import type { RepResult } from '#shared/reading/types.ts';
import { shownSeries } from '#shared/course/shown-series.ts';
import type { LiftCurve } from '#src/ui/plots/lift-curve.ts';

const fromTheSide = ({ why }: RepResult): boolean =>
  why.some((fault) => fault.code === 'view-cannot-show-turn' && fault.view.endsWith('-side')) &&
  !why.some(({ code }) => code === 'excluded' || code === 'other-side');

/** Reps filmed from the side that show a lift, and that nobody has left out. */
export const sideReps = (reps: readonly RepResult[]): readonly RepResult[] =>
  reps.filter((rep) => fromTheSide(rep) && rep.frames.some(({ lift }) => lift !== null));

/** Lift over time, s from foot off; from the first marked frame where no foot off was found. */
export const liftCurve = (rep: RepResult): LiftCurve => {
  const { frames, fMax, phases } = rep;
  const footOff = phases?.boundaries.footOff ?? null;
  const zero = footOff ?? frames[0]?.time ?? 0;
  const line = shownSeries(frames, 'lift', fMax);
  return {
    fromFootOff: footOff !== null,
    points: frames.flatMap(({ time, lift, liftHalfWidth, provisional }, i) => {
      const shown = line[i];
      if (lift === null || !shown || shown.value === null) return [];
      return [
        {
          time: (time - zero) / 1000,
          lift,
          line: shown.value,
          halfWidth: liftHalfWidth,
          startsRun: shown.startsRun,
          hollow: provisional,
        },
      ];
    }),
  };
};

/** ± (95 %) at the highest marked frame, degrees. */
export const topHalfWidth = ({ frames }: RepResult): number | null => {
  const [highest] = frames
    .filter(({ lift }) => lift !== null)
    .sort((a, b) => (b.lift ?? 0) - (a.lift ?? 0));
  return highest?.liftHalfWidth ?? null;
};
