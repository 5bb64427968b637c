import { describe, expect, it } from 'vitest';
import { athleteBody, consentBody } from './athletes.ts';

const GOOD = { givenName: 'Nia', familyName: 'Brook', birthDate: '2014-08-01' };

/** What a person reads at each field. */
const faultsOf = (answer: ReturnType<typeof athleteBody.safeParse>) =>
  answer.error?.issues.map(({ path, message }) => [path.join('.'), message]);

describe('a form of an athlete', () => {
  it('says what to do where a day is empty or no day at all', () => {
    for (const birthDate of ['', '2014-02-30', 'spring'])
      expect(faultsOf(athleteBody.safeParse({ ...GOOD, birthDate }))).toContainEqual([
        'birthDate',
        'Choose a day.',
      ]);
  });

  it('says what to do where a length is not a number', () => {
    expect(faultsOf(athleteBody.safeParse({ ...GOOD, heightMm: Number.NaN }))).toEqual([
      ['heightMm', 'Write a number.'],
    ]);
  });

  it('keeps an unknown length unknown', () => {
    expect(athleteBody.parse({ ...GOOD, heightMm: null }).heightMm).toBeNull();
    expect(athleteBody.parse(GOOD).heightMm).toBeNull();
  });

  it('asks for the last day of a consent', () => {
    const answer = consentBody.safeParse({
      givenBy: 'athlete',
      purposes: ['assessment'],
      validUntil: '',
    });
    expect(answer.error?.issues.map(({ message }) => message)).toEqual(['Choose a day.']);
  });
});
