import { CONSTANTS } from '#shared/measures/constants.ts';
import { liftUncertainty } from '#shared/measures/lift.ts';
import type { EventTime, EventTimes } from '#shared/timing/shared-events.ts';
import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import type { RepCourse } from './course-of-rep.ts';
import type { FootHeight } from './foot-heights.ts';

/** A frame step where nobody knows the rate, ms: 30 frames per second. */
const UNKNOWN_STEP = 1000 / 30;

const stepOf = ({ rep }: RepCourse): number => {
  const rate = rep.camera.framesPerSecond;
  return rate !== null && rate > 0 ? 1000 / rate : UNKNOWN_STEP;
};

const eventTime = (time: number, step: number, u: number): EventTime => ({
  time: milliseconds(time),
  step: milliseconds(step),
  u: milliseconds(u),
});

/** Of an error that lies anywhere within ±1, the standard deviation. */
const UNIFORM = 1 / Math.sqrt(3);

/** A height (mm or degrees) at a marked frame, and its standard uncertainty. */
interface Level {
  readonly time: number;
  readonly height: number;
  readonly u: number;
}

/**
 * When a line passes a height between two neighbouring frames. It is known to their gap and to the time in which
 * the line moves by its own error.
 */
const passing = (
  a: Level | undefined,
  b: Level | undefined,
  height: number,
  step: number,
): EventTime | undefined => {
  if (!a || !b || a.height === b.height) return undefined;
  const gap = b.time - a.time;
  const change = b.height - a.height;
  const late = (Math.hypot(a.u, b.u) * gap) / Math.abs(change) / Math.SQRT2;
  const time = a.time + ((height - a.height) / change) * gap;
  return eventTime(time, step, Math.hypot((UNIFORM * gap) / 2, late));
};

/**
 * The top counts as reached where lift rises through 5° under its highest: the highest frame of a held top is a
 * matter of chance.
 */
const topReached = (course: RepCourse): EventTime | undefined => {
  const { top } = course.phases.boundaries;
  const { fMax, setting, level } = course;
  if (top === null || fMax === null) return undefined;
  const height = fMax - CONSTANTS.plateau.value;
  const rising = course.frames.flatMap(({ time, lift }, i): Level[] => {
    const marks = level[i];
    return lift === null || time > top || !marks
      ? []
      : [{ time, height: lift, u: liftUncertainty(marks, setting) }];
  });
  const last = rising.findLastIndex((each) => each.height <= height);
  return passing(rising[last], rising[last + 1], height, stepOf(course));
};

/** The foot leaves the floor or comes back to it: up or down through the height that counts as off. */
const footPasses = (
  course: RepCourse,
  feet: readonly FootHeight[],
  way: 'up' | 'down',
): EventTime | undefined => {
  const { top } = course.phases.boundaries;
  if (top === null) return undefined;
  const off = CONSTANTS.footOff.value;
  if (way === 'up') {
    const last = feet.findLastIndex(({ time, height }) => time <= top && height <= off);
    return last < 0 ? undefined : passing(feet[last], feet[last + 1], off, stepOf(course));
  }
  const first = feet.findIndex(({ time, height }) => time >= top && height <= off);
  return first <= 0 ? undefined : passing(feet[first - 1], feet[first], off, stepOf(course));
};

/**
 * When a rep's clip shows the moments that another clip of the same lift shows too; absent where it does not.
 * Foot off and foot down are found alike in both clips, so hands that moved them do not count here.
 * @param feet heights of the lifted foot in the picture of the front clip
 * @param clap a clap that a hand has found in the clip, on its clock
 */
export const eventTimes = (
  course: RepCourse,
  feet: readonly FootHeight[],
  clap: Milliseconds | null,
): EventTimes => ({
  ...(clap !== null && { clap: eventTime(clap, stepOf(course), UNIFORM * stepOf(course)) }),
  'foot-off': footPasses(course, feet, 'up'),
  top: topReached(course),
  'foot-down': footPasses(course, feet, 'down'),
});
