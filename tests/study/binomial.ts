/** P(at most `hits` of `of`) where each happens with probability `p`. */
export const atMost = (hits: number, of: number, p: number): number => {
  let term = (1 - p) ** of;
  let sum = term;
  for (let k = 1; k <= hits; k += 1) {
    term *= ((of - k + 1) / k) * (p / (1 - p));
    sum += term;
  }
  return Math.min(1, sum);
};
