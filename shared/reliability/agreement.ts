import { studentQuantile } from '#shared/reading/student.ts';
import { meanSquares, type Ratings } from './variance.ts';

/** Two values of the same thing: first and second marking, or two coaches. */
export type Pair = readonly [first: number, second: number];

const usable = (pairs: readonly Pair[]): boolean =>
  pairs.every(([a, b]) => Number.isFinite(a) && Number.isFinite(b));

/** Typical error of one value, √(Σd²/2n) (Dahlberg). Null of no pairs. */
export const typicalError = (pairs: readonly Pair[]): number | null => {
  if (pairs.length === 0 || !usable(pairs)) return null;
  const squares = pairs.reduce((sum, [a, b]) => sum + (b - a) ** 2, 0);
  return Math.sqrt(squares / (2 * pairs.length));
};

/** Standard error of measurement: root of the mean square error, judges' constant parts apart. */
export const standardError = (ratings: Ratings): number | null => {
  const squares = meanSquares(ratings);
  return squares && Math.sqrt(squares.error);
};

/** Smallest change that can be told from none (95 %): 1.96·√2·SEM. */
export const smallestDetectable = (sem: number): number => 1.96 * Math.SQRT2 * sem;

export interface Limits {
  /** Mean of first less second, its standard deviation, and the 95 % interval of the mean. */
  readonly bias: number;
  readonly sd: number;
  readonly biasLow: number;
  readonly biasHigh: number;
  /** Limits of agreement: bias ± `times` SD. */
  readonly low: number;
  readonly high: number;
}

/**
 * Limits of agreement (Bland & Altman 1986, Lancet 327:307–310). `times` is 1.96; the paper itself
 * used 2. Null with fewer than two pairs.
 */
export const limitsOfAgreement = (pairs: readonly Pair[], times = 1.96): Limits | null => {
  const n = pairs.length;
  if (n < 2 || !usable(pairs)) return null;
  const differences = pairs.map(([a, b]) => a - b);
  const bias = differences.reduce((a, b) => a + b, 0) / n;
  const sd = Math.sqrt(differences.reduce((sum, d) => sum + (d - bias) ** 2, 0) / (n - 1));
  const reach = (studentQuantile(0.975, n - 1) * sd) / Math.sqrt(n);
  return {
    bias,
    sd,
    biasLow: bias - reach,
    biasHigh: bias + reach,
    low: bias - times * sd,
    high: bias + times * sd,
  };
};

/** Pearson's r. Null with fewer than two pairs or without spread. */
export const correlation = (pairs: readonly Pair[]): number | null => {
  const n = pairs.length;
  if (n < 2 || !usable(pairs)) return null;
  const meanA = pairs.reduce((sum, [a]) => sum + a, 0) / n;
  const meanB = pairs.reduce((sum, [, b]) => sum + b, 0) / n;
  let [ab, aa, bb] = [0, 0, 0];
  for (const [a, b] of pairs) {
    ab += (a - meanA) * (b - meanB);
    aa += (a - meanA) ** 2;
    bb += (b - meanB) ** 2;
  }
  const r = ab / Math.sqrt(aa * bb);
  return Number.isFinite(r) ? r : null;
};

/**
 * Cohen's kappa of a square table of counts, rows one judge, columns the other. Null of an empty
 * or ragged table, and where chance alone would agree always.
 */
export const kappa = (table: readonly (readonly number[])[]): number | null => {
  const n = table.length;
  const known = table.every(
    (row) => row.length === n && row.every((count) => Number.isFinite(count) && count >= 0),
  );
  const total = table.flat().reduce((a, b) => a + b, 0);
  if (!known || total === 0) return null;
  let agreed = 0;
  let chance = 0;
  for (let i = 0; i < n; i += 1) {
    agreed += (table[i]?.[i] ?? 0) / total;
    const row = table[i]?.reduce((a, b) => a + b, 0) ?? 0;
    const column = table.reduce((sum, each) => sum + (each[i] ?? 0), 0);
    chance += (row * column) / (total * total);
  }
  return chance < 1 ? (agreed - chance) / (1 - chance) : null;
};

/** Counts of each pair of answers, in the order of `answers`; others are left out. */
export const countPairs = <T extends string>(
  answers: readonly T[],
  pairs: readonly (readonly [T, T])[],
): readonly (readonly number[])[] =>
  answers.map((row) =>
    answers.map((column) => pairs.filter(([a, b]) => a === row && b === column).length),
  );
