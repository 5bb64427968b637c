import { MEASURES } from '#shared/measures/registry.ts';
import type { SubstitutionChange } from '#shared/measures/change.ts';
import type { Missing } from '#shared/measures/missing.ts';
import type { ReadingResult } from '#shared/reading/types.ts';

/** One line of the table: the mean over the used reps that show it. */
export interface ChangeRow {
  readonly id: string;
  readonly label: string;
  readonly sign: string;
  readonly unit: SubstitutionChange['unit'];
  readonly change: number | null;
  /** Of one rep, so rather too large than too small for several. */
  readonly smallest: number | null;
  readonly beyond: boolean;
  readonly missing: Missing | null;
}

const mean = (values: readonly number[]): number | null =>
  values.length === 0 ? null : values.reduce((sum, value) => sum + value, 0) / values.length;

/** Substitutions in the order of the registry; a measure that no rep could show says why. */
export const changeRows = ({ reps }: ReadingResult): ChangeRow[] => {
  const counted = reps.some(({ used }) => used) ? reps.filter(({ used }) => used) : reps;
  return MEASURES.flatMap(({ id, label, sign }) => {
    const own = counted.flatMap(({ substitutions }) =>
      substitutions.filter(({ measure }) => measure === id),
    );
    const [first] = own;
    if (!first) return [];
    const change = mean(own.flatMap((each) => each.change ?? []));
    const limits = own.flatMap((each) => each.smallestChange ?? []);
    const smallest = limits.length === 0 ? null : Math.max(...limits);
    return [
      {
        id,
        label,
        sign,
        unit: first.unit,
        change,
        smallest,
        beyond: change !== null && smallest !== null && Math.abs(change) > smallest,
        missing: change === null ? first.missing : null,
      },
    ];
  });
};
