/**
 * How the support hip turns while the other thigh rises, as two parts in degrees: what the pelvis
 * adds and what the standing thigh adds to the turn (external positive, zero in quiet stance).
 */
export interface TurnShape {
  /** lift of the knots, degrees, rising */
  readonly lift: readonly number[];
  readonly pelvisPart: readonly number[];
  readonly thighPart: readonly number[];
}

const KNOTS = [0, 25, 45, 60, 75, 90, 105, 125] as const;

export const TURN_SHAPES = {
  early: {
    lift: KNOTS,
    pelvisPart: [0, -0.4, -0.9, -0.8, 1.9, 5.8, 8.0, 8.9],
    thighPart: [0, -0.2, -0.4, -0.3, 0.6, 1.9, 2.6, 2.8],
  },
  expected: {
    lift: KNOTS,
    pelvisPart: [0, 0.3, 0.6, 0.4, -2.1, -5.4, -6.1, -5.2],
    thighPart: [0, 0.1, 0.3, 0.1, -1.1, -2.6, -2.9, -2.5],
  },
  still: {
    lift: KNOTS,
    pelvisPart: [0, 0.2, 0.3, 0.2, 0, -0.3, -0.2, 0.1],
    thighPart: [0, 0.1, 0, -0.1, -0.1, 0.1, 0.2, 0.2],
  },
} as const satisfies Record<string, TurnShape>;

export type TurnShapeName = keyof typeof TURN_SHAPES;

/** Slope at knot i that never overshoots (Fritsch and Carlson's condition, harmonic mean). */
const slopeAt = (x: readonly number[], y: readonly number[], i: number): number => {
  const chord = (a: number): number =>
    ((y[a + 1] ?? 0) - (y[a] ?? 0)) / ((x[a + 1] ?? 1) - (x[a] ?? 0));
  if (i === 0) return chord(0);
  if (i === x.length - 1) return chord(i - 1);
  const [before, after] = [chord(i - 1), chord(i)];
  return before * after <= 0 ? 0 : (2 * before * after) / (before + after);
};

/** Value at `at` of the smooth curve through the knots; held constant outside them. */
export const through = (x: readonly number[], y: readonly number[], at: number): number => {
  const last = x.length - 1;
  const [first, end] = [x[0] ?? 0, x[last] ?? 0];
  const place = Math.min(end, Math.max(first, at));
  let i = 0;
  while (i < last - 1 && (x[i + 1] ?? end) < place) i += 1;
  const [x0, x1] = [x[i] ?? 0, x[i + 1] ?? 1];
  const [y0, y1] = [y[i] ?? 0, y[i + 1] ?? 0];
  const h = x1 - x0;
  const t = (place - x0) / h;
  const [t2, t3] = [t * t, t * t * t];
  return (
    (2 * t3 - 3 * t2 + 1) * y0 +
    (t3 - 2 * t2 + t) * h * slopeAt(x, y, i) +
    (3 * t2 - 2 * t3) * y1 +
    (t3 - t2) * h * slopeAt(x, y, i + 1)
  );
};
