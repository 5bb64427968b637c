import { BEFORE } from '#shared/course/rise-fit.ts';
import { changeVariance } from '#shared/course/turn-process.ts';
import { degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { bandOf } from './band.ts';
import { priorVariance } from './figures.ts';
import type { Joined, Joining } from './joined.ts';
import { sharesOf } from './pool.ts';
import type { Moments, TurnProcess } from './process.ts';
import type { SeenLift } from './process-frames.ts';

const THIGH2 = CONSTANTS.thighSpread.value ** 2;

/** What one measurement without a prior would have said: with the prior it gives the same belief. */
const measured = ({ mean, variance }: Moments, prior: number) => {
  const gain = 1 - variance / prior;
  return { value: mean / gain, variance: variance / gain, gain };
};

/**
 * What is believed of the change, turned back into the measurement that says the same, so that the
 * rule and every figure keep their meaning. Null where the frames carry no answer.
 *
 * @param nu degrees of freedom of the frames' scatter
 */
export const joinedProcess = (
  process: TurnProcess,
  seen: readonly SeenLift[],
  { used, systematic, thighTurnsLittle, gates: { from, to } }: Joining,
  nu: number,
): Joined | null => {
  const window = process.change(from, to);
  const d = measured(window, priorVariance({ from, to }));
  const pre = measured(process.change(BEFORE, from), process.prior(BEFORE, from));
  const random = window.random / d.gain ** 2;
  if (!(d.gain > 0) || !(pre.gain > 0) || !(d.variance >= random)) return null;
  const variance = d.variance - random;
  const part = ({ mean, variance: left }: Moments) => ({
    value: degrees(mean / d.gain),
    u: degrees(Math.sqrt(Math.max(0, left / d.gain - variance))),
  });
  const [thigh, pelvis] = [part(window.thigh), part(window.pelvis)];
  return {
    pooled: {
      shares: sharesOf(used.map(({ fitted }) => fitted.u)),
      d: degrees(d.value),
      uR: degrees(Math.sqrt(random)),
      nuR: nu,
      dPelvis: pelvis.value,
      uPelvis: pelvis.u,
      dThigh: thigh.value,
      uThigh: thigh.u,
      pre: degrees(pre.value),
      uPre: degrees(Math.sqrt(Math.max(0, pre.variance - variance))),
      lambda: thighTurnsLittle
        ? 1 - window.thigh.variance / (THIGH2 * changeVariance(to - from))
        : 1,
    },
    uncertain: { variance, q: systematic.q },
    past90: (top) => degrees(process.change(to, top).mean / d.gain),
    course: ({ uC }) => {
      const level = process.change(0, from).mean;
      return bandOf(
        seen.map(({ lift }) => degrees(lift)),
        (lift) => {
          const { mean, variance: left } = process.change(from, lift);
          return {
            turn: level + mean / d.gain,
            u: uC * Math.sqrt(Math.max(0, left) / window.variance),
          };
        },
      );
    },
  };
};
