import { otherSide, type Side } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { frameIndex, type FrameIndex, type Milliseconds } from '#shared/timing/units.ts';
import {
  anklesOf,
  type AnkleTracks,
  type Difference,
  feetUp,
  type FootUp,
  offThreshold,
} from './ankle-lifts.ts';
import { median } from './robust.ts';

/** A rep as the ankles tell it: a proposal, which a person takes or leaves. */
export interface FoundRep {
  readonly supportSide: Side;
  /** Bounds in the clip, both inclusive. */
  readonly startFrame: FrameIndex;
  readonly endFrame: FrameIndex;
  /** Still on both feet, both inclusive; null where this rep follows too soon (marching). */
  readonly quiet: readonly [FrameIndex, FrameIndex] | null;
  readonly footOff: FrameIndex;
  readonly top: FrameIndex;
  readonly footDown: FrameIndex;
  /** How high the ankle rises, mm. */
  readonly height: number;
}

/** Why no rep is proposed. */
export type NoReps =
  /** The ankles are known together for too short a time, ms. */
  | { readonly code: 'ankles-not-followed'; readonly known: number; readonly needed: number }
  /** No foot rises enough; `height` is the highest, mm. */
  | { readonly code: 'no-lift'; readonly height: number; readonly needed: number }
  /** Every lift begins before the clip or a gap does, or ends after it. */
  | { readonly code: 'lifts-cut-off'; readonly count: number }
  /** Lifts, but never a still stance on both feet before one. */
  | { readonly code: 'never-still'; readonly count: number };

/** An ankle rises some 300 mm with the thigh at 75°; a step in place less. From our model, no source. */
const LEAST_HEIGHT_MM = 120;
const LEAST_LIFT_MS = 350;
const LEAST_KNOWN_MS = 1000;
/** The weight comes back after foot down, and leaves before foot off (common practice, no source). */
const SETTLE_MS = 600;
const SHIFT_MS = 600;
const LEAST_QUIET_MS = 250;
const LONGEST_QUIET_MS = 3000;
/** Stretch whose middle is the level that a stance is measured from. */
const LEVEL_MS = 500;
/** A rep goes on this long after foot down. */
const AFTER_MS = 400;

interface Span {
  readonly from: number;
  readonly to: number;
}

const values = (difference: Difference, { from, to }: Span): number[] =>
  difference.slice(from, to + 1).filter((value) => value !== null);

/** First frame at or after a time, last frame at or before one. */
const firstFrom = (times: readonly Milliseconds[], time: number): number => {
  const at = times.findIndex((each) => each >= time);
  return at < 0 ? times.length - 1 : at;
};
const lastUntil = (times: readonly Milliseconds[], time: number): number =>
  Math.max(
    0,
    times.findLastIndex((each) => each <= time),
  );

/** The first frame of the still stretch that ends with a frame; one after it where there is none. */
const firstStill = (
  to: number,
  begin: number,
  difference: Difference,
  times: readonly Milliseconds[],
  still: number,
): number => {
  const start = firstFrom(times, Math.max(begin, (times[to] ?? 0) - LONGEST_QUIET_MS));
  const settled = firstFrom(times, Math.max(begin, (times[to] ?? 0) - LEVEL_MS));
  const level = median(values(difference, { from: settled, to }));
  let from = to + 1;
  for (let i = to; level !== null && i >= start; i -= 1) {
    const value = difference[i] ?? null;
    if (value === null) continue;
    if (Math.abs(value - level) > still) break;
    from = i;
  }
  return from;
};

/** The last still stretch before foot off and after the lift before it; null where it is too short. */
const quietBefore = (
  { from: footOff }: FootUp,
  before: FootUp | undefined,
  difference: Difference,
  times: readonly Milliseconds[],
  still: number,
): Span | null => {
  const off = times[footOff] ?? 0;
  const begin = before ? (times[before.to] ?? 0) + SETTLE_MS : (times[0] ?? 0);
  const room = off - begin;
  if (room < LEAST_QUIET_MS) return null;
  // where there is little time, less of it is given to the shift of the weight
  const latest = lastUntil(times, off - Math.min(SHIFT_MS, room / 3));
  const earliest = firstFrom(times, begin + LEAST_QUIET_MS);
  for (let to = latest; to >= earliest; to -= 1) {
    const from = firstStill(to, begin, difference, times, still);
    const long = (times[to] ?? 0) - (times[from] ?? Infinity);
    if (long >= LEAST_QUIET_MS && to - from >= 2) return { from, to };
  }
  return null;
};

/** The lift's own ends, against the level at which this person stood just before it. */
const sharpened = (
  up: FootUp,
  quiet: Span | null,
  difference: Difference,
  threshold: number,
): FootUp => {
  const level = quiet && median(values(difference, quiet));
  if (!quiet || level === null) return up;
  const sign = up.lifted === 'left' ? 1 : -1;
  const isUp = (i: number): boolean => {
    const value = difference[i] ?? null;
    return value !== null && sign * (value - level) > threshold;
  };
  let { from, to } = up;
  while (from > quiet.to && isUp(from - 1)) from -= 1;
  while (from < up.to && !isUp(from)) from += 1;
  while (to > from + 1 && !isUp(to - 1)) to -= 1;
  return { ...up, from, to };
};

const topOf = ({ lifted, from, to }: FootUp, difference: Difference): [number, number] => {
  const sign = lifted === 'left' ? 1 : -1;
  let best: [number, number] = [from, -Infinity];
  for (let i = from; i <= to; i += 1) {
    const value = difference[i] ?? null;
    if (value !== null && sign * value > best[1]) best = [i, sign * value];
  }
  return best;
};

/**
 * Finds the reps of a clip from the tracks of both ankles: one foot leaves the floor, rises and comes
 * down again, while the other stands. Both feet at once (a hop) make no rep; nor does a shift of the
 * weight, nor a step in place.
 */
export const findReps = (tracks: AnkleTracks, mmPerPx: number): readonly FoundRep[] | NoReps => {
  const { times } = tracks;
  const ankles = anklesOf(tracks, mmPerPx);
  const knownMs = (ankles?.difference ?? []).reduce<number>(
    (sum, value, i) =>
      value === null ? sum : sum + (times[i] ?? 0) - (times[i - 1] ?? times[i] ?? 0),
    0,
  );
  if (!ankles || knownMs < LEAST_KNOWN_MS)
    return { code: 'ankles-not-followed', known: knownMs, needed: LEAST_KNOWN_MS };
  const { difference, tremble } = ankles;
  const threshold = offThreshold(tremble);
  const still = Math.max(CONSTANTS.still.value, 3 * tremble);
  const all = feetUp(difference, times, threshold);
  const high = all.filter(
    (up) =>
      topOf(up, difference)[1] >= LEAST_HEIGHT_MM &&
      (times[up.to] ?? 0) - (times[up.from] ?? 0) >= LEAST_LIFT_MS,
  );
  if (high.length === 0) {
    const height = Math.max(0, ...values(difference, { from: 0, to: times.length }).map(Math.abs));
    return { code: 'no-lift', height, needed: LEAST_HEIGHT_MM };
  }
  const whole = high.filter(({ cut }) => !cut);
  if (whole.length === 0) return { code: 'lifts-cut-off', count: high.length };

  const stances = whole.map((up) => {
    const before = all.filter(({ to }) => to <= up.from).at(-1);
    const quiet = quietBefore(up, before, difference, times, still);
    return { quiet, before, up: sharpened(up, quiet, difference, threshold) };
  });
  if (stances.every(({ quiet }) => quiet === null))
    return { code: 'never-still', count: whole.length };
  const starts = stances.map(({ quiet, before, up }) => {
    const soon = firstFrom(times, (times[up.from] ?? 0) - LEAST_QUIET_MS);
    return quiet?.from ?? Math.min(up.from, Math.max(soon, (before?.to ?? -1) + 1));
  });
  return stances.map(({ quiet, up }, n): FoundRep => {
    const after = lastUntil(times, (times[up.to] ?? 0) + AFTER_MS);
    const [top, height] = topOf(up, difference);
    return {
      supportSide: otherSide(up.lifted),
      startFrame: frameIndex(starts[n] ?? up.from),
      endFrame: frameIndex(Math.min(after, (starts[n + 1] ?? times.length) - 1)),
      quiet: quiet && [frameIndex(quiet.from), frameIndex(quiet.to)],
      footOff: frameIndex(up.from),
      top: frameIndex(top),
      footDown: frameIndex(up.to),
      height,
    };
  });
};
