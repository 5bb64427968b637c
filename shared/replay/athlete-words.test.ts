import { describe, expect, it } from 'vitest';
import { READING_LABELS, type ReadingCode } from '#shared/contracts/readings.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { callWords, howSureWords, readingWords } from './athlete-words.ts';
import { liftReadout, turnReadout } from './readout.ts';

const reading = (
  code: ReadingCode,
  change: Partial<NonNullable<PublicReplay['reading']>> = {},
): NonNullable<PublicReplay['reading']> => ({
  code,
  label: READING_LABELS[code],
  change: 6.8,
  plusMinus: 3.6,
  probability: 0.97,
  repsUsed: 3,
  repsAgreeing: 2,
  ...change,
});

const TITLES = {
  'early-turn-out': 'Your left hip turns out early',
  'expected-turn-in': 'Your left hip turns in on time',
  'holds-still': 'Your left hip holds still',
  'cannot-tell': 'We can’t tell yet',
  'lift-stops-short': 'The lift stopped before level',
  'not-measurable': 'Not measured this time',
} satisfies Record<ReadingCode, string>;

describe('a reading in the athlete’s words', () => {
  it.each(Object.entries(TITLES))('%s: %s', (code, title) => {
    const words = readingWords(reading(code as ReadingCode), 'left', STANDARD_GATES);
    expect(words.title).toBe(title);
    expect(words.text[0]).toBe('You stood on the left leg and lifted the right knee.');
    // no figure and no term of the trade
    expect(words.text.join(' ')).not.toMatch(/°|rotation|pelvis|femur|external|internal/);
  });

  it('counts the reps that went the same way', () => {
    expect(readingWords(reading('early-turn-out'), 'left', STANDARD_GATES).text[1]).toBe(
      'Two times of three, the hip you stand on turned outwards before the lifted thigh was level.',
    );
    expect(
      readingWords(reading('early-turn-out', { repsUsed: 1 }), 'left', STANDARD_GATES).text[1],
    ).toBe('The hip you stand on turned outwards before the lifted thigh was level.');
  });

  it('says where it began before 60°', () => {
    const words = readingWords(
      reading('early-turn-out', { label: 'Turns out early, before 60°' }),
      'left',
      STANDARD_GATES,
    );
    expect(words.text[1]).toMatch(/two thirds of the way up/);
  });

  it('never calls holding still a pass, and never sounds surer than it is', () => {
    expect(readingWords(reading('holds-still'), 'left', STANDARD_GATES).text[1]).toMatch(
      /A turn inwards is expected there and was not seen/,
    );
    expect(howSureWords(0.998)).toMatch(/almost certain/);
    expect(howSureWords(0.96)).toMatch(/very sure/);
    expect(howSureWords(0.85)).toBe('This is likely, not certain.');
    expect(howSureWords(null)).toBe('');
    expect(readingWords(reading('cannot-tell'), 'left', STANDARD_GATES).sure).toBe('');
  });
});

describe('a call in the athlete’s words', () => {
  it.each(['early', 'on-time', 'still', 'unsure'] as const)('%s names who saw it', (seen) => {
    expect(callWords(seen, 'right', 'Maren Okafor', STANDARD_GATES).text.join(' ')).toContain(
      'Maren Okafor looked',
    );
  });
});

describe('the line under the film', () => {
  it.each([
    [null, ''],
    [0.3, '0°'],
    [10.6, '11° out'],
    [-3.2, '3° in'],
  ])('turn %s: %s', (turn, words) => {
    expect(turnReadout({ turn, turnPlusMinus: null })).toBe(words);
  });
  it('does not give a lift that a front view cannot see', () => {
    const of = (lift: number | null, liftPlusMinus: number | null = null) => ({
      lift,
      liftPlusMinus,
    });
    expect(liftReadout(of(12, 3), true)).toBe('under 20°');
    expect(liftReadout(of(12), false)).toBe('12°');
    expect(liftReadout(of(null), true)).toBe('');
    // never surer than it is: rounded up
    expect(liftReadout(of(90.2, 2.1), true)).toBe('90° ±\u00a03°');
    expect(turnReadout({ turn: -4.4, turnPlusMinus: 5 })).toBe('4° in ±\u00a05°');
    expect(turnReadout({ turn: 0.2, turnPlusMinus: 4.6 })).toBe('0° ±\u00a05°');
  });
});
