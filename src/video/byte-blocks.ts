/** Whole blocks, first and last inclusive. */
export interface BlockRun {
  readonly first: number;
  readonly last: number;
}

/** The blocks that hold the bytes from `start` (inclusive) to `end` (exclusive, above start). */
export const blocksOf = (start: number, end: number, blockBytes: number): BlockRun => ({
  first: Math.floor(start / blockBytes),
  last: Math.floor((end - 1) / blockBytes),
});

/** The runs within `run` for which `missing` holds, each as long as it can be. */
export const missingRuns = (run: BlockRun, missing: (block: number) => boolean): BlockRun[] => {
  const runs: BlockRun[] = [];
  let first: number | null = null;
  for (let block = run.first; block <= run.last + 1; block += 1) {
    const counts = block <= run.last && missing(block);
    if (counts) first ??= block;
    else if (first !== null) {
      runs.push({ first, last: block - 1 });
      first = null;
    }
  }
  return runs;
};

/**
 * What to load next when nobody waits: from the missing block nearest to `centre` (ahead before
 * behind) onwards, at most `longest` blocks; null when nothing is missing.
 */
export const nearestMissing = (
  centre: number,
  count: number,
  longest: number,
  missing: (block: number) => boolean,
): BlockRun | null => {
  for (let distance = 0; distance < count; distance += 1) {
    for (const first of [centre + distance, centre - distance]) {
      if (first < 0 || first >= count || !missing(first)) continue;
      let last = first;
      while (last + 1 < count && last + 1 < first + longest && missing(last + 1)) last += 1;
      return { first, last };
    }
  }
  return null;
};
