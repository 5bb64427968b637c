import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId, Marks } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import { liftOf, liftUncertainty } from '#shared/measures/lift.ts';
import type { Setting } from '#shared/measures/measure.ts';
import { tiedLiftAt } from '#shared/measures/tied-lift.ts';
import { isTurn, turnOf } from '#shared/measures/turn.ts';
import { turnLandmarks } from '#shared/measures/turn-parts.ts';
import type { UsedRep } from './fit-rep.ts';

/** Frames of one rep at one lift, taken together. Angles in degrees, variances in degrees². */
export interface SeenLift {
  readonly rep: number;
  readonly lift: number;
  readonly liftVariance: number;
  /** Shift of a tied lift by one standard error of each moment of the tie: all frames of the rep move together. */
  readonly byTie: readonly number[];
  readonly thigh: number;
  readonly thighVariance: number;
  readonly pelvis: number;
  readonly pelvisVariance: number;
  readonly time: number;
  /** Its errors hang together with those of neighbours in time. */
  readonly tracked: boolean;
}

/** Frames of a rep nearer than this are one: the curve cannot bend between them. */
const BIN = 2;

const frameOf = (
  frame: LevelFrame,
  setting: Setting,
  rep: number,
  tracked: boolean,
): SeenLift | null => {
  const lift = liftOf(frame, setting);
  const turn = turnOf(frame, setting);
  if (typeof lift !== 'number' || !isTurn(turn)) return null;
  const least = CONSTANTS.leastVariance.value / 2;
  const seen: SeenLift = {
    rep,
    lift: degrees(lift),
    liftVariance: liftUncertainty(frame, setting) ** 2,
    byTie: setting.tiedLift ? (tiedLiftAt(setting.tiedLift, frame.time)?.byTie ?? []) : [],
    thigh: turn.thighPart,
    thighVariance: Math.max(turn.thighFrameVariance, least),
    pelvis: turn.pelvisPart,
    pelvisVariance: Math.max(turn.variance - turn.thighFrameVariance, least),
    time: frame.time,
    tracked,
  };
  return Number.isFinite(seen.liftVariance) ? seen : null;
};

/** Means weighted by what each frame knows; tracked frames so near err alike, none adds to another. */
const together = (frames: readonly [SeenLift, ...SeenLift[]]): SeenLift => {
  const [first] = frames;
  const count = frames.length;
  const tracked = frames.some((frame) => frame.tracked);
  const mean = (value: (f: SeenLift) => number, variance: (f: SeenLift) => number) => {
    const weight = frames.reduce((sum, frame) => sum + 1 / variance(frame), 0);
    return {
      value: frames.reduce((sum, frame) => sum + value(frame) / variance(frame), 0) / weight,
      variance: (tracked ? count : 1) / weight,
    };
  };
  const thigh = mean(
    (f) => f.thigh,
    (f) => f.thighVariance,
  );
  const pelvis = mean(
    (f) => f.pelvis,
    (f) => f.pelvisVariance,
  );
  return {
    rep: first.rep,
    lift: frames.reduce((sum, { lift }) => sum + lift / count, 0),
    liftVariance: frames.reduce((sum, frame) => sum + frame.liftVariance, 0) / count ** 2,
    byTie: first.byTie.map((_, k) =>
      frames.reduce((sum, { byTie }) => sum + (byTie[k] ?? NaN) / count, 0),
    ),
    thigh: thigh.value,
    thighVariance: thigh.variance,
    pelvis: pelvis.value,
    pelvisVariance: pelvis.variance,
    time: frames.reduce((sum, { time }) => sum + time / count, 0),
    tracked,
  };
};

const isTracked = (marks: Marks | undefined, set: LandmarkSetId): boolean =>
  turnLandmarks(set).some((id) => {
    const mark = marks?.[id];
    return mark?.hidden === false && mark.source === 'tracked';
  });

/** The frames of the fit of one rep, by lift: many marked frames cost no more than a few dozen. */
export const seenLifts = ({ course }: UsedRep, rep: number): readonly SeenLift[] => {
  const bins = new Map<number, [SeenLift, ...SeenLift[]]>();
  for (const [i, frame] of course.frames.entries()) {
    const level = course.level[i];
    if (!frame.inFit || !level) continue;
    const seen = frameOf(
      level,
      course.setting,
      rep,
      isTracked(course.rep.frames[i]?.marks, course.set),
    );
    if (!seen) continue;
    const bin = Math.floor(seen.lift / BIN);
    const others = bins.get(bin);
    if (others) others.push(seen);
    else bins.set(bin, [seen]);
  }
  return [...bins.values()].map(together);
};
