import { scaleLinear, type ScaleLinear } from 'd3-scale';
import type { Gates } from '#shared/protocol/protocol.ts';

/** Where a course is drawn. Lift runs to the right, turn upwards: out is up. */
export interface CourseScale {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  /** Degrees of lift to px. */
  readonly x: ScaleLinear<number, number>;
  /** Degrees of turn to px. */
  readonly y: ScaleLinear<number, number>;
  readonly gates: Gates;
  readonly xTicks: readonly number[];
  readonly yTicks: readonly number[];
  /** Too small for words beside the lines. */
  readonly compact: boolean;
}

export const LIFT_RANGE = [15, 112] as const;
/** Shown even where nothing reaches so far, so that two courses can be compared by eye. */
const LEAST_TURN_RANGE = [-10, 20] as const;
const STEP = 5;
const COMPACT_BELOW = 440;

/** Turn range that holds every value, in whole steps of 5°, never less than −10° to +20°. */
export const turnRange = (values: Iterable<number>): [number, number] => {
  let low: number = LEAST_TURN_RANGE[0];
  let high: number = LEAST_TURN_RANGE[1];
  for (const value of values) {
    if (!Number.isFinite(value)) continue;
    low = Math.min(low, Math.floor(value / STEP) * STEP);
    high = Math.max(high, Math.ceil(value / STEP) * STEP);
  }
  return [low, high];
};

const every = (from: number, to: number, step: number): number[] => {
  const ticks: number[] = [];
  for (let at = Math.ceil(from / step) * step; at <= to; at += step) ticks.push(at);
  return ticks;
};

/** Apart from the gates, so that the figures do not run into each other. */
const TICK_ROOM = 8;

/** The gates always, and round figures beside them. */
const liftTicks = ({ from, to }: Gates, compact: boolean): number[] => {
  const round = compact ? [30] : [15, 30, 45, 60, 75, 90, 105];
  const apart = round.filter((lift) =>
    [from, to].every((gate) => Math.abs(lift - gate) >= TICK_ROOM),
  );
  return [...apart, from, to].sort((a, b) => a - b);
};

export const courseScale = (
  width: number,
  height: number,
  turns: Iterable<number>,
  gates: Gates,
): CourseScale => {
  const compact = width < COMPACT_BELOW;
  const left = 44;
  const right = width - (compact ? 8 : 16);
  const top = 28;
  const bottom = height - 48;
  const [low, high] = turnRange(turns);
  const many = high - low > 40;
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    compact,
    x: scaleLinear(LIFT_RANGE, [left, right]),
    y: scaleLinear([low, high], [bottom, top]),
    gates,
    xTicks: liftTicks(gates, compact),
    yTicks: every(low, high, compact || many ? 10 : STEP),
  };
};
