import { describe, expect, it } from 'vitest';
import { SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';
import { READING_CODES } from '#shared/reading/types.ts';
import { ALWAYS_STOP, SAFETY_ANSWERS } from './cautions.ts';
import type { Exercise } from './exercise.ts';
import { heldBackBy, isCovered, SET_BY_OTHERS, whyNotAllTheSame } from './held-back.ts';
import { EXERCISES, exerciseOf } from './library.ts';
import { type PlanBasis, STANDARD_RULES } from './rules.ts';
import { isMirrored, sideLines } from './sides.ts';
import { carrierOf, suggest } from './suggest.ts';

const all: readonly Exercise[] = EXERCISES;
const known = (id: string) => {
  const exercise = all.find((each) => each.id === id);
  if (!exercise) throw new Error(`no exercise ${id}`);
  return exercise;
};

describe('the library', () => {
  it('has each exercise once', () => {
    for (const key of ['id', 'name'] as const)
      expect(new Set(all.map((each) => each[key])).size).toBe(all.length);
  });

  it.each(all)('$name: every field says something', (exercise) => {
    const { setUp, cues, goOnWhen, goBackWhen, notWhen, dose, side } = exercise;
    for (const lines of [setUp, cues, goOnWhen, goBackWhen]) expect(lines).not.toHaveLength(0);
    const sentences = [
      ...[exercise.purpose, exercise.foot, exercise.easier, exercise.harder, side.because],
      ...[...setUp, ...cues, ...goOnWhen, ...goBackWhen, ...notWhen],
    ];
    for (const sentence of sentences) expect(sentence).toMatch(/^[A-Z].*[.]$/s);
    // either counted or held
    expect([dose.repetitions, dose.holdSeconds].filter((part) => part !== null)).toHaveLength(1);
    for (const part of [dose.sets, dose.repetitions ?? 1, dose.holdSeconds ?? 1, dose.daysPerWeek])
      expect(part).toBeGreaterThan(0);
    expect(dose.daysPerWeek).toBeLessThanOrEqual(7);
    expect(exercise.source).toBe('common practice, no source');
  });

  it.each(all)('$name: no word that could be a proper name', (exercise) => {
    const { setUp, cues, goOnWhen, goBackWhen, notWhen } = exercise;
    const text = [
      ...[exercise.name, exercise.purpose, exercise.foot, exercise.easier, exercise.harder],
      ...[...setUp, ...cues, ...goOnWhen, ...goBackWhen, ...notWhen],
    ];
    // inside of a sentence nothing is written large
    const large = text.flatMap(
      (sentence) => sentence.match(/(?<![.:] )(?<!^)\b\p{Lu}\p{L}*/gu) ?? [],
    );
    expect(large).toEqual([]);
  });

  it.each(all.filter(({ side }) => side.other === 'lifted' && side.support !== 'both'))(
    '$name: on one leg, so the answers about falls and dizziness matter',
    ({ id, notWith }) => {
      if (id === 'lying-knee-lift') return;
      expect(notWith).toContain('falls-or-poor-balance');
      expect(notWith).toContain('vertigo-or-dizziness');
    },
  );

  it('asks the questions of the safety check', () => {
    expect(SAFETY_ANSWERS).toEqual(SAFETY_QUESTIONS);
    expect(ALWAYS_STOP).toMatch(/^Stop on pain/);
  });
});

describe('sides', () => {
  it('puts the weight into the hand of the lifted side', () => {
    const { side } = known('staggered-hinge');
    expect(sideLines(side, 'left')).toEqual([
      'Stand on the left leg.',
      'The toes of the right foot rest behind.',
      'Weight in the right hand.',
    ]);
    expect(sideLines(side, 'right')).toEqual([
      'Stand on the right leg.',
      'The toes of the left foot rest behind.',
      'Weight in the left hand.',
    ]);
  });

  it('names the knee that is down, and hands on the support', () => {
    expect(sideLines(known('half-kneeling-shift').side, 'right')).toEqual([
      'Stand on the right leg.',
      'The left knee is down.',
      'The left hand on the support.',
    ]);
    expect(sideLines(known('wall-march').side, 'left')).toContain('Both hands on the support.');
    expect(sideLines(known('march-drill').side, 'left')).toEqual([
      'Begin on the left leg.',
      'Both legs take turns.',
    ]);
  });

  it('mirrors drawings for the left leg alone', () => {
    expect([isMirrored('left'), isMirrored('right')]).toEqual([true, false]);
  });
});

describe('what the standard rules suggest', () => {
  const reading = (
    code: (typeof READING_CODES)[number],
    carrier: 'pelvis' | 'thigh' | null = null,
  ): PlanBasis => ({ kind: 'reading', code, carrier });
  const call = (seen: 'early' | 'on-time' | 'still' | 'unsure'): PlanBasis => ({
    kind: 'call',
    seen,
  });

  it.each([
    [reading('early-turn-out'), 'early', 'foot-tripod supported-hinge'],
    [reading('early-turn-out', 'pelvis'), 'early-by-the-pelvis', 'foot-tripod supported-hinge'],
    [reading('early-turn-out', 'thigh'), 'early-by-the-thigh', 'foot-tripod supported-hinge'],
    [reading('holds-still'), 'still', 'foot-tripod half-kneeling-shift'],
    [reading('holds-still', 'pelvis'), 'still', 'foot-tripod half-kneeling-shift'],
    [reading('expected-turn-in'), 'on-time', 'single-leg-hinge hold-to-90'],
    [reading('lift-stops-short'), 'stops-short', 'lying-knee-lift'],
    [call('early'), 'early', 'foot-tripod supported-hinge'],
    [call('still'), 'still', 'foot-tripod half-kneeling-shift'],
    [call('on-time'), 'on-time', 'single-leg-hinge hold-to-90'],
  ])('%o leads to the rule %s', (basis, rule, first) => {
    const suggestion = suggest(basis, STANDARD_RULES);
    if (suggestion.kind !== 'plan') throw new Error(suggestion.because);
    expect(suggestion.rule).toBe(rule);
    const stage = suggestion.exercises.filter((each) => each.stage === 1);
    expect(stage.map(({ exercise }) => exercise).join(' ')).toBe(first);
  });

  it.each([reading('cannot-tell'), reading('not-measurable'), call('unsure')])(
    '%o leads to a retest, not to a plan',
    (basis) => {
      expect(suggest(basis, STANDARD_RULES).kind).toBe('retest');
    },
  );

  it('answers to every reading that there is', () => {
    for (const code of READING_CODES)
      expect(suggest(reading(code), STANDARD_RULES).because).toMatch(/[.]$/);
  });

  it('an early turn begins with a supported hinge and comes to one leg last', () => {
    for (const rule of STANDARD_RULES.filter(({ when }) =>
      when.readings.includes('early-turn-out'),
    )) {
      expect(rule.stages[0]).toContain('supported-hinge');
      const oneLeg = all.filter(({ side }) => side.other === 'lifted').map(({ id }) => id);
      const early = rule.stages.slice(0, -1).flat();
      expect(early.filter((id) => oneLeg.includes(id))).toEqual([]);
    }
  });

  it('a practice without a rule for it is told so', () => {
    expect(suggest(reading('holds-still'), [])).toEqual({
      kind: 'retest',
      because: 'No rule of this practice answers to this finding.',
    });
  });
});

describe('the part that carries a turn', () => {
  const part = (value: number, u = 1) => ({ value, u });
  it.each([
    [null, null],
    [{ pelvis: part(6), thigh: part(1) }, 'pelvis'],
    [{ pelvis: part(1), thigh: part(6) }, 'thigh'],
    // 1.96 · √2 = 2.77
    [{ pelvis: part(4.7), thigh: part(2) }, null],
    [{ pelvis: part(4.8), thigh: part(2) }, 'pelvis'],
    [{ pelvis: part(NaN), thigh: part(2) }, null],
  ] as const)('of %o is %s', (parts, carrier) => {
    expect(carrierOf(parts)).toBe(carrier);
  });
});

describe('what holds an exercise back', () => {
  const no = Object.fromEntries(SAFETY_ANSWERS.map((question) => [question, false]));
  it('is a yes that matters to it', () => {
    const hinge = known('supported-hinge');
    expect(heldBackBy(hinge, no)).toEqual([]);
    expect(heldBackBy(hinge, { ...no, 'hip-replacement-or-limits': true })).toEqual([
      'hip-replacement-or-limits',
    ]);
    expect(heldBackBy(hinge, { ...no, 'vertigo-or-dizziness': true })).toEqual([]);
  });

  it('is what was not answered too', () => {
    expect(heldBackBy(known('supported-hinge'), null)).toEqual(['hip-replacement-or-limits']);
    expect(heldBackBy(known('foot-tripod'), null)).toEqual([]);
  });

  it('is passed over by a reason where no limit was set by others, and nothing is unanswered', () => {
    const yes = (...questions: (typeof SAFETY_ANSWERS)[number][]) => ({
      ...no,
      ...Object.fromEntries(questions.map((question) => [question, true])),
    });
    const state = (answers: object | null, clearedBy: string | null = null) => ({
      answers,
      clearedBy,
    });
    expect(whyNotAllTheSame(['pain-today'], state(yes('pain-today')))).toBeNull();
    expect(whyNotAllTheSame(['pain-today'], state(null))).toBe('ask-first');
    expect(whyNotAllTheSame(['pain-today'], state({}))).toBe('ask-first');
    for (const limit of SET_BY_OTHERS) {
      expect(whyNotAllTheSame([limit], state(yes(limit)))).toBe('needs-clearance');
      expect(whyNotAllTheSame([limit], state(yes(limit), 'Dr Alder'))).toBeNull();
    }
  });

  it('is covered by a decision as long as nothing else stands against it', () => {
    expect(isCovered([], null)).toBe(true);
    expect(isCovered(['pain-today'], null)).toBe(false);
    expect(isCovered(['pain-today'], ['pain-today', 'nerve-symptoms'])).toBe(true);
    expect(isCovered(['pain-today', 'nerve-symptoms'], ['pain-today'])).toBe(false);
  });

  it('is looked up by the id of an exercise that there is', () => {
    expect(exerciseOf('step-up').name).toBe('Step-up');
    expect(() => exerciseOf('cartwheel' as 'step-up')).toThrow('There is no exercise cartwheel.');
  });
});
