/** What one measurement found. Both sides are measured in the same run on the same machine. */
export interface BenchResult {
  /** `a / b`; null where there is nothing to compare with, or a side could not be measured. */
  readonly ratio: number | null;
  /** Ours, in the unit that `info` or the name gives. */
  readonly a: number;
  /** What it is compared with; null where there is nothing. */
  readonly b: number | null;
  /** What else was seen, by name; shown in the table and kept in the document. */
  readonly info: Readonly<Record<string, string | number | boolean | null>>;
}

/**
 * One line of `npm run bench`: a file in `tests/bench/entries/` whose default export this is.
 * Entries run one after another, in the order of their file names; a throw is a failed entry.
 */
export interface BenchEntry {
  readonly name: string;
  /** The largest ratio that passes; null: printed as information only. */
  readonly target: number | null;
  run(): Promise<BenchResult>;
}

export type Verdict = 'passed' | 'missed' | 'failed' | 'information';

export interface EntryReport {
  readonly name: string;
  readonly target: number | null;
  readonly verdict: Verdict;
  readonly ratio: number | null;
  readonly a: number | null;
  readonly b: number | null;
  readonly info: BenchResult['info'];
}

export const judge = (target: number | null, ratio: number | null): Verdict => {
  if (target === null) return 'information';
  return ratio !== null && ratio <= target ? 'passed' : 'missed';
};
