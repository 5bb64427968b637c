import type { FramePoint } from '#shared/geometry/points.ts';
import type { Side } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { median, medianOfThree } from './robust.ts';

/** Both ankles on every frame of a clip, by the athlete's own sides; null where one is not known. */
export interface AnkleTracks {
  readonly times: readonly Milliseconds[];
  readonly left: readonly (FramePoint | null)[];
  readonly right: readonly (FramePoint | null)[];
}

/** How much higher the left ankle is than the right one, both from where they stand, mm. */
export type Difference = readonly (number | null)[];

export interface Ankles {
  readonly difference: Difference;
  /** How much it trembles from frame to frame, standard deviation, mm. */
  readonly tremble: number;
}

/** A stretch in which one foot is off the floor, by index of frame. */
export interface FootUp {
  readonly lifted: Side;
  /** First frame over the threshold, and the first one under it again. */
  readonly from: number;
  readonly to: number;
  /** The clip begins or ends, or is not known, while the foot is up. */
  readonly cut: boolean;
}

/** Gaps in a track up to this length are read across, ms. From our model, no source. */
const SHORT_GAP_MS = 250;
/** A foot that leaves or lands within a gap this long still makes a whole lift: a fast foot blurs, ms. From our model, no source. */
const UNSEEN_MS = 1000;
/** A foot that is up before and after a gap this long was up all the while, ms. */
const LONG_GAP_MS = 1500;
/** A touch of the floor shorter than this does not end a lift, ms. From our model, no source. */
const BOUNCE_MS = 120;
const LEAST_SPREAD_MM = 5;

const present = (value: number | null): value is number => value !== null;

/** Values between two known neighbours that are near in time, on a straight line. */
const acrossShortGaps = (
  values: readonly (number | null)[],
  times: readonly Milliseconds[],
): (number | null)[] => {
  const filled = [...values];
  let last: number | null = null;
  for (const [i, value] of values.entries()) {
    if (value === null) continue;
    const before: number | null = last === null ? null : (values[last] ?? null);
    if (last !== null && before !== null && i - last > 1) {
      const start = times[last] ?? 0;
      const gap = (times[i] ?? 0) - start;
      for (let n = last + 1; gap <= SHORT_GAP_MS && n < i; n += 1)
        filled[n] = before + ((value - before) * ((times[n] ?? 0) - start)) / gap;
    }
    last = i;
  }
  return filled;
};

/** Where an ankle is while its foot stands: the middle of its lowest places, px down the picture. */
const floorOf = (values: readonly (number | null)[], near: number): number | null => {
  const known = values.filter(present).sort((a, b) => a - b);
  const low = known[Math.floor(0.95 * (known.length - 1))];
  return low === undefined ? null : median(known.filter((v) => v >= low - near));
};

const trembleOf = (raw: Difference): number => {
  const steps = raw.flatMap((now, i) => {
    const before = raw[i - 1] ?? null;
    return now === null || before === null ? [] : [Math.abs(now - before)];
  });
  return Math.max(LEAST_SPREAD_MM, (1.4826 * (median(steps) ?? 0)) / Math.SQRT2);
};

/** Null where fewer than two frames show both ankles. Outliers of a single frame are smoothed away. */
export const anklesOf = ({ times, left, right }: AnkleTracks, mmPerPx: number): Ankles | null => {
  const near = CONSTANTS.footOff.value / mmPerPx;
  const heights = (points: readonly (FramePoint | null)[]): (number | null)[] | null => {
    const v = acrossShortGaps(
      times.map((_, i) => points[i]?.v ?? null),
      times,
    );
    const floor = floorOf(v, near);
    return floor === null ? null : v.map((each) => (each === null ? null : floor - each));
  };
  const [a, b] = [heights(left), heights(right)];
  if (!a || !b) return null;
  const raw = times.map((_, i) => {
    const [l, r] = [a[i] ?? null, b[i] ?? null];
    return l === null || r === null ? null : mmPerPx * (l - r);
  });
  if (raw.filter(present).length < 2) return null;
  return { difference: medianOfThree(raw), tremble: trembleOf(raw) };
};

/** Height over which a foot counts as off the floor, mm: as the reading has it. */
export const offThreshold = (tremble: number): number =>
  Math.max(CONSTANTS.footOff.value, 4 * tremble);

/** Every stretch in which a foot is off the floor, confirmed by the frame after. */
export const feetUp = (
  difference: Difference,
  times: readonly Milliseconds[],
  threshold: number,
): readonly FootUp[] => {
  const known = difference.flatMap((value, i) => (value === null ? [] : [{ value, i }]));
  const sideOf = (value: number): Side | null =>
    value > threshold ? 'left' : value < -threshold ? 'right' : null;
  const time = (i: number): number => times[i] ?? 0;
  const found: FootUp[] = [];
  let open: { lifted: Side; from: number; last: number; cut: boolean } | null = null;
  const close = (to: number, cut: boolean): void => {
    if (open) found.push({ lifted: open.lifted, from: open.from, to, cut: open.cut || cut });
    open = null;
  };
  for (const [n, { value, i }] of known.entries()) {
    const before = known[n - 1];
    const next = known[n + 1];
    const gap = before ? time(i) - time(before.i) : 0;
    const now = sideOf(value);
    if (open && gap > (now === open.lifted ? LONG_GAP_MS : UNSEEN_MS)) close(open.last, true);
    if (open && now === open.lifted) open.last = i;
    else if (open && (now !== null || !next || sideOf(next.value) !== open.lifted)) close(i, false);
    if (!open && now !== null && (!next || sideOf(next.value) === now))
      open = { lifted: now, from: i, last: i, cut: !before || gap > UNSEEN_MS };
  }
  close(known.at(-1)?.i ?? 0, true);
  return found.reduce<FootUp[]>((joined, each) => {
    const last = joined.at(-1);
    const bounced = last?.lifted === each.lifted && time(each.from) - time(last.to) < BOUNCE_MS;
    if (!last || !bounced || last.cut || each.cut) return [...joined, each];
    return [...joined.slice(0, -1), { ...last, to: each.to }];
  }, []);
};
