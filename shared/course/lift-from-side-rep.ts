import { degrees } from '#shared/geometry/units.ts';
import { liftUncertainty } from '#shared/measures/lift.ts';
import type { LiftSample, TiedLift } from '#shared/measures/tied-lift.ts';
import { isTie, tieClocks, type TieFault } from '#shared/timing/shared-events.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { RepCourse } from './course-of-rep.ts';
import { eventTimes } from './event-times.ts';
import { frontFootHeights, sideFootHeights } from './foot-heights.ts';

/** A rep's course with the clap that a hand has found in its clip, on the clip's clock. */
export interface TimedCourse {
  readonly course: RepCourse;
  readonly clap: Milliseconds | null;
}

interface Known {
  readonly time: number;
  readonly lift: number;
}

/** Marks this near in time tell how fast the lift changes, ms. */
const NEAR = 120;

/** Speed of lift around a time, degrees per ms, falling where negative, from the furthest marks that are near. */
const speedAt = (known: readonly Known[], time: number): number => {
  const near = known.filter((each) => Math.abs(each.time - time) <= NEAR);
  const [first, last] = [near[0], near.at(-1)];
  return first && last && last.time > first.time
    ? (last.lift - first.lift) / (last.time - first.time)
    : 0;
};

/**
 * Lift of a front rep from a side rep of the same moment, on the front clip's clock; or why the two cannot be tied.
 * Each value carries the error of the side clip's marks and, apart from it, of the tie: how far the lift
 * moves in the time by which the clocks may be apart. Both courses are of one support side; who calls sees to it.
 */
export const liftFromSideRep = (front: TimedCourse, side: TimedCourse): TiedLift | TieFault => {
  const tie = tieClocks(
    eventTimes(side.course, sideFootHeights(side.course, front.course), side.clap),
    eventTimes(front.course, frontFootHeights(front.course), front.clap),
  );
  if (!isTie(tie)) return tie;
  const known = side.course.frames.flatMap(({ time, lift }, i) => {
    const level = side.course.level[i];
    return lift === null || !level ? [] : [{ time, lift, level }];
  });
  const samples = known.map(({ time, lift, level }): LiftSample => {
    const there = tie.onOther(time);
    const speed = speedAt(known, time);
    return {
      time: there.time,
      lift,
      u: degrees(liftUncertainty(level, side.course.setting)),
      byTie: there.byEvent.map((late) => degrees(late * speed)),
    };
  });
  return { from: side.course.rep.id, samples };
};

export const isTiedLift = (lift: TiedLift | TieFault): lift is TiedLift => 'samples' in lift;
