import { readFileSync } from 'node:fs';

type Row<K extends string> = Readonly<Record<K, number>>;
type Rows<K extends string> = readonly Row<K>[];
type Lists<K extends string> = Readonly<Record<K, readonly number[]>>;
type Pairs = readonly (readonly [number, number])[];

/** What numpy and scipy gave for seeded input; `make.py` beside the file wrote it. */
export interface Reference {
  readonly scipy: string;
  readonly butterworth: readonly (Row<'cutOff' | 'rate'> & Lists<'b' | 'a' | 'x' | 'y'>)[];
  readonly student: Rows<'t' | 'nu' | 'above' | 'p' | 'quantile'>;
  readonly fisher: Rows<'f' | 'above' | 'below' | 'cdf' | 'p' | 'quantile'>;
  readonly normal: Rows<'x' | 'below'>;
  readonly logGamma: Rows<'x' | 'y'>;
  readonly beta: Rows<'x' | 'a' | 'b' | 'y'>;
  readonly rise: readonly (Row<'sFit'> &
    Lists<'lift' | 'weight' | 'thigh' | 'pelvis' | 'thighBeta' | 'pelvisBeta'>)[];
  readonly floor: readonly (Row<'x' | 'z'> & {
    readonly seen: Pairs;
    readonly floor: Pairs;
    readonly at: readonly [number, number];
  })[];
  readonly lines: readonly Lists<'times' | 'values' | 'smooth'>[];
}

export const reference = JSON.parse(
  readFileSync(new URL('../fixtures/reference/reference.json', import.meta.url), 'utf8'),
) as Reference;

/** Largest difference between two lists, relative to 1 or to the value where it is larger. */
export const farthest = (ours: readonly number[], theirs: readonly number[]): number => {
  if (ours.length !== theirs.length) return Infinity;
  return Math.max(
    ...theirs.map((value, i) => Math.abs((ours[i] ?? NaN) - value) / Math.max(1, Math.abs(value))),
  );
};
