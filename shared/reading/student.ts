/** Logarithm of the gamma function for x > 0: Stirling's series after a shift to x ≥ 12. */
export const logGamma = (x: number): number => {
  let shift = 0;
  let z = x;
  while (z < 12) {
    shift += Math.log(z);
    z += 1;
  }
  const r = 1 / (z * z);
  const series = (1 / z) * (1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r / 1188))));
  return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series - shift;
};

/** Continued fraction of the incomplete beta function, by Lentz's method. */
const betaFraction = (x: number, a: number, b: number): number => {
  const tiny = 1e-300;
  let c = 1;
  let d = 1 / Math.max(1 - ((a + b) * x) / (a + 1), tiny);
  let result = d;
  for (let m = 1; m <= 500; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || tiny);
    c = 1 + even / c || tiny;
    result *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || tiny);
    c = 1 + odd / c || tiny;
    const step = d * c;
    result *= step;
    if (Math.abs(step - 1) < 1e-15) break;
  }
  return result;
};

/** Regularised incomplete beta function I_x(a, b), 0 ≤ x ≤ 1, a and b > 0. */
export const regularisedBeta = (x: number, a: number, b: number): number => {
  if (!(x >= 0 && x <= 1 && a > 0 && b > 0)) return NaN;
  if (x === 0 || x === 1) return x;
  const front = Math.exp(
    logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x),
  );
  return x < (a + 1) / (a + b + 2)
    ? (front * betaFraction(x, a, b)) / a
    : 1 - (front * betaFraction(1 - x, b, a)) / b;
};

/** P(T > t) of Student's distribution with ν > 0 degrees of freedom, not necessarily whole. */
export const studentAbove = (t: number, nu: number): number => {
  if (Number.isNaN(t) || !(nu > 0)) return NaN;
  if (!Number.isFinite(t)) return t > 0 ? 0 : 1;
  const tail = 0.5 * regularisedBeta(nu / (nu + t * t), nu / 2, 0.5);
  return t > 0 ? tail : 1 - tail;
};

/** The t that a share `p` of the distribution lies below, 0 < p < 1; by halving. */
export const studentQuantile = (p: number, nu: number): number => {
  if (!(p > 0 && p < 1 && nu > 0)) return NaN;
  if (p < 0.5) return -studentQuantile(1 - p, nu);
  let low = 0;
  let high = 1;
  while (studentAbove(high, nu) > 1 - p) {
    low = high;
    high *= 2;
  }
  for (let i = 0; i < 80 && high - low > 1e-13 * high; i += 1) {
    const middle = (low + high) / 2;
    if (studentAbove(middle, nu) > 1 - p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
};
