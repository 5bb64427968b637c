import type { CourseFrame } from '#shared/course/types.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';

/** One marked frame whose lift is known. */
export interface HillPoint {
  readonly frame: FrameIndex;
  readonly time: Milliseconds;
  readonly lift: Degrees;
}

/**
 * The hill as it is drawn: quiet stance is the ground. From the front a lift that low is no number,
 * and its scatter would look like hills of its own.
 */
export const drawnHill = (frames: readonly CourseFrame[]): HillPoint[] =>
  frames.flatMap(({ frame, time, lift, phase }) =>
    lift === null ? [] : [{ frame, time, lift: phase === 'quiet' ? degrees(0) : lift }],
  );

/** The lift over the rep as its marked frames give it. */
export const hillOf = (frames: readonly CourseFrame[]): HillPoint[] =>
  frames.flatMap(({ frame, time, lift }) => (lift === null ? [] : [{ frame, time, lift }]));

/** Lift between two marked frames, straight; null outside them. */
export const liftAt = (hill: readonly HillPoint[], time: Milliseconds): Degrees | null => {
  for (const [n, point] of hill.entries()) {
    if (point.time === time) return point.lift;
    const before = hill[n - 1];
    if (before && before.time < time && time < point.time) {
      const share = (time - before.time) / (point.time - before.time);
      return degrees(before.lift + share * (point.lift - before.lift));
    }
  }
  return null;
};

/**
 * The frame of the rise that shows a lift: where the hill first reaches it on its way up, or the
 * end of the hill that lies nearer. Null without a hill.
 */
export const frameAtLift = (
  hill: readonly HillPoint[],
  lift: Degrees,
  times: readonly Milliseconds[],
): FrameIndex | null => {
  const top = hill.reduce<HillPoint | null>(
    (best, point) => (best === null || point.lift > best.lift ? point : best),
    null,
  );
  if (!top) return null;
  const rise = hill.filter((point) => point.time <= top.time);
  const first = rise[0] ?? top;
  if (lift <= first.lift) return first.frame;
  for (const [n, point] of rise.entries()) {
    const before = rise[n - 1];
    if (!before || point.lift < lift) continue;
    const share = (lift - before.lift) / (point.lift - before.lift);
    return nearest(times, before, point, before.time + share * (point.time - before.time));
  }
  return top.frame;
};

const nearest = (
  times: readonly Milliseconds[],
  from: HillPoint,
  to: HillPoint,
  time: number,
): FrameIndex => {
  let best = from.frame;
  for (let frame = from.frame; frame <= to.frame; frame = (frame + 1) as FrameIndex)
    if (Math.abs((times[frame] ?? 0) - time) < Math.abs((times[best] ?? 0) - time)) best = frame;
  return best;
};
