import type { View } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import type { Rig } from '#shared/measures/rig.ts';
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

/** A height in the picture that shrinks as the foot rises, px. */
type Gap = (frame: LevelFrame) => number | null;

/** v of the lifted ankle above the support ankle, px down the picture. */
const ankleGap: Gap = ({ marks }) => {
  const { 'ankle-lifted': lifted, 'ankle-support': support } = marks;
  return lifted && support ? lifted.v - support.v : null;
};

const ankleAlone: Gap = ({ marks }) => marks['ankle-lifted']?.v ?? null;

/** Random error of the ankles' marks, px, from the first frame that carries what `gap` reads. */
const gapError = (frames: readonly LevelFrame[], gap: Gap): number => {
  const first = frames.find((frame) => gap(frame) !== null)?.marks;
  const support = gap === ankleGap ? first?.['ankle-support'] : undefined;
  return Math.hypot(first?.['ankle-lifted']?.error ?? 0, support?.error ?? 0);
};

const pelvisU = ({ marks }: LevelFrame): number | null => {
  const { 'asis-support': support, 'asis-lifted': lifted } = marks;
  return lifted && support ? (lifted.u + support.u) / 2 : null;
};

const present = (value: number | null): value is number => value !== null;

/** The frames of the first 300 ms that carry a value, or the first three frames that do. */
const firstFrames = (frames: readonly LevelFrame[], read: Gap): readonly LevelFrame[] => {
  const start = frames[0]?.time;
  if (start === undefined) return [];
  const known = frames.filter((frame) => read(frame) !== null);
  const early = known.filter((frame) => frame.time <= start + BASELINE_MS);
  return early.length >= LEAST_BASELINE ? early : known.slice(0, LEAST_BASELINE);
};

const firstValues = (frames: readonly LevelFrame[], read: Gap): readonly number[] =>
  firstFrames(frames, read).map(read).filter(present);

/**
 * Seen from the side, the lifted foot stands in front of the other one and covers its ankle just while both are
 * still. The lifted ankle then counts alone, in the picture of a camera that does not move.
 */
const gapIn = (view: View, standing: readonly LevelFrame[]): Gap => {
  if (view === 'front' || view === 'back') return ankleGap;
  const covered = firstFrames(standing, ankleAlone).some((frame) => ankleGap(frame) === null);
  return covered ? ankleAlone : ankleGap;
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
  { mmPerPx, camera: { view } }: Pick<Rig, 'mmPerPx' | 'camera'>,
  moved: Partial<RepBoundaries>,
): Stance => {
  const standing = shared ?? frames;
  const gapOf = gapIn(view, standing);
  const gaps = firstValues(standing, gapOf);
  const unrest = mmPerPx * (robustSpread(gaps) ?? 0);
  const calm = Math.max(CONSTANTS.still.value, 3 * mmPerPx * gapError(standing, gapOf));
  // a clip that begins in the middle of a lift has no stance to measure heights from
  const base = gaps.length >= LEAST_BASELINE && unrest <= calm ? median(gaps) : null;
  const height = (frame: LevelFrame): number | null => {
    const gap = gapOf(frame);
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
