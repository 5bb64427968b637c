import type { RepTruth, Phase } from '#tests/fixtures/clips/truth.ts';
import type { Angles } from './angles.ts';
import type { RepPlan } from './script.ts';

/** The measurement's foot-off threshold: height of the lifted ankle over its quiet place, mm. */
const FOOT_OFF = 25;
/** The plateau reaches down to this much below the highest lift, degrees. */
const PLATEAU = 5;

export interface FrameFacts {
  readonly seconds: number;
  readonly rep: number;
  readonly angles: Angles;
  readonly ankleHeight: number;
}

/** Value of `read` where the rise first passes `lift`; null where it never does. */
const whenPassing = (
  rise: readonly FrameFacts[],
  lift: number,
  read: (angles: Angles) => number,
): number | null => {
  const after = rise.findIndex((frame) => frame.angles.lift >= lift);
  const [before, next] = [rise[after - 1], rise[after]];
  if (before === undefined || next === undefined) return null;
  const t = (lift - before.angles.lift) / (next.angles.lift - before.angles.lift);
  return read(before.angles) + t * (read(next.angles) - read(before.angles));
};

// adding nothing turns −0 into 0, which JSON cannot tell apart
const round = (value: number, digits = 3): number => Number(value.toFixed(digits)) + 0;

/** Boundaries and the change of turn of one rep, from the frames of the whole clip. */
export const repTruth = (frames: readonly FrameFacts[], rep: number, plan: RepPlan): RepTruth => {
  const firstFrame = frames.findIndex((frame) => frame.rep === rep);
  const lastFrame = frames.findLastIndex((frame) => frame.rep === rep);
  const inRep = (accept: (frame: FrameFacts) => boolean) => (frame: FrameFacts) =>
    frame.rep === rep && accept(frame);
  const still = frames.findLastIndex(inRep((frame) => frame.seconds <= plan.shift));
  const floor = frames[firstFrame]?.ankleHeight ?? 0;
  const offFloor = inRep((frame) => frame.ankleHeight - floor > FOOT_OFF);
  const footOffFrame = frames.findIndex(offFloor);
  const footDownFrame = frames.findLastIndex(offFloor) + 1;
  const lifts = frames.map((frame) => (frame.rep === rep ? frame.angles.lift : -Infinity));
  const maxLift = Math.max(...lifts);
  const rise = frames.slice(footOffFrame, lifts.indexOf(maxLift) + 1);
  const sigma = plan.support === 'left' ? 1 : -1;
  const change = (read: (angles: Angles) => number): number | null => {
    const [from, to] = [whenPassing(rise, 60, read), whenPassing(rise, 90, read)];
    return from === null || to === null ? null : round(to - from);
  };
  return {
    supportSide: plan.support,
    firstFrame,
    lastFrame,
    quietFrames: [firstFrame, still],
    footOffFrame,
    topFrame: lifts.indexOf(maxLift),
    plateauEndFrame: lifts.findLastIndex((lift) => lift >= maxLift - PLATEAU),
    footDownFrame,
    maxLift: round(maxLift),
    turnChange60To90: change((angles) => angles.turn),
    pelvisChange60To90: change((angles) => -sigma * angles.yawPelvis),
    femurChange60To90: change((angles) => sigma * angles.yawFemur),
  };
};

export const phaseOf = (index: number, rep: RepTruth): Phase => {
  if (index <= rep.quietFrames[1]) return 'quiet';
  if (index < rep.footOffFrame) return 'shift';
  if (index <= rep.plateauEndFrame) return 'rise';
  return index < rep.footDownFrame ? 'lower' : 'settle';
};
