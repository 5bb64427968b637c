import { beforeAll, describe, expect, it } from 'vitest';
import { readingInputOf, TRIAL_SETS } from '#shared/evaluate/trial.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { atMost } from './binomial.ts';
import { clipsOf } from './clip.ts';
import { type Outcome, outcomesOf } from './outcome.ts';
import { STUDY, studyOptions } from './options.ts';
import { planOf } from './plan.ts';
import { type Count, type SetTables, tablesOf } from './tables.ts';
import { wordsOf } from './words.ts';

/** Seven hundred checks like these are wrong once: a rate is refuted, not missed by bad luck. */
const REFUTED = 0.0015;

/** False where as many hits would be too rare at this rate. */
const notAbove = (rate: number, { hits, of }: Count): boolean =>
  hits === 0 || 1 - atMost(hits - 1, of, rate) > REFUTED;
const notBelow = (rate: number, { hits, of }: Count): boolean => atMost(hits, of, rate) > REFUTED;

/**
 * Early turns, degrees and reps, that are found at least so often. The method's table says 90 % of the
 * change of the reps filmed; a person's own turn, from which reps differ by 1.5°, is found less often.
 */
const FOUND = 0.8;
const NAMED = {
  bare: [],
  belt: [[16, 3]],
  'belt+prior': [
    [16, 1],
    [12, 3],
  ],
  'belt+thigh': [
    [8.8, 1],
    [6.2, 3],
  ],
} as const;

let outcomes: readonly Outcome[] = [];
beforeAll(() => {
  outcomes = [...outcomesOf({ ...STUDY, trials: 200, runs: 40 })];
}, 300_000);

describe.each(TRIAL_SETS)('200 trials read with %s', (set) => {
  let table: SetTables;
  beforeAll(() => {
    table = tablesOf(outcomes, set);
  });

  it('call no turn early in no more than 0.5 % as assumed', () => {
    expect(table.falseEarly.assumed.of).toBe(40);
    expect(notAbove(0.005, table.falseEarly.assumed)).toBe(true);
  });

  it('call an expected turn early in no more than 0.5 %', () => {
    expect(table.wrongWay.of).toBe(10);
    expect(notAbove(0.005, table.wrongWay)).toBe(true);
  });

  it('state an uncertainty that explains their errors', () => {
    // 110 trials, at least half of them measurable: ± 25 % are more than three standard errors
    expect(table.spread.assumed).toBeGreaterThan(0.75);
    expect(table.spread.assumed).toBeLessThan(1.25);
  });

  it('state probabilities that come true', () => {
    for (const { stated, true: count } of table.calibration.assumed) {
      if (count.of < 10) continue;
      expect(notAbove(Math.min(0.99, stated + 0.05), count)).toBe(true);
      expect(notBelow(Math.max(0.01, stated - 0.05), count)).toBe(true);
    }
  });

  it('find the turns that the method names', () => {
    for (const [size, reps] of NAMED[set]) {
      const larger = table.power.filter((each) => each.reps === reps && each.size >= size);
      expect(larger.length).toBeGreaterThan(0);
      for (const { found } of larger) expect(notBelow(FOUND, found)).toBe(true);
    }
  });

  it('tell from none the changes that pages name', () => {
    const { toldFromNone } = ACHIEVED[set === 'belt+prior' ? 'belt+assumption' : set];
    for (const [reps, named] of [
      [1, toldFromNone.one],
      [3, toldFromNone.three],
    ] as const) {
      const widths = table.power.flatMap((each) =>
        each.reps === reps ? (each.smallestChange ?? []) : [],
      );
      const mean = widths.reduce((sum, width) => sum + width / widths.length, 0);
      expect(Math.abs(mean / named - 1)).toBeLessThan(0.1);
    }
  });

  it('are told in words', () => {
    expect(wordsOf(table)).toContain('3 reps: 5° ');
  });
});

describe('a trial', () => {
  const clean = (index: number) => {
    const { plan, chance } = planOf(5, index);
    const marking = { errorPx: 0, pointerPx: 0, scale: 1, tracked: false };
    const bare = { ...plan, lines: 1080, reps: 3, marking } as const;
    return { plan: bare, ...clipsOf(bare, chance) };
  };

  it('is the same each time', () => {
    expect(clean(7)).toEqual(clean(7));
    expect(clean(7).reps).not.toEqual(clean(8).reps);
  });

  it('without marking error is read near its truth with both pointers', () => {
    for (let index = 0; index < 10; index += 1) {
      const { plan, side, reps } = clean(index);
      const input = readingInputOf({ id: 'clean', supportSide: side, reps }, 'belt+thigh');
      const { figures } = deriveReading(input, 40);
      // skin, reps and lengths still err: 1.6° and 5 % of the change
      const allowed = 3.5 * Math.hypot(1.8 * plan.artefact, 0.07 * plan.change);
      expect(Math.abs((figures?.d ?? NaN) - plan.change)).toBeLessThan(allowed);
    }
  });

  it('stands still, shifts weight, rises and lowers: the engine finds the parts', () => {
    for (let index = 0; index < 5; index += 1) {
      const { side, reps } = clean(index);
      const input = readingInputOf({ id: 'clean', supportSide: side, reps }, 'belt+thigh');
      for (const { phases, why } of deriveReading(input, 40).reps) {
        expect(why).toEqual([]);
        const quiet = phases?.byFrame.filter((phase) => phase === 'quiet').length ?? 0;
        expect(quiet).toBeGreaterThanOrEqual(6);
        expect(quiet).toBeLessThanOrEqual(8);
        expect(phases?.byFrame.filter((phase) => phase === 'lower').length).toBeGreaterThan(1);
      }
    }
  });
});

describe('the command', () => {
  it('takes whole numbers', () => {
    expect(studyOptions([])).toEqual(STUDY);
    expect(studyOptions(['--trials', '20', '--engine', '2', '--seed', '3'])).toMatchObject({
      trials: 20,
      engine: 2,
      seed: 3,
    });
  });

  it.each([
    [['--trials', '0']],
    [['--trials', 'many']],
    [['--engine', '9']],
    [['--size', '3']],
    [['--trials']],
  ])('says how it is called instead of guessing: %j', (args) => {
    expect(studyOptions(args)).toBeNull();
  });
});

it('adds up binomial chances', () => {
  expect(atMost(1, 2, 0.5)).toBeCloseTo(0.75, 12);
  expect(atMost(0, 40, 0.005)).toBeCloseTo(0.995 ** 40, 12);
  expect(atMost(40, 40, 0.3)).toBeCloseTo(1, 12);
});
