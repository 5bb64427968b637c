import type { RepResult } from './types.ts';

/** A point of a drawn course, degrees. */
interface Point {
  readonly lift: number;
  readonly turn: number;
}

/** Turn of a curve at a lift, between its points; null outside them. */
export const turnAt = (curve: readonly Point[], lift: number): number | null => {
  for (const [n, point] of curve.entries()) {
    if (point.lift === lift) return point.turn;
    const before = curve[n - 1];
    if (before && before.lift < lift && lift < point.lift) {
      const share = (lift - before.lift) / (point.lift - before.lift);
      return before.turn + share * (point.turn - before.turn);
    }
  }
  return null;
};

/** ± (95 %) of one rep's change, degrees: what its band says at the upper gate. */
export const repHalfWidth = (
  { curve, fit }: Pick<RepResult, 'curve' | 'fit'>,
  gateTo: number,
): number => {
  const upper = turnAt(
    curve.map(({ lift, high }) => ({ lift, turn: high })),
    gateTo,
  );
  const line = turnAt(curve, gateTo);
  return upper === null || line === null ? 1.96 * (fit?.change.u ?? 0) : upper - line;
};
