/**
 * Lower triangle L of A = L Lᵀ, row by row over A itself, A symmetric and positive definite in one
 * array of n·n. False where it is not positive definite: A is then meaningless.
 */
const factorInPlace = (a: Float64Array, n: number): boolean => {
  const at = (i: number, j: number): number => a[i * n + j] ?? NaN;
  for (let i = 0; i < n; i += 1)
    for (let j = 0; j <= i; j += 1) {
      let sum = at(i, j);
      for (let k = 0; k < j; k += 1) sum -= at(i, k) * at(j, k);
      if (i === j) {
        if (!(sum > 0)) return false;
        a[i * n + i] = Math.sqrt(sum);
      } else a[i * n + j] = sum / at(j, j);
    }
  return true;
};

/**
 * Solves for further right sides with the triangle that `solveInPlace` left in A. `b` holds `sides`
 * columns of n, one after the other, and is overwritten with the answers.
 */
export const solveFactored = (a: Float64Array, b: Float64Array, n: number, sides: number): void => {
  const at = (i: number, j: number): number => a[i * n + j] ?? NaN;
  for (let side = 0; side < sides; side += 1) {
    const from = side * n;
    for (let i = 0; i < n; i += 1) {
      let sum = b[from + i] ?? NaN;
      for (let k = 0; k < i; k += 1) sum -= at(i, k) * (b[from + k] ?? NaN);
      b[from + i] = sum / at(i, i);
    }
    for (let i = n - 1; i >= 0; i -= 1) {
      let sum = b[from + i] ?? NaN;
      for (let k = i + 1; k < n; k += 1) sum -= at(k, i) * (b[from + k] ?? NaN);
      b[from + i] = sum / at(i, i);
    }
  }
};

/**
 * Solves A x = b for one or more right sides, A symmetric and positive definite, row by row in one
 * array of n·n; b holds `sides` columns of n, one after the other. Both are overwritten: A with its
 * triangle, b with the answers. False where A is not positive definite: b is then meaningless.
 */
export const solveInPlace = (
  a: Float64Array,
  b: Float64Array,
  n: number,
  sides: number,
): boolean => {
  if (!factorInPlace(a, n)) return false;
  solveFactored(a, b, n, sides);
  return true;
};
