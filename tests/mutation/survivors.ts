import type { Mutant } from './mutants.ts';

/** A mutant no test can or needs to tell from the original, and why. */
export interface Explained {
  readonly file: string;
  /** The line of code without its indent, the change made in it. */
  readonly code: string;
  readonly before: string;
  readonly after: string;
  readonly why: string;
}

export const EXPLAINED: readonly Explained[] = [];

export const explanationOf = (mutant: Mutant): string | null =>
  EXPLAINED.find(
    (each) =>
      each.file === mutant.file &&
      each.code === mutant.code &&
      each.before === mutant.before &&
      each.after === mutant.after,
  )?.why ?? null;
