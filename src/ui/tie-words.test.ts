import { expect, it } from 'vitest';
import { milliseconds } from '#shared/timing/units.ts';
import { tieFaultWords } from './tie-words.ts';

it.each([
  [{ code: 'few-shared-events', have: [] }, /^nothing is seen in both; mark foot off/],
  [{ code: 'few-shared-events', have: ['top'] }, /^both clips show only reaching the top; mark/],
  [
    { code: 'events-out-of-order', events: ['clap', 'foot-off'] },
    /^the clap comes before foot off in one clip and not in the other/,
  ],
  [
    {
      code: 'durations-differ',
      events: ['foot-off', 'top'],
      own: milliseconds(1180),
      other: milliseconds(940),
      allowed: milliseconds(160),
    },
    /takes 1\.18 s, the front clip 0\.94 s; .* 0\.16 s at most, so these are different reps/,
  ],
  [{ code: 'not-a-pair' }, /on the same leg, are needed/],
] as const)('%o has its sentence', (fault, words) => {
  expect(tieFaultWords(fault)).toMatch(words);
});
