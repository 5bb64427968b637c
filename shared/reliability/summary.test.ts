import { describe, expect, it } from 'vitest';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { MarkedTwice } from './marked-twice.ts';
import type { Pair } from './agreement.ts';
import {
  answerAgreementOf,
  type FinishedMarks,
  markRepeatOf,
  valueAgreementOf,
} from './summary.ts';

const twice = (landmark: LandmarkId, frame: number, du: number, dv: number): MarkedTwice => ({
  frame,
  landmark,
  firstBy: 'coach',
  first: { u: 100, v: 200 },
  second: { u: 100 + du, v: 200 + dv },
  coarseness: 1,
});

const finished: FinishedMarks = {
  repId: 'a',
  mmPerPx: 2,
  marks: [twice('kneecap', 1, 3, 1), twice('kneecap', 2, -1, 1), twice('belt-tip', 1, 6, 0)],
};

describe('how well marks repeat', () => {
  it('is √(Σd²/2n) of every coordinate of the anatomical landmarks, px and mm', () => {
    // differences 3, 1, −1, 1: √(12/8)
    const repeat = markRepeatOf([finished]);
    expect(repeat.px).toBeCloseTo(Math.sqrt(1.5), 12);
    expect(repeat.mm).toBeCloseTo(2 * Math.sqrt(1.5), 12);
    expect(repeat).toMatchObject({ frames: 2, marks: 2 });
  });

  it('names every landmark, the worst first', () => {
    const [worst, next] = markRepeatOf([finished]).landmarks;
    expect(worst).toMatchObject({ landmark: 'belt-tip', marks: 1 });
    expect(worst?.px).toBeCloseTo(3, 12);
    expect(worst?.mm).toBeCloseTo(6, 12);
    expect(next).toMatchObject({ landmark: 'kneecap', marks: 2 });
  });

  it('has no millimetres without a scale, and counts frames of different reps apart', () => {
    const other = { ...finished, repId: 'b', mmPerPx: null };
    expect(markRepeatOf([other])).toMatchObject({ mm: null, frames: 2 });
    expect(markRepeatOf([other]).landmarks[0]?.mm).toBeNull();
    expect(markRepeatOf([finished, other])).toMatchObject({ frames: 4, marks: 4 });
  });

  it('is unknown of nothing', () => {
    expect(markRepeatOf([])).toEqual({ frames: 0, marks: 0, px: null, mm: null, landmarks: [] });
    const broken = { ...finished, marks: [twice('kneecap', 1, NaN, 0)] };
    expect(markRepeatOf([broken])).toMatchObject({ px: null, landmarks: [] });
  });
});

describe('how well a value repeats', () => {
  const pairs: readonly Pair[] = [
    [10, 11],
    [20, 19],
    [30, 32],
    [40, 40],
    [50, 49],
  ];

  it('is unknown of fewer than five pairs, which are shown all the same', () => {
    const few = valueAgreementOf(pairs.slice(0, 4));
    expect(few).toMatchObject({ pairs: 4, why: 'too-few', sem: null, random: null, limits: null });
    expect(few.points[0]).toEqual({ mean: 10.5, difference: -1 });
  });

  it('comes with its smallest detectable change, 1.96·√2 standard errors', () => {
    const agreement = valueAgreementOf(pairs);
    expect(agreement.why).toBeNull();
    // differences −1, 1, −2, 0, 1: Σd² = 7
    expect(agreement.typical).toBeCloseTo(Math.sqrt(0.7), 12);
    expect(agreement.mdc95).toBeCloseTo(1.96 * Math.SQRT2 * (agreement.sem ?? NaN), 12);
    expect(agreement.limits?.bias).toBeCloseTo(-0.2, 12);
    expect(agreement.random?.value).toBeGreaterThan(0.99);
  });

  it('has no ICC where every value is alike', () => {
    const alike = valueAgreementOf(pairs.map(() => [7, 7] as const));
    expect(alike).toMatchObject({ pairs: 5, why: 'all-alike' });
  });

  it('is unknown of values that are no numbers', () => {
    expect(valueAgreementOf(pairs.map(() => [NaN, 1] as const)).why).toBe('too-few');
  });
});

describe('how far two judges agree', () => {
  const answers = ['early', 'in'] as const;
  type Answer = (typeof answers)[number];
  const pair = (a: Answer, b: Answer) => [a, b] as const;

  it('is Cohen’s kappa from five pairs on', () => {
    // agreed 4/6; by chance (3·3 + 3·3)/36 = 1/2: kappa 1/3
    const pairs = [
      pair('early', 'early'),
      pair('early', 'early'),
      pair('early', 'in'),
      pair('in', 'early'),
      pair('in', 'in'),
      pair('in', 'in'),
    ];
    const agreement = answerAgreementOf(answers, pairs);
    expect(agreement).toMatchObject({ pairs: 6, same: 4, why: null });
    expect(agreement.kappa).toBeCloseTo(1 / 3, 12);
    expect(answerAgreementOf(answers, pairs.slice(0, 4))).toEqual({
      pairs: 4,
      same: 2,
      kappa: null,
      why: 'too-few',
    });
  });

  it('is unknown where both always say the same one thing', () => {
    const pairs = Array.from({ length: 5 }, () => pair('in', 'in'));
    expect(answerAgreementOf(answers, pairs)).toMatchObject({ kappa: null, why: 'all-alike' });
  });
});
