/** The value that `share` of them do not pass, by rank; null where there is none. */
export const quantile = (values: readonly number[], share: number): number | null => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? null;
};

/** NaN where there is nothing. */
export const median = (values: readonly number[]): number => quantile(values, 0.5) ?? NaN;
