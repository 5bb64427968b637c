/** One row per target, one column per judge or occasion; every cell known. */
export type Ratings = readonly (readonly number[])[];

/** Mean squares of targets × judges (two-way, one rating a cell). */
export interface MeanSquares {
  readonly targets: number;
  readonly judges: number;
  /** Between targets, within targets, between judges, and what is left. */
  readonly between: number;
  readonly within: number;
  readonly judge: number;
  readonly error: number;
}

/** Null with fewer than two targets or judges, with gaps, or with values that are not finite. */
export const meanSquares = (ratings: Ratings): MeanSquares | null => {
  const n = ratings.length;
  const k = ratings[0]?.length ?? 0;
  if (n < 2 || k < 2) return null;
  if (ratings.some((row) => row.length !== k || !row.every(Number.isFinite))) return null;
  const all = ratings.flat();
  const grand = all.reduce((a, b) => a + b, 0) / (n * k);
  const rows = ratings.map((row) => row.reduce((a, b) => a + b, 0) / k);
  const columns = Array.from(
    { length: k },
    (_, j) => ratings.reduce((sum, row) => sum + (row[j] ?? NaN), 0) / n,
  );
  const total = all.reduce((sum, x) => sum + (x - grand) ** 2, 0);
  const betweenSum = k * rows.reduce((sum, mean) => sum + (mean - grand) ** 2, 0);
  const judgeSum = n * columns.reduce((sum, mean) => sum + (mean - grand) ** 2, 0);
  return {
    targets: n,
    judges: k,
    between: betweenSum / (n - 1),
    within: (total - betweenSum) / (n * (k - 1)),
    judge: judgeSum / (k - 1),
    error: Math.max(0, total - betweenSum - judgeSum) / ((n - 1) * (k - 1)),
  };
};
