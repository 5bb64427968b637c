import { beforeAll, describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { goldenFiles } from './golden-files.ts';
import { madeRep } from './made-rep.ts';
import { readingInputOf, TRIAL_SETS, trialOf, type TrialSet } from './trial.ts';

// The golden trials were made by other code than the study's people: engine 3 was not made for them.
const files = goldenFiles();

interface Read {
  readonly set: TrialSet;
  readonly truth: number;
  readonly verdict: string;
  readonly first: ReadingResult;
  readonly third: ReadingResult;
}

let all: readonly Read[] = [];
beforeAll(() => {
  all = files.flatMap((file) =>
    TRIAL_SETS.map((set): Read => {
      const read = (engine: 1 | 3): ReadingResult =>
        deriveReading(readingInputOf(trialOf(file), set, engine), 100);
      const { dR_60_90: truth, verdict_class: verdict } = file.truth;
      return { set, truth, verdict, first: read(1), third: read(3) };
    }),
  );
}, 120_000);

const rootMeanSquare = (errors: readonly number[]): number =>
  Math.sqrt(errors.reduce((sum, error) => sum + error ** 2 / errors.length, 0));

describe.each(['bare', 'belt'] as const)('engine 3 on the golden trials with %s', (set) => {
  const measured = () =>
    all.flatMap(({ set: own, truth, first, third }) =>
      own === set && first.figures && third.figures
        ? [{ truth, first: first.figures, third: third.figures }]
        : [],
    );

  it('comes nearer to the truth than engine 1', () => {
    const read = measured();
    expect(read.length).toBe(12);
    const before = rootMeanSquare(read.map(({ first, truth }) => first.d - truth));
    const after = rootMeanSquare(read.map(({ third, truth }) => third.d - truth));
    expect(after).toBeLessThan(before);
  });

  it('errs by no more than it states', () => {
    for (const { third, truth } of measured())
      expect(Math.abs(third.d - truth)).toBeLessThan(3 * third.uC);
  });

  it('calls no turn early that is none', () => {
    for (const { third, verdict, set: own } of all)
      if (own === set && verdict !== 'early_er') expect(third.code).not.toBe('early-turn-out');
  });

  it('keeps the parts’ sum, the reps’ own fits and the band’s meaning', () => {
    for (const { first, third, set: own } of all) {
      if (own !== set) continue;
      expect(third.engine).toBe(3);
      expect(third.reps.map(({ used, fit }) => [used, fit?.beta])).toEqual(
        first.reps.map(({ used, fit }) => [used, fit?.beta]),
      );
      if (!third.figures) continue;
      const { d, pelvis, thigh, uC, uC0, uR, mdt90 } = third.figures;
      expect(pelvis.value + thigh.value).toBeCloseTo(d, 9);
      expect(uC0).toBeGreaterThan(uR);
      expect(uC).toBeGreaterThanOrEqual(uC0);
      expect(mdt90).toBeGreaterThan(1 + 1.28 * uC0);
      const at = (lift: number) => third.course.find((point) => point.lift === lift);
      const [from, to] = [at(60), at(90)];
      if (!from || !to) continue;
      expect(to.turn - from.turn).toBeCloseTo(d, 6);
      expect(to.high - to.turn).toBeCloseTo(1.96 * uC, 6);
      expect(from.high).toBeCloseTo(from.turn, 6);
    }
  });
});

it('reads as engine 1 does with both pointers', () => {
  for (const { set, first, third } of all) {
    if (set !== 'belt+thigh') continue;
    expect(third.code).toBe(first.code);
    if (!first.figures || !third.figures) continue;
    expect(Math.abs(third.figures.d - first.figures.d)).toBeLessThan(0.1);
  }
});

describe('engine 3', () => {
  const turn = (lift: number): number => 0.4 * Math.max(0, lift - 60);
  const rep = madeRep('left', turn, { thighShare: 0.4 });
  const input = readingInputOf({ id: 'made', supportSide: 'left', reps: [rep] }, 'belt', 3);

  it('gives the same answer each time and names itself', () => {
    expect(deriveReading(input, 20)).toEqual(deriveReading(input, 20));
    expect(deriveReading(input, 20)).toMatchObject({ engine: 3, code: 'early-turn-out' });
  });

  it('takes a practice’s own repeated lifts for the size of slips, and then only that one', () => {
    const own = (u: number) =>
      deriveReading({ ...input, ownSystematic: { set: 'belt', u: degrees(u), lifts: 10 } }, 20)
        .figures;
    const assumed = deriveReading(input, 20).figures;
    expect(own(4.8)?.uC0).toBeGreaterThan(assumed?.uC0 ?? NaN);
    expect(own(1.2)?.uC0).toBeLessThan(assumed?.uC0 ?? NaN);
    // a size that is known leaves no second one to fear
    expect(own(2.41)?.mdt90).toBeLessThan(assumed?.mdt90 ?? NaN);
  });
});
