/** Middle of the sorted values, mean of the two middle ones; null of nothing. */
export const median = (values: readonly number[]): number | null => {
  if (values.length === 0) return null;
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  const upper = sorted[half] ?? NaN;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[half - 1] ?? NaN)) / 2;
};

/** Median distance from the median, × 1.4826: the standard deviation where errors are normal. */
export const robustSpread = (values: readonly number[]): number | null => {
  const middle = median(values);
  if (middle === null) return null;
  const spread = median(values.map((value) => Math.abs(value - middle)));
  return spread === null ? null : 1.4826 * spread;
};

/**
 * Running median of three neighbours that are not null; at both ends the lower of the two there
 * are, so that a single outlier is never a top. Nulls stay null.
 */
export const medianOfThree = (values: readonly (number | null)[]): readonly (number | null)[] => {
  const known = values.flatMap((value, at) => (value === null ? [] : [{ value, at }]));
  const result: (number | null)[] = values.map(() => null);
  for (const [i, { at, value }] of known.entries()) {
    const before = known[i - 1]?.value;
    const after = known[i + 1]?.value;
    result[at] =
      before !== undefined && after !== undefined
        ? median([before, value, after])
        : Math.min(value, before ?? value, after ?? value);
  }
  return result;
};
