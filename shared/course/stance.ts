import { CONSTANTS } from '#shared/measures/constants.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { median, robustSpread } from './robust.ts';
import type { RepBoundaries } from './types.ts';

const BASELINE_MS = 300;
const LEAST_BASELINE = 3;
const LEAST_SPREAD_MM = 5;

/** Quiet stance and foot off of one rep. */
export interface Stance {
  readonly quiet: readonly LevelFrame[];
  readonly footOff: Milliseconds | null;
  readonly footOffHalfGap: Milliseconds | null;
  /** Height of the lifted ankle over its quiet height, mm, per frame of the rep. */
  readonly heights: readonly (number | null)[];
  readonly footOffMm: number | null;
}

/** v of the lifted ankle above the support ankle, px down the picture. */
const ankleGap = ({ marks }: LevelFrame): number | null => {
  const { 'ankle-lifted': lifted, 'ankle-support': support } = marks;
  return lifted && support ? lifted.v - support.v : null;
};

/** Random error of that gap, px, from the first frame that carries it. */
const gapError = (frames: readonly LevelFrame[]): number => {
  const first = frames.find((frame) => ankleGap(frame) !== null)?.marks;
  return Math.hypot(first?.['ankle-lifted']?.error ?? 0, first?.['ankle-support']?.error ?? 0);
};

const pelvisU = ({ marks }: LevelFrame): number | null => {
  const { 'asis-support': support, 'asis-lifted': lifted } = marks;
  return lifted && support ? (lifted.u + support.u) / 2 : null;
};

const present = (value: number | null): value is number => value !== null;

/** Values of the first 300 ms that carry one, or of the first three frames that do. */
const firstValues = (
  frames: readonly LevelFrame[],
  read: (frame: LevelFrame) => number | null,
): readonly number[] => {
  const start = frames[0]?.time;
  if (start === undefined) return [];
  const known = frames.filter((frame) => read(frame) !== null);
  const early = known.filter((frame) => frame.time <= start + BASELINE_MS);
  const chosen = early.length >= LEAST_BASELINE ? early : known.slice(0, LEAST_BASELINE);
  return chosen.map(read).filter(present);
};

/** Height at which the foot counts as off: first reached, and still so at the next mark. */
const findFootOff = (
  frames: readonly LevelFrame[],
  heights: readonly (number | null)[],
  threshold: number,
): Pick<Stance, 'footOff' | 'footOffHalfGap'> => {
  const known = frames.flatMap((frame, i) => {
    const height = heights[i];
    return height === null || height === undefined ? [] : [{ time: frame.time, height }];
  });
  for (const [i, now] of known.entries()) {
    const next = known[i + 1];
    if (now.height <= threshold || !next || next.height <= threshold) continue;
    const before = known[i - 1];
    if (!before) return { footOff: now.time, footOffHalfGap: null };
    const part = (threshold - before.height) / (now.height - before.height);
    const gap = now.time - before.time;
    return {
      footOff: milliseconds(before.time + part * gap),
      footOffHalfGap: milliseconds(gap / 2),
    };
  }
  return { footOff: null, footOffHalfGap: null };
};

/**
 * Finds foot off and the quiet frames before it. Quiet ends where the foot rises or where the
 * pelvis leaves its first place: the weight shifts 0.3–0.6 s before the foot leaves (common
 * practice, no source). `shared` is the clip's quiet stance where several reps share one.
 */
export const findStance = (
  frames: readonly LevelFrame[],
  shared: readonly LevelFrame[] | null,
  mmPerPx: number,
  moved: Partial<RepBoundaries>,
): Stance => {
  const standing = shared ?? frames;
  const gaps = firstValues(standing, ankleGap);
  const unrest = mmPerPx * (robustSpread(gaps) ?? 0);
  const calm = Math.max(CONSTANTS.still.value, 3 * mmPerPx * gapError(standing));
  // a clip that begins in the middle of a lift has no stance to measure heights from
  const base = gaps.length >= LEAST_BASELINE && unrest <= calm ? median(gaps) : null;
  const height = (frame: LevelFrame): number | null => {
    const gap = ankleGap(frame);
    return gap === null || base === null ? null : mmPerPx * (base - gap);
  };
  const spread = Math.max(LEAST_SPREAD_MM, unrest);
  const threshold = Math.max(CONSTANTS.footOff.value, 4 * spread);
  const still = Math.max(CONSTANTS.still.value, 3 * spread);
  const heights = frames.map(height);
  const found = findFootOff(frames, heights, threshold);
  const footOff = moved.footOff ?? found.footOff;

  const home = median(firstValues(standing, pelvisU));
  const quiet: LevelFrame[] = [];
  for (const frame of standing) {
    if (!shared && footOff !== null && frame.time >= footOff) break;
    if (moved.quietFrom !== undefined && frame.time < moved.quietFrom) continue;
    if (moved.quietTo !== undefined && frame.time > moved.quietTo) break;
    const byHand = moved.quietFrom !== undefined && moved.quietTo !== undefined;
    if (byHand) {
      quiet.push(frame);
      continue;
    }
    const u = pelvisU(frame);
    const error = frame.marks['asis-support']?.error ?? 0;
    const sway = Math.max(CONSTANTS.still.value, 3 * mmPerPx * error);
    if (moved.quietTo === undefined && u !== null && home !== null)
      if (mmPerPx * Math.abs(u - home) > sway) break;
    const above = height(frame);
    if (above !== null && Math.abs(above) <= still) quiet.push(frame);
  }
  const noFootOff = footOff === null && !shared && moved.quietTo === undefined;
  return {
    quiet: noFootOff ? [] : quiet,
    footOff,
    footOffHalfGap: moved.footOff === undefined ? found.footOffHalfGap : null,
    heights,
    footOffMm: base === null ? null : threshold,
  };
};
