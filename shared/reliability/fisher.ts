import { regularisedBeta } from '#shared/reading/student.ts';

/** Share of Fisher's F distribution below f, with degrees of freedom that need not be whole. */
export const fisherBelow = (f: number, above: number, below: number): number => {
  if (!(above > 0 && below > 0) || Number.isNaN(f)) return NaN;
  if (f <= 0) return 0;
  if (f === Infinity) return 1;
  return regularisedBeta((above * f) / (above * f + below), above / 2, below / 2);
};

/** The F that a share `p` lies below, 0 < p < 1; by halving. */
export const fisherQuantile = (p: number, above: number, below: number): number => {
  if (!(p > 0 && p < 1 && above > 0 && below > 0)) return NaN;
  let low = 0;
  let high = 1;
  while (fisherBelow(high, above, below) < p && high < 1e12) {
    low = high;
    high *= 2;
  }
  for (let i = 0; i < 100 && high - low > 1e-12 * high; i += 1) {
    const middle = (low + high) / 2;
    if (fisherBelow(middle, above, below) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
};
