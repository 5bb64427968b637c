import type { Degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { medianOfThree } from './robust.ts';
import type { Stance } from './stance.ts';
import type { FramePhase, RepBoundaries } from './types.ts';

/** Top, plateau and foot down of one rep, and the phase of each frame. */
export interface Rise {
  readonly top: Milliseconds | null;
  readonly lowerFrom: Milliseconds | null;
  readonly footDown: Milliseconds | null;
  readonly byFrame: readonly FramePhase[];
}

/** Index of the largest known value among the allowed ones, or −1. */
const largest = (
  values: readonly (number | null)[],
  allowed: (index: number) => boolean,
): number => {
  let best = -1;
  let height = -Infinity;
  for (const [i, value] of values.entries()) {
    if (value === null || value <= height || !allowed(i)) continue;
    best = i;
    height = value;
  }
  return best;
};

/** Last frame of the unbroken run from the top that stays within 5° of it. */
const plateauEnd = (smooth: readonly (number | null)[], top: number): number => {
  const height = smooth[top] ?? -Infinity;
  let end = top;
  for (let i = top + 1; i < smooth.length; i += 1) {
    const value = smooth[i];
    if (value === null || value === undefined) continue;
    if (value < height - CONSTANTS.plateau.value) break;
    end = i;
  }
  return end;
};

const findFootDown = (
  times: readonly Milliseconds[],
  stance: Stance,
  from: number,
): Milliseconds | null => {
  const { heights, footOffMm } = stance;
  if (footOffMm === null) return null;
  let before: { time: number; height: number } | null = null;
  for (let i = from; i < times.length; i += 1) {
    const height = heights[i];
    const time = times[i];
    if (height === null || height === undefined || time === undefined) continue;
    if (height < footOffMm && before && before.height > footOffMm) {
      const part = (before.height - footOffMm) / (before.height - height);
      return milliseconds(before.time + part * (time - before.time));
    }
    before = { time, height };
  }
  return null;
};

/** `lifts`: one per frame, null where unknown. */
export const findRise = (
  times: readonly Milliseconds[],
  lifts: readonly (Degrees | null)[],
  stance: Stance,
  moved: Partial<RepBoundaries>,
): Rise => {
  const { footOff } = stance;
  if (footOff === null)
    return { top: null, lowerFrom: null, footDown: null, byFrame: times.map(() => 'between') };
  const after = (i: number): boolean => (times[i] ?? -Infinity) >= footOff;
  const smooth = medianOfThree(lifts);
  const foundTop = largest(smooth, after);
  const movedTop =
    moved.top === undefined ? -1 : times.findLastIndex((time) => time <= (moved.top ?? time));
  const top = movedTop >= 0 ? movedTop : foundTop;
  const end = top < 0 ? -1 : plateauEnd(smooth, top);
  const lowerFrom = moved.lowerFrom ?? times[end] ?? null;
  const footDown = moved.footDown ?? (end < 0 ? null : findFootDown(times, stance, end));

  let highest = -Infinity;
  const byFrame = times.map((time, i): FramePhase => {
    if (time < footOff || lowerFrom === null) return 'between';
    if (time > lowerFrom) return footDown === null || time <= footDown ? 'lower' : 'between';
    const lift = lifts[i] ?? null;
    if (lift === null) return 'rise';
    highest = Math.max(highest, lift);
    return lift < highest - CONSTANTS.fallBack.value ? 'between' : 'rise';
  });
  return { top: moved.top ?? times[top] ?? null, lowerFrom, footDown, byFrame };
};
