import { type Beta, dot, terms } from '#shared/course/rise-fit.ts';
import { degrees } from '#shared/geometry/units.ts';
import { courseCurve } from './band.ts';
import { systematicVariance } from './figures.ts';
import type { Joined, Joining } from './joined.ts';
import { pool } from './pool.ts';
import { drawnFit } from './rep-result.ts';

/** Engine 1: a fit to each rise by least squares, and the weighted mean of their changes. */
export const joinByFit = ({ used, thighTurnsLittle, systematic, gates }: Joining): Joined => {
  const pooled = pool(
    used.map(({ fitted }) => fitted),
    thighTurnsLittle,
    gates,
  );
  return {
    pooled,
    uncertain: { variance: systematicVariance(systematic, used.length, gates), q: systematic.q },
    past90: (to, shares) => {
      const past = (beta: Beta): number =>
        dot(terms(to, gates), beta) - dot(terms(gates.to, gates), beta);
      return degrees(
        used.reduce(
          (total, { fitted: { fit } }, i) =>
            total + (past(fit.pelvis) + pooled.lambda * past(fit.thigh)) * (shares[i] ?? 0),
          0,
        ),
      );
    },
    course: ({ uR, uS }) =>
      courseCurve(
        used.map((rep, i) => drawnFit(rep, pooled.shares[i] ?? 0)),
        { uR, uS, lambda: pooled.lambda },
        gates,
      ),
  };
};
