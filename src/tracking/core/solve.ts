/**
 * Solves the symmetric `matrix · x = right` (rows one after another) by Cholesky's way. Null where
 * the matrix is not positive definite, or nearly not: nothing determines the answer then.
 */
export const solveSymmetric = (
  matrix: readonly number[],
  right: readonly number[],
): number[] | null => {
  const n = right.length;
  const lower = new Array<number>(n * n).fill(0);
  for (let row = 0; row < n; row += 1) {
    for (let column = 0; column <= row; column += 1) {
      let sum = matrix[row * n + column] ?? NaN;
      for (let k = 0; k < column; k += 1)
        sum -= (lower[row * n + k] ?? 0) * (lower[column * n + k] ?? 0);
      if (row === column) {
        const whole = matrix[row * n + row] ?? NaN;
        if (!(sum > 1e-10 * whole) || !(whole > 0)) return null;
        lower[row * n + row] = Math.sqrt(sum);
      } else lower[row * n + column] = sum / (lower[column * n + column] ?? NaN);
    }
  }
  const x = [...right];
  for (let row = 0; row < n; row += 1) {
    for (let k = 0; k < row; k += 1)
      x[row] = (x[row] ?? NaN) - (lower[row * n + k] ?? 0) * (x[k] ?? NaN);
    x[row] = (x[row] ?? NaN) / (lower[row * n + row] ?? NaN);
  }
  for (let row = n - 1; row >= 0; row -= 1) {
    for (let k = row + 1; k < n; k += 1)
      x[row] = (x[row] ?? NaN) - (lower[k * n + row] ?? 0) * (x[k] ?? NaN);
    x[row] = (x[row] ?? NaN) / (lower[row * n + row] ?? NaN);
  }
  return x.every(Number.isFinite) ? x : null;
};

/** The eigenvalues of [[a, b], [b, d]], the smaller first. */
export const eigenvalues = (a: number, b: number, d: number): readonly [number, number] => {
  const middle = (a + d) / 2;
  const apart = Math.hypot((a - d) / 2, b);
  return [middle - apart, middle + apart];
};
