import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeVariance, turnCovariance } from '#shared/course/turn-process.ts';
import { MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { protocolFaults } from '#shared/protocol/bounds.ts';
import { type ReadingRules, STANDARD_PROTOCOL, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { canonicalInputs } from './canonical-inputs.ts';
import { deriveReading } from './derive.ts';
import { ENGINES } from './engine.ts';
import { priorVariance, systematicVariance } from './figures.ts';
import type { ReadingInput } from './types.ts';

const RUNS = 200;

/** Outward by 0.3° for each degree of lift over 50°: a change that grows with the window. */
const steady = (lift: number): number => 0.3 * Math.max(0, lift - 50);

const input = (rules: Partial<ReadingRules>, over: Partial<ReadingInput> = {}): ReadingInput => ({
  engine: 2,
  rules: { ...STANDARD_RULES, ...rules },
  supportSide: 'left',
  set: 'belt+thigh',
  thighTurnsLittle: false,
  markError: ASSUMED_MARK_ERROR,
  ownSystematic: null,
  reps: [madeRep('left', steady, { id: 'a' })],
  ...over,
});

const gates = (from: number, to: number): Partial<ReadingRules> => ({
  gateFrom: degrees(from),
  gateTo: degrees(to),
  liftShort: degrees(to - 5),
});

describe('the standard rules', () => {
  it('are the same input as none: what was read before keeps its hash', () => {
    const { rules, ...rest } = input({});
    expect(canonicalInputs(input({}))).not.toContain('rules');
    expect(canonicalInputs({ rules: { ...rules }, ...rest })).toBe(canonicalInputs(input({})));
  });

  it('leave every other rule in the hash, whatever stands beside it', () => {
    const hashes = (Object.keys(STANDARD_RULES) as (keyof ReadingRules)[]).map(
      (key) => deriveReading(input({ [key]: STANDARD_RULES[key] + 0.001 }), 2).inputHash,
    );
    expect(new Set(hashes).size).toBe(Object.keys(STANDARD_RULES).length);
  });

  it('widen nothing: over 30° the curve’s change has the variance 1, exactly', () => {
    expect(changeVariance(30)).toBe(1);
    expect(priorVariance({ from: degrees(50), to: degrees(80) })).toBe(64);
  });
});

describe('shifted gates', () => {
  it.each(ENGINES)('engine %d reads the change between them', (engine) => {
    for (const [from, to] of [
      [60, 90],
      [50, 80],
      [55, 95],
      [65, 90],
    ] as const) {
      const { figures } = deriveReading(input(gates(from, to), { engine }), RUNS);
      const truth = steady(to) - steady(from);
      expect(Math.abs((figures?.d ?? NaN) - truth)).toBeLessThan(1.5);
    }
  });

  it('close the band at the lower gate and open it at the upper one to d ± 1.96 u', () => {
    const { course, figures } = deriveReading(input(gates(50, 80)), RUNS);
    const at = (lift: number) => course.find((point) => Number(point.lift) === lift);
    expect((at(50)?.high ?? NaN) - (at(50)?.low ?? NaN)).toBeCloseTo(0, 9);
    const half = ((at(80)?.high ?? NaN) - (at(80)?.low ?? NaN)) / 2;
    expect(half).toBeCloseTo(1.96 * (figures?.uC ?? NaN), 9);
  });

  it('say that they were not studied, and lowered limits that more is wrong', () => {
    const codes = (rules: Partial<ReadingRules>) =>
      deriveReading(input(rules), 2).warnings.map(({ warning }) => warning.code);
    expect(codes({})).toEqual([]);
    expect(codes(gates(50, 80))).toEqual(['gates-not-studied']);
    expect(codes({ flat: 0.7 })).toEqual(['limit-lowered']);
    expect(codes({ early: 0.99 })).toEqual([]);
  });

  it('ask for frames near themselves', () => {
    const made = madeRep('left', steady, { id: 'a' });
    const rep = {
      ...made,
      frames: made.frames.filter((_, i) => {
        const lift = MADE_LIFTS[i] ?? 0;
        return lift < 66 || lift > 98;
      }),
    };
    const { reps } = deriveReading(input(gates(50, 80), { reps: [rep] }), 2);
    expect(reps[0]?.why).toContainEqual(
      expect.objectContaining({ code: 'few-near-90', from: 68, to: 96 }),
    );
  });

  it('never make the systematic error smaller than the studied one', () => {
    const belt = { u: 2.4, q: 0.08 };
    const of = (from: number, to: number) =>
      systematicVariance(belt, 3, { from: degrees(from), to: degrees(to) });
    expect(of(65, 85)).toBe(of(60, 90));
    expect(of(50, 95)).toBeGreaterThan(of(60, 90));
  });

  it('give a finite answer wherever the bounds allow them', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 45, max: 80 }),
        fc.integer({ min: 20, max: 45 }),
        fc.constantFrom(...ENGINES),
        (from, width, engine) => {
          const rules = gates(from, from + width);
          if (protocolFaults({ ...STANDARD_PROTOCOL, ...rules }).length > 0) return;
          const { figures } = deriveReading(input(rules, { engine, set: 'belt' }), 50);
          if (!figures) return;
          for (const value of [figures.d, figures.uC, figures.pEarly, figures.mdt90])
            expect(Number.isFinite(value)).toBe(true);
          expect(figures.uC).toBeGreaterThan(0);
        },
      ),
      { seed: 11, numRuns: 40 },
    );
  });
});

describe('the variance of a change', () => {
  it('depends on the width of the window alone', () => {
    for (const [a, b] of [
      [45, 75],
      [60, 85],
      [50, 95],
    ] as const)
      expect(turnCovariance(a, a) + turnCovariance(b, b) - 2 * turnCovariance(a, b)).toBeCloseTo(
        changeVariance(b - a),
        9,
      );
  });
});
