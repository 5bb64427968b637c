import { describe, expect, it } from 'vitest';
import { otherId, visitId } from '#tests/support/records.ts';
import { repId } from '#tests/support/records.ts';
import { aReading, resultOf } from '#tests/support/side-page.ts';
import { chosenRep, endOf, endText, playableReps, relationOf } from './ends.ts';
import { momentText } from './films/moment-slider.tsx';
import { steppedTo } from '#src/ui/stepped-to.ts';
import { degrees } from '#shared/geometry/units.ts';
import { frameIndex } from '#shared/timing/units.ts';

const side = { visitId, side: 'right', repId: null } as const;

describe('an end in the address', () => {
  it('is read as it was written', () => {
    for (const end of [side, { ...side, repId: repId(2) }])
      expect(endOf(endText(end))).toEqual(end);
  });
  it.each([null, '', 'x', `${visitId}.middle`, `nothing.right`, `${visitId}.right.rep`])(
    'is none where it is %s',
    (text) => {
      expect(endOf(text)).toBeNull();
    },
  );
});

it('knows what two ends are to each other', () => {
  expect(relationOf(side, { ...side, repId: repId(1) })).toBe('reps');
  expect(relationOf(side, { ...side, side: 'left' })).toBe('sides');
  expect(relationOf(side, { ...side, visitId: otherId })).toBe('visits');
  expect(relationOf(side, { visitId: otherId, side: 'left', repId: null })).toBe('both');
});

it('plays the rep that was asked for, otherwise the one that says most', () => {
  const reps = playableReps(aReading(resultOf('g02_early_mid_3rep')));
  expect(reps).toHaveLength(3);
  expect(chosenRep(reps, repId(2))?.id).toBe(repId(2));
  const shares = reps.map(({ result }) => result.fit?.share ?? 0);
  expect(chosenRep(reps, null)?.result.fit?.share).toBe(Math.max(...shares));
  expect(chosenRep([], null)).toBeNull();
});

it('steps by one and by ten and stays inside', () => {
  expect(
    ['ArrowRight', 'PageUp', 'Home', 'End', 'ArrowLeft', 'PageDown', 'x'].map((key) =>
      steppedTo(key, 5, 12),
    ),
  ).toEqual([6, 11, 0, 11, 4, 0, null]);
});

it('says which lift and which way', () => {
  const at = (lift: number) => ({ frame: frameIndex(1), lift: degrees(lift) });
  expect(momentText({ part: 'fall', first: at(61), second: at(61.6) })).toBe('lift 61°, lowering');
});
