/** Density of the standard normal distribution. */
export const normalDensity = (x: number): number => Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);

/**
 * Distribution of the standard normal, to about 1e−15: the series φ(x)·(x + x³/3 + x⁵/15 + …) near
 * the middle, a continued fraction in the tails.
 */
export const normalBelow = (x: number): number => {
  if (Number.isNaN(x)) return NaN;
  if (x > 9) return 1;
  if (x < -38) return 0;
  if (Math.abs(x) < 4) {
    let term = x;
    let sum = x;
    for (let odd = 3; Math.abs(term) > 1e-17; odd += 2) {
      term *= (x * x) / odd;
      sum += term;
    }
    return 0.5 + normalDensity(x) * sum;
  }
  const z = Math.abs(x);
  let fraction = z;
  for (let n = 60; n >= 1; n -= 1) fraction = z + n / fraction;
  const tail = normalDensity(z) / fraction;
  return x < 0 ? tail : 1 - tail;
};
