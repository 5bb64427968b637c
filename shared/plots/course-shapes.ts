import { area, line } from 'd3-shape';
import type { Gates } from '#shared/protocol/protocol.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import type { CourseScale } from './course-scale.ts';

/** One point of a drawn course; the reading's `CurvePoint` fits in. Degrees. */
export interface CourseCurvePoint {
  readonly lift: number;
  readonly turn: number;
  readonly low: number;
  readonly high: number;
  /** False where no marked frame lies within reach: drawn dotted. */
  readonly carried: boolean;
}
export type CourseCurve = readonly CourseCurvePoint[];

/** A stretch of a curve that is drawn in one way; stretches share their end points. */
export interface Run {
  readonly carried: boolean;
  readonly points: CourseCurve;
}

/** Splits a curve where marked frames begin or cease to carry it. */
export const runsOf = (curve: CourseCurve): Run[] => {
  const runs: { carried: boolean; points: CourseCurvePoint[] }[] = [];
  for (const [n, point] of curve.entries()) {
    const before = curve[n - 1];
    if (!before) continue;
    // a stretch is carried only where both its ends are
    const carried = before.carried && point.carried;
    const run = runs.at(-1);
    if (run && run.carried === carried) run.points.push(point);
    else runs.push({ carried, points: [before, point] });
  }
  return runs;
};

export const linePath = (points: CourseCurve, scale: CourseScale): string =>
  line<CourseCurvePoint>(
    (point) => scale.x(point.lift),
    (point) => scale.y(point.turn),
  )([...points]) ?? '';

export const bandPath = (points: CourseCurve, scale: CourseScale): string =>
  area<CourseCurvePoint>(
    (point) => scale.x(point.lift),
    (point) => scale.y(point.low),
    (point) => scale.y(point.high),
  )([...points]) ?? '';

/**
 * Where the change from gate to gate ends for each judgement, degrees: the expected turn-in from −1°
 * to −12°, holding still from −1° to +1°. From our model, no source; drawing only.
 */
export const WEDGE = { in: [-1, -12], still: [-1, 1] } as const;

/** A triangle from the course's own value at the lower gate to a range at the upper one. */
export const wedgePath = (
  atFrom: number,
  [from, to]: readonly [number, number],
  scale: CourseScale,
): string => {
  const { x, y, gates } = scale;
  const end = x(gates.to);
  return `M${x(gates.from)},${y(atFrom)}L${end},${y(atFrom + from)}L${end},${y(atFrom + to)}Z`;
};

/**
 * Turns that a plot of this course has to hold: the line wherever it goes, its band and the wedge from gate
 * to gate. Elsewhere nothing is read from the band, and it may be so wide that it would flatten the course:
 * there it runs out of the plot.
 */
export function* turnsToHold(curve: CourseCurve, { from, to }: Gates): Generator<number> {
  for (const { lift, turn, low, high } of curve) {
    yield turn;
    if (lift >= from && lift <= to) yield* [low, high];
  }
  const atFrom = turnAt(curve, from);
  if (atFrom !== null) yield atFrom + WEDGE.in[1];
}
