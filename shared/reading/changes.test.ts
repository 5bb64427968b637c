import { describe, expect, it } from 'vitest';
import { resultOf } from '#tests/support/side-page.ts';
import { changeRows } from './changes.ts';

describe('changes from quiet stance to the top', () => {
  const result = resultOf('g02_early_mid_3rep');
  const rows = changeRows(result);
  it('are the mean of the reps that count, against the largest of their limits', () => {
    const [row] = rows;
    const own = result.reps.flatMap(({ substitutions }) =>
      substitutions.filter(({ measure }) => measure === row?.id),
    );
    expect(own).toHaveLength(3);
    const sum = own.reduce((total, { change }) => total + (change ?? Number.NaN), 0);
    expect(row?.change).toBeCloseTo(sum / 3, 9);
    expect(row?.smallest).toBe(Math.max(...own.map(({ smallestChange }) => smallestChange ?? 0)));
  });
  it('are unknown, with the reason, where no rep shows them', () => {
    const blind = result.reps.map((rep) => ({
      ...rep,
      used: false,
      substitutions: rep.substitutions.map((each) => ({
        ...each,
        change: null,
        smallestChange: null,
      })),
    }));
    const all = changeRows({ ...result, reps: blind });
    expect(all).toHaveLength(rows.length);
    for (const row of all)
      expect(row).toMatchObject({ change: null, smallest: null, beyond: false });
  });
});
