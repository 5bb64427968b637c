import { expect, it } from 'vitest';
import { otherId, visitId } from '#tests/support/records.ts';
import { type MeasuredSide, suggestions } from './suggestions.ts';

const side = (visit: string, which: 'left' | 'right', day: string): MeasuredSide => ({
  end: { visitId: visit, side: which, repId: null },
  day,
  label: 'Turns out early',
});

it('offers the change since the visit before, both sides of a visit, and two reps', () => {
  const found = suggestions([
    side(otherId, 'left', '2020-04-14'),
    side(otherId, 'right', '2020-04-14'),
    side(visitId, 'right', '2020-03-03'),
  ]);
  expect(found.map(({ words }) => words)).toEqual([
    'Standing on the right: 3 March 2020, then 14 April 2020',
    'Both sides on 14 April 2020: right, then left',
    'Two reps of 14 April 2020, standing on the left',
  ]);
  expect(found[0]).toMatchObject({ first: { visitId }, second: { visitId: otherId } });
  expect(suggestions([])).toEqual([]);
});
