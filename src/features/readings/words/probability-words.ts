/** How sure is how sure, in words; the steps are the product's own. `p` from 0 to 1. */
export const howSure = (p: number): string => {
  if (p >= 0.99) return 'Almost certain';
  if (p >= 0.95) return 'Very likely';
  if (p >= 0.8) return 'Likely';
  return p > 0.5 ? 'More likely than not' : 'Not likely';
};

/**
 * A probability as a count of a hundred, `99.8`. Rounded down, so that what misses a limit never looks
 * as if it met it; never 0 and never 100.
 */
export const inHundred = (p: number): string => {
  const hundred = 100 * p;
  if (hundred >= 99.9) return 'more than 99.9';
  if (hundred < 1) return 'less than 1';
  return hundred >= 99 ? (Math.floor(hundred * 10) / 10).toFixed(1) : String(Math.floor(hundred));
};
