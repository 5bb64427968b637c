import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import type { CourseFrame } from './types.ts';

/** Below this the lift is too uncertain to be shown, so nothing is matched there. */
const LEAST_LIFT = 20;

/** A frame of a rep with its lift: measured on marked frames, on a straight line between them. */
export interface LiftFrame {
  readonly frame: FrameIndex;
  readonly lift: Degrees;
}

/**
 * The frames of one rep by which a lift can be found: rise and fall apart, each in the order of the lift and each
 * frame beyond all before it. Where the lift wavers, frames that fall behind are left out, so that a larger lift
 * never means an earlier frame.
 */
export interface LiftWay {
  readonly rise: readonly LiftFrame[];
  /** From the foot of the fall upwards: a larger lift is an earlier frame. */
  readonly fall: readonly LiftFrame[];
}

/** One moment of two reps with the same lift, as nearly as their frames allow. */
export interface Matched {
  readonly part: 'rise' | 'fall';
  readonly first: LiftFrame;
  readonly second: LiftFrame;
}

type Known = { readonly frame: number; readonly lift: number };

/** Every frame from the first known to the last. */
const between = (known: readonly Known[]): LiftFrame[] =>
  known.flatMap((from, n) => {
    const to = known[n + 1];
    if (!to) return [{ frame: frameIndex(from.frame), lift: degrees(from.lift) }];
    return Array.from({ length: to.frame - from.frame }, (_, step) => ({
      frame: frameIndex(from.frame + step),
      lift: degrees(from.lift + ((to.lift - from.lift) * step) / (to.frame - from.frame)),
    }));
  });

/** Those that lie higher than all before them. */
const records = (frames: readonly LiftFrame[]): LiftFrame[] => {
  let highest = -Infinity;
  return frames.filter(({ lift }) => {
    if (lift <= highest) return false;
    highest = lift;
    return true;
  });
};

/** Frames in order of time, as a course has them. */
export const liftWay = (frames: readonly CourseFrame[]): LiftWay => {
  const known = frames.flatMap(({ frame, lift, phase }) =>
    lift !== null && (phase === 'rise' || phase === 'lower') ? [{ frame, lift }] : [],
  );
  const all = between(known);
  const top = all.reduce(
    (best, { lift }, n) => (lift > (all[best]?.lift ?? -Infinity) ? n : best),
    0,
  );
  return {
    rise: records(all.slice(0, top + 1)),
    fall: records(all.slice(top).toReversed()),
  };
};

const nearest = (way: readonly LiftFrame[], lift: number): LiftFrame | null =>
  way.reduce<LiftFrame | null>(
    (best, each) =>
      best === null || Math.abs(each.lift - lift) < Math.abs(best.lift - lift) ? each : best,
    null,
  );

/** In the order of rising lift. */
const matchedPart = (
  part: Matched['part'],
  one: readonly LiftFrame[],
  other: readonly LiftFrame[],
): Matched[] => {
  const low = Math.max(LEAST_LIFT, one[0]?.lift ?? Infinity, other[0]?.lift ?? Infinity);
  const high = Math.min(one.at(-1)?.lift ?? -Infinity, other.at(-1)?.lift ?? -Infinity);
  const lifts = [...one, ...other]
    .map(({ lift }) => lift)
    .filter((lift) => low <= lift && lift <= high)
    .sort((a, b) => a - b);
  const matched: Matched[] = [];
  for (const lift of lifts) {
    const first = nearest(one, lift);
    const second = nearest(other, lift);
    const last = matched.at(-1);
    if (!first || !second) continue;
    if (last?.first.frame === first.frame && last.second.frame === second.frame) continue;
    matched.push({ part, first, second });
  }
  return matched;
};

/**
 * The moments at which two reps are shown together: matched by lift, not by the clock. Only lifts that both reach
 * are in it. At each moment one of the two stands exactly at the lift and the other at its nearest frame, so that
 * they differ by no more than one frame's step; frames only ever go forward.
 */
export const matchLifts = (one: LiftWay, other: LiftWay): readonly Matched[] => [
  ...matchedPart('rise', one.rise, other.rise),
  ...matchedPart('fall', one.fall, other.fall).toReversed(),
];
