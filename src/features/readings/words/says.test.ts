import { describe, expect, it } from 'vitest';
import type { Call } from '#shared/contracts/calls.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';
import { agreementWords } from './agreement-words.ts';
import { howSure, inHundred } from './probability-words.ts';
import { repName } from './rep-names.ts';

describe('how sure', () => {
  it.each([
    [0.999, 'Almost certain'],
    [0.99, 'Almost certain'],
    [0.9899, 'Very likely'],
    [0.95, 'Very likely'],
    [0.9499, 'Likely'],
    [0.8, 'Likely'],
    [0.51, 'More likely than not'],
    [0.5, 'Not likely'],
    [0, 'Not likely'],
  ])('%f is %s', (p, words) => {
    expect(howSure(p)).toBe(words);
  });

  it.each([
    [1, 'more than 99.9'],
    [0.9989, '99.8'],
    [0.95, '95'],
    // what misses a limit never looks as if it met it
    [0.9499, '94'],
    [0.7999, '79'],
    [0.012, '1'],
    [0, 'less than 1'],
  ])('%f is %s in 100', (p, words) => {
    expect(inHundred(p)).toBe(words);
  });
});

describe('eye and measurement', () => {
  it.each<[Call['seen'], ReadingCode, string]>([
    ['early', 'early-turn-out', 'Eye and measurement agree.'],
    ['on-time', 'expected-turn-in', 'Eye and measurement agree.'],
    ['still', 'holds-still', 'Eye and measurement agree.'],
    ['early', 'holds-still', 'Eye and measurement differ.'],
    ['still', 'early-turn-out', 'Eye and measurement differ.'],
    ['unsure', 'early-turn-out', 'The eye was unsure.'],
    ['early', 'cannot-tell', 'The measurement does not say.'],
    ['unsure', 'not-measurable', 'Neither says.'],
  ])('%s beside %s: %s', (seen, code, head) => {
    expect(agreementWords(seen, code).head).toBe(head);
  });
});

describe('what a rep is called', () => {
  const rep = (id: string, number: number, clipId: string) => ({
    id,
    number,
    clipId,
    clipName: `${clipId}.MOV`,
    excluded: null,
    liftFrom: null,
    tieFault: null,
  });

  it('is its number, with the clip where there are several', () => {
    expect(repName({ reps: [rep('a', 1, 'x'), rep('b', 2, 'x')] }, 'b')).toBe('rep 2');
    expect(repName({ reps: [rep('a', 1, 'x'), rep('b', 1, 'y')] }, 'b')).toBe('rep 1 of y.MOV');
    expect(repName({ reps: [] }, 'b')).toBe('a rep that was deleted');
  });
});
