import { scaleLinear, type ScaleLinear } from 'd3-scale';
import type { LiftCurve } from './lift-curve.ts';

/** Where lift over time is drawn. Time runs to the right, lift upwards. */
export interface LiftScale {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  /** Seconds to px. */
  readonly x: ScaleLinear<number, number>;
  /** Degrees of lift to px. */
  readonly y: ScaleLinear<number, number>;
  readonly xTicks: readonly number[];
  readonly yTicks: readonly number[];
  readonly compact: boolean;
}

const COMPACT_BELOW = 440;
/** Shown even where nothing reaches so far, so that two lifts can be compared by eye. */
const LEAST_TOP = 105;
const STEP = 30;

export const liftScale = (
  width: number,
  height: number,
  curves: readonly LiftCurve[],
): LiftScale => {
  const points = curves.flatMap((curve) => curve.points);
  const times = points.map(({ time }) => time);
  const edges = points.flatMap(({ line, lift, halfWidth }) => [
    line + (halfWidth ?? 0),
    line - (halfWidth ?? 0),
    lift,
  ]);
  const high = Math.max(LEAST_TOP, ...edges);
  const low = Math.min(0, ...edges);
  const from = Math.min(0, ...times);
  const to = Math.max(from + 0.5, ...times);
  const compact = width < COMPACT_BELOW;
  const [left, right] = [44, width - (compact ? 8 : 16)];
  const [top, bottom] = [28, height - 48];
  const x = scaleLinear([from, to], [left, right]);
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    compact,
    x,
    y: scaleLinear([low, high], [bottom, top]),
    xTicks: x.ticks(compact ? 4 : 8),
    yTicks: Array.from({ length: Math.floor(high / STEP) + 1 }, (_, n) => n * STEP),
  };
};
