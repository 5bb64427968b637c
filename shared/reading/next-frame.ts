import type { CourseFrame } from '#shared/course/types.ts';
import { median } from '#shared/course/robust.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { CONSTANTS, SYSTEMATIC } from '#shared/measures/constants.ts';
import { gatesOf, type ReadingRules } from '#shared/protocol/protocol.ts';
import { figuresOf } from './figures.ts';
import { type PlannedFrame, plannedVariance } from './planned.ts';
import { decide } from './rule.ts';
import type { ReadingFigures, ReadingResult, RepResult } from './types.ts';
import { inBand, leastFrames } from './usable.ts';

/** A frame of a clip that carries no marks yet. */
export interface UnmarkedFrame {
  readonly rep: string;
  readonly frame: FrameIndex;
  readonly time: Milliseconds;
}

/** A frame worth marking. */
export interface FrameOffer extends UnmarkedFrame {
  /** Lift between its marked neighbours. */
  readonly lift: Degrees;
  readonly why: 'rep-needs-it' | 'lowers-uncertainty';
  /** ± (95 %) of the reading over all reps, now and with this frame; null before there is one. */
  readonly halfWidthNow: Degrees | null;
  readonly halfWidthThen: Degrees | null;
}

/** The systematic part dominates where the random one is below this share of it: from our model. */
const DOMINATED = 0.5;

/** Lift of a moment of the rise, between its marked neighbours; null outside them. */
export const liftAt = (frames: readonly CourseFrame[], time: Milliseconds): Degrees | null => {
  const rising = frames.filter(({ phase, lift }) => phase === 'rise' && lift !== null);
  const after = rising.findIndex((frame) => frame.time >= time);
  const next = rising[after];
  const before = rising[after - 1];
  if (!next || !before || next.lift === null || before.lift === null) return null;
  const part = (time - before.time) / (next.time - before.time);
  return degrees(before.lift + part * (next.lift - before.lift));
};

/** Weight an unmarked frame would have: that of the three marked ones nearest in lift. */
const weightAt = (rep: RepResult, lift: Degrees): number | null =>
  median(
    rep.frames
      .flatMap((frame) =>
        frame.inFit && frame.lift !== null && frame.weight !== null
          ? [{ away: Math.abs(frame.lift - lift), weight: frame.weight }]
          : [],
      )
      .sort((a, b) => a.away - b.away)
      .slice(0, 3)
      .map(({ weight }) => weight),
  );

const plannedOf = (rep: RepResult): readonly PlannedFrame[] =>
  rep.frames.flatMap(({ inFit, lift, weight }) =>
    inFit && lift !== null && weight !== null ? [{ lift, weight }] : [],
  );

/** Random variance of the reading if one rep's were multiplied by `ratio`. */
const randomWith = (
  reps: readonly RepResult[],
  chosen: RepResult,
  ratio: number,
  uR: number,
): number => {
  const part = ({ fit }: RepResult): number => (fit ? (fit.share * fit.change.u) ** 2 : 0);
  const sum = reps.reduce((total, rep) => total + part(rep), 0);
  return uR * uR * (1 - (part(chosen) / sum) * (1 - ratio));
};

/** True where no random error, however it fell, could give another reading. */
const cannotChange = (result: ReadingResult, figures: ReadingFigures): boolean => {
  if (result.set === null) return false;
  const key = result.thighTurnsLittle ? 'belt+assumption' : result.set;
  const variance = figures.uC0 ** 2 - figures.uR ** 2;
  const with_ = (shift: number): string => {
    const nothing = degrees(0);
    const settled = figuresOf(
      {
        shares: [],
        d: degrees(figures.d + shift),
        uR: nothing,
        nuR: figures.nu,
        dPelvis: figures.pelvis.value,
        uPelvis: nothing,
        dThigh: figures.thigh.value,
        uThigh: nothing,
        pre: figures.pre.value,
        uPre: nothing,
        lambda: figures.lambda ?? 1,
      },
      { variance, q: SYSTEMATIC[key].q },
      { thighTurnsLittle: result.thighTurnsLittle, gates: gatesOf(result.rules) },
    );
    return decide(settled, result.rules).code;
  };
  const reach = 1.96 * figures.uR;
  return [-reach, -reach / 2, 0, reach / 2, reach].every((shift) => with_(shift) === result.code);
};

/** Frames a rep needs before it can be used at all, nearest to the middle of what it lacks. */
const needed = (
  rep: RepResult,
  unmarked: readonly UnmarkedFrame[],
  rules: ReadingRules,
): readonly FrameOffer[] => {
  const { from, to } = gatesOf(rules);
  const least = leastFrames(rules).find(({ code }) => rep.why.some((fault) => fault.code === code));
  if (!least) return [];
  const middle =
    least.code === 'few-near-60' ? from : least.code === 'few-near-90' ? to : (from + to) / 2;
  return unmarked
    .flatMap((frame): readonly FrameOffer[] => {
      const lift = frame.rep === rep.id ? liftAt(rep.frames, frame.time) : null;
      return lift !== null && inBand(lift, least)
        ? [{ ...frame, lift, why: 'rep-needs-it', halfWidthNow: null, halfWidthThen: null }]
        : [];
    })
    .sort((a, b) => Math.abs(a.lift - middle) - Math.abs(b.lift - middle));
};

/**
 * Unmarked frames of the rise, the one first that would lower the reading's uncertainty most.
 * Weights are known in advance, so nothing is drawn: a quick call. Before there is a reading, the
 * frames that a rep lacks. Empty where marking more cannot change the reading or the systematic
 * part dominates: then another rep or a pointer helps, not another frame.
 */
export const nextFrames = (
  result: ReadingResult,
  unmarked: readonly UnmarkedFrame[],
): readonly FrameOffer[] => {
  const { figures, reps, rules } = result;
  const gates = gatesOf(rules);
  const lacking = reps.filter(({ used }) => !used).flatMap((rep) => needed(rep, unmarked, rules));
  if (!figures) return lacking;
  const u02 = figures.uC0 ** 2 - figures.uR ** 2;
  if (figures.uR < DOMINATED * Math.sqrt(u02) || cannotChange(result, figures)) return [];
  const fixed = figures.uC ** 2 - figures.uR ** 2;
  const halfWidth = (random: number): Degrees => degrees(1.96 * Math.sqrt(random + fixed));
  const used = reps.filter((rep) => rep.used);
  const offers = unmarked.flatMap((frame): readonly FrameOffer[] => {
    const rep = used.find(({ id }) => id === frame.rep);
    const lift = rep ? liftAt(rep.frames, frame.time) : null;
    if (!rep || lift === null || lift < CONSTANTS.leastLift.value) return [];
    const marked = plannedOf(rep);
    const weight = weightAt(rep, lift);
    const now = plannedVariance(marked, gates);
    const then = weight === null ? null : plannedVariance([...marked, { lift, weight }], gates);
    if (now === null || then === null || then >= now) return [];
    return [
      {
        ...frame,
        lift,
        why: 'lowers-uncertainty',
        halfWidthNow: halfWidth(figures.uR ** 2),
        halfWidthThen: halfWidth(randomWith(used, rep, then / now, figures.uR)),
      },
    ];
  });
  return offers.sort((a, b) => (a.halfWidthThen ?? 0) - (b.halfWidthThen ?? 0));
};
