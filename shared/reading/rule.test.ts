import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_GATES, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { sidesDifference, retestChange } from './compare.ts';
import { figuresOf, freedom, systematicVariance } from './figures.ts';
import { disagreement, type Pooled, sharesOf } from './pool.ts';
import { decide as decideBy, decideWithoutRep as withoutRepBy } from './rule.ts';
import type { ReadingFigures } from './types.ts';

const pooled = (d: number, uR: number, pre = 0, uPre = 3): Pooled => ({
  shares: [1],
  d: degrees(d),
  uR: degrees(uR),
  nuR: 20,
  dPelvis: degrees(d),
  uPelvis: degrees(uR),
  dThigh: degrees(0),
  uThigh: degrees(uR),
  pre: degrees(pre),
  uPre: degrees(uPre),
  lambda: 1,
});

const figures = (d: number, uR: number, pre = 0, uPre = 3): ReadingFigures =>
  figuresOf(
    pooled(d, uR, pre, uPre),
    { variance: systematicVariance({ u: 1.6, q: 0.05 }, 1, STANDARD_GATES), q: 0.05 },
    { thighTurnsLittle: false, gates: STANDARD_GATES },
  );

const angle = degrees;
const decide = (of: ReadingFigures) => decideBy(of, STANDARD_RULES);
const decideWithoutRep = (highest: Parameters<typeof withoutRepBy>[0]) =>
  withoutRepBy(highest, STANDARD_RULES);

describe('the rule', () => {
  it.each([
    [2, 'not-measurable', figures(20, 7)],
    [3, 'early-turn-out', figures(12, 2)],
    [5, 'expected-turn-in', figures(-12, 2)],
    [6, 'holds-still', figures(0, 1)],
    [7, 'cannot-tell', figures(5, 4)],
  ] as const)('holds at line %d: %s', (line, code, values) => {
    expect(decide(values)).toMatchObject({ line, code, before60: false });
  });

  it('calls a turn that came before 60° early, if it does not come back', () => {
    expect(decide(figures(3, 2, 20, 2))).toMatchObject({
      line: 4,
      code: 'early-turn-out',
      before60: true,
      reason: { code: 'before-60-probable', limit: 0.975 },
    });
    expect(decide(figures(-3, 2, 20, 2)).line).not.toBe(4);
  });

  it('counts what would be believed if something else were true as far as that is likely', () => {
    const uncertain = { variance: 2.5, q: 0.05 };
    const assumed = { thighTurnsLittle: false, gates: STANDARD_GATES };
    const of = (d: number, chance: number | null) =>
      figuresOf(pooled(d, 1), uncertain, {
        ...assumed,
        alternative:
          chance === null
            ? undefined
            : { pooled: pooled(d, 1), uncertain: { variance: 10, q: 0.05 }, chance },
      });
    const wider = figuresOf(pooled(5, 1), { variance: 10, q: 0.05 }, assumed);
    expect(of(5, 0).pEarly).toBeCloseTo(of(5, null).pEarly, 12);
    expect(of(5, 1).pEarly).toBeCloseTo(wider.pEarly, 12);
    expect(of(5, 0.25).pEarly).toBeCloseTo(0.75 * of(5, null).pEarly + 0.25 * wider.pEarly, 12);
    expect(of(5, 0.25).pFlat).toBeCloseTo(0.75 * of(5, null).pFlat + 0.25 * wider.pFlat, 12);
    // what is shown beside the change stands for what is assumed
    expect(of(5, 0.25).uC).toBe(of(5, null).uC);
    expect(of(5, 0.5).mdt90).toBeGreaterThan(of(5, 0.1).mdt90);
    // a turn of that size stands 1.28 uncertainties above the line where a call begins
    const called = of(0, 0.25).mdt90 - 1.2816 * of(0, 0.25).uC0;
    expect(of(called, 0.25).pEarly).toBeCloseTo(0.95, 3);
  });

  it('asks for 95 in 100 exactly', () => {
    const base = figures(0, 2);
    expect(decide({ ...base, pEarly: 0.95 }).line).toBe(3);
    expect(decide({ ...base, pEarly: 0.9499, pFlat: 0 }).line).toBe(7);
    expect(decide({ ...base, pFlat: 0.8 }).line).toBe(6);
    expect(decide({ ...base, uC0: angle(6) }).line).not.toBe(2);
    expect(decide({ ...base, uC0: angle(6.001) }).line).toBe(2);
  });

  it('gives the figure that decided', () => {
    expect(decide(figures(20, 7)).reason).toMatchObject({ code: 'too-uncertain', limit: 6 });
  });
});

describe('without a usable rep', () => {
  it('says that the lift stops short where at least half of the reps stay under 85°', () => {
    expect(decideWithoutRep([angle(70), angle(95)]).code).toBe('lift-stops-short');
    expect(decideWithoutRep([angle(70), angle(95), angle(96)]).code).toBe('not-measurable');
    expect(decideWithoutRep([angle(85)]).code).toBe('not-measurable');
    expect(decideWithoutRep([angle(84.9)]).reason).toEqual({
      code: 'lift-under-85',
      reps: 1,
      of: 1,
      highest: 84.9,
    });
  });

  it('never takes an unknown lift for a low one', () => {
    expect(decideWithoutRep([null, null]).code).toBe('not-measurable');
    expect(decideWithoutRep([]).code).toBe('not-measurable');
  });
});

describe('the figures', () => {
  it('shrink towards nought by the weak prior', () => {
    const { d, m, uC, sM } = figures(10, 2);
    const g = 64 / (64 + uC ** 2);
    expect(m).toBeCloseTo(g * d, 12);
    expect(sM).toBeCloseTo(Math.sqrt(g) * uC, 12);
  });

  it('combine random and systematic parts as the specification says', () => {
    const { uC, uC0, uR, uS } = figures(10, 2);
    expect(systematicVariance({ u: 1.6, q: 0.05 }, 1, STANDARD_GATES)).toBeCloseTo(
      1.6 ** 2 + 1.5 ** 2,
      12,
    );
    expect(systematicVariance({ u: 1.6, q: 0.05 }, 3, STANDARD_GATES)).toBeCloseTo(
      1.6 ** 2 * 0.8 + 0.75,
      12,
    );
    expect(uC0 ** 2).toBeCloseTo(uR ** 2 + 1.6 ** 2 + 1.5 ** 2, 9);
    expect(uS ** 2).toBeCloseTo(1.6 ** 2 + 1.5 ** 2 + 0.25, 9);
    expect(uC ** 2).toBeCloseTo(uR ** 2 + uS ** 2, 9);
    expect(freedom(4, 20, 0)).toBeCloseTo(20, 12);
    expect(freedom(0, 20, 4)).toBeCloseTo(20, 12);
  });

  it('sum to one over early, between and in', () => {
    const { pEarly, pIn, pFlat, pNotBack } = figures(2, 2);
    expect(pEarly + pIn).toBeLessThan(1);
    expect(pNotBack).toBeGreaterThan(pEarly);
    expect(pFlat).toBeGreaterThan(0.5);
  });
});

describe('reps together', () => {
  const two = [angle(2), angle(2)];

  it('share by their uncertainty, none alone', () => {
    const [exact = NaN, coarse = NaN] = sharesOf([angle(1), angle(6)]);
    expect(exact + coarse).toBeCloseTo(1, 12);
    expect(exact / coarse).toBeCloseTo((36 + 2.25) / (1 + 2.25), 12);
  });

  it('are widened where they disagree and never narrowed', () => {
    expect(disagreement([angle(5), angle(5)], two, [0.5, 0.5])).toBe(1);
    const chi2 = (2 * 10 ** 2) / (4 + 4.5);
    expect(disagreement([angle(-5), angle(15)], two, [0.5, 0.5])).toBeCloseTo((3 + chi2) / 4, 12);
    expect(disagreement([angle(5)], [angle(2)], [1])).toBe(1);
  });
});

describe('two readings', () => {
  const reading = (d: number, uC: number) => ({ d: angle(d), uC: angle(uC) });

  it('differ between sides only beyond 1.96 of both errors', () => {
    const sure = sidesDifference(reading(10, 2), reading(0, 2));
    expect(sure).toMatchObject({ value: 10, shown: true });
    expect(sure?.halfWidth).toBeCloseTo(1.96 * Math.sqrt(8), 12);
    expect(sidesDifference(reading(5, 2), reading(0, 2))?.shown).toBe(false);
  });

  it('count a change from the earlier to the later', () => {
    expect(retestChange(reading(12, 2), reading(2, 2))).toMatchObject({ value: -10, shown: true });
    expect(retestChange(reading(12, 2), reading(NaN, 2))).toBeNull();
  });
});
