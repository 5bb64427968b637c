import { BEFORE } from '#shared/course/rise-fit.ts';
import { changeVariance } from '#shared/course/turn-process.ts';
import { degrees } from '#shared/geometry/units.ts';
import { CONSTANTS, SYSTEMATIC } from '#shared/measures/constants.ts';
import { bandOf } from './band.ts';
import { priorVariance } from './figures.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Joined, Joining } from './joined.ts';
import { sharesOf } from './pool.ts';
import { type Moments, turnProcess } from './process.ts';
import { seenLifts } from './process-frames.ts';
import type { Belief, SegmentBelief } from './process-matrices.ts';

const PRIOR2 = CONSTANTS.prior.value ** 2;
const THIGH2 = CONSTANTS.thighSpread.value ** 2;
const REP2 = CONSTANTS.repSpread.value ** 2;
const PRIOR_FRAMES = 6;
const TERMS = 4;

/** A practice's own systematic error scales the assumed slips. */
const beliefOf = ({ thighTurnsLittle, systematic }: Joining): Belief => {
  const own = thighTurnsLittle ? 1 : systematic.u / SYSTEMATIC.belt.u;
  const segment = (slip: number, variance: number): SegmentBelief => ({
    own: variance,
    slipShared: CONSTANTS.slipShared.value * (own * slip) ** 2,
    slipPerRep: (1 - CONSTANTS.slipShared.value) * (own * slip) ** 2,
    perRep: REP2 / 2,
  });
  const thigh = thighTurnsLittle ? THIGH2 : PRIOR2 / 2;
  return {
    thigh: segment(CONSTANTS.kneecapSlip.value, thigh),
    pelvis: segment(CONSTANTS.beltSlip.value, PRIOR2 - thigh),
    // whoever assumes that the thigh turns little assumes that the body does not turn over it
    wholeBody: thighTurnsLittle ? 0 : CONSTANTS.wholeBody.value ** 2,
    stance: CONSTANTS.stanceSpread.value ** 2,
  };
};

/** Tracked marks drift: what they err together does not show as scatter, and is at least that of a hand. */
const LEAST_FACTOR = 1 / CONSTANTS.trackedFactor.value ** 2;

/** How much larger the frames' scatter is than their marks explain, over all reps together. */
const scatterFactor = (used: readonly UsedRep[]): { factor: number; nu: number } => {
  let squares = PRIOR_FRAMES;
  let nu = PRIOR_FRAMES;
  for (const { fitted } of used) {
    const { sFit, nu: own, used: frames } = fitted.fit;
    squares += sFit * sFit * own - PRIOR_FRAMES;
    nu += frames - TERMS;
  }
  return { factor: Math.max(LEAST_FACTOR, squares / nu), nu };
};

/** What one measurement without a prior would have said: with the prior it gives the same belief. */
const measured = ({ mean, variance }: Moments, prior: number) => {
  const gain = 1 - variance / prior;
  return { value: mean / gain, variance: variance / gain, gain };
};

/**
 * Engine 2 with a belt pointer alone: one Gaussian regression over the frames of all reps, pelvis and
 * femur each with its own error. The pelvis is then seen five times better than the femur, and
 * each part counts as far as it is known. What is believed of the change is turned back into the
 * measurement that says the same, so that the rule and every figure keep their meaning. Null where
 * the frames carry no answer.
 *
 * The study's seeds 1 to 3 against engine 1: early turns of 5–16° found with one rep 41 % (10 %), with
 * three 59 % (52 %); with the assumption 45 % (32 %) and 62 % (55 %). No turn called early 1 in 1,200
 * (7), with the assumption 1 (3); with drifting marks or twice the slip 9 in 600 (10), and 4 (6).
 */
export const joinByProcess = (joining: Joining): Joined | null => {
  const { used, systematic, thighTurnsLittle, gates } = joining;
  const { from, to } = gates;
  const belief = beliefOf(joining);
  const { factor, nu } = scatterFactor(used);
  const zero = (read: (rep: UsedRep) => number | undefined): readonly number[] =>
    used.map((rep) => (read(rep) ?? 0) * (180 / Math.PI) ** 2 * factor);
  const seen = used.flatMap(seenLifts);
  const scatter = {
    factor,
    zeroThigh: zero(({ course }) => course.setting.turnZero?.femurVariance),
    zeroPelvis: zero(({ course }) => course.setting.turnZero?.pelvisVariance),
  };
  const process = turnProcess(seen, belief, scatter, gates);
  if (!process) return null;
  const window = process.change(from, to);
  const d = measured(window, priorVariance(gates));
  const pre = measured(process.change(BEFORE, from), priorVariance({ from: BEFORE, to: from }));
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
