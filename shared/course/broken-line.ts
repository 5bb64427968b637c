import { solveInPlace } from './linear.ts';

/** Two straight lines that meet. */
export interface BrokenLine {
  readonly at: number;
  /** Height where they meet, and the slopes before and after. */
  readonly height: number;
  readonly before: number;
  readonly after: number;
  /** Sum of squared residuals. */
  readonly squares: number;
}

const fitAt = (x: readonly number[], y: readonly number[], at: number): BrokenLine | null => {
  const a = new Float64Array(9);
  const b = new Float64Array(3);
  const row = (value: number): readonly [number, number, number] => [
    1,
    Math.min(value - at, 0),
    Math.max(value - at, 0),
  ];
  for (const [n, value] of x.entries()) {
    const r = row(value);
    for (let i = 0; i < 3; i += 1) {
      b[i] = (b[i] ?? 0) + (r[i] ?? 0) * (y[n] ?? NaN);
      for (let j = 0; j < 3; j += 1) a[i * 3 + j] = (a[i * 3 + j] ?? 0) + (r[i] ?? 0) * (r[j] ?? 0);
    }
  }
  if (!solveInPlace(a, b, 3, 1)) return null;
  const [height = NaN, before = NaN, after = NaN] = b;
  let squares = 0;
  for (const [n, value] of x.entries()) {
    const r = row(value);
    squares += ((y[n] ?? NaN) - height * r[0] - before * r[1] - after * r[2]) ** 2;
  }
  return { at, height, before, after, squares };
};

const GRID = 200;

/**
 * Least-squares broken line: the best place of a grid between the outermost points, then narrowed
 * by thirds. Null with fewer than five points or without spread. The sharp counterpart of the
 * rounded corner in the fit over the rise, by which that one is checked.
 */
export const brokenLine = (x: readonly number[], y: readonly number[]): BrokenLine | null => {
  if (x.length < 5 || x.length !== y.length) return null;
  const low = Math.min(...x);
  const high = Math.max(...x);
  const step = (high - low) / GRID;
  if (!(step > 0) || !Number.isFinite(step)) return null;
  let best: BrokenLine | null = null;
  for (let i = 1; i < GRID; i += 1) {
    const fit = fitAt(x, y, low + i * step);
    if (fit && (!best || fit.squares < best.squares)) best = fit;
  }
  if (!best) return null;
  let from = best.at - step;
  let to = best.at + step;
  for (let i = 0; i < 60; i += 1) {
    const left = fitAt(x, y, from + (to - from) / 3);
    const right = fitAt(x, y, to - (to - from) / 3);
    if (!left || !right) break;
    if (left.squares < right.squares) to = right.at;
    else from = left.at;
    const better = left.squares < right.squares ? left : right;
    if (better.squares < best.squares) best = better;
  }
  return best;
};
