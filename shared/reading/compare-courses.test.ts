import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { trialOf } from '#shared/evaluate/trial.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { gatesOf, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { courseDifference, repCourse, sideCourse } from './compare-courses.ts';
import { deriveReading } from './derive.ts';
import type { ReadingResult } from './types.ts';

const read = (name: string): ReadingResult => {
  const trial = trialOf(JSON.parse(readFileSync(`tests/fixtures/golden/${name}.json`, 'utf8')));
  return deriveReading({
    engine: 1,
    supportSide: trial.supportSide,
    set: null,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: trial.reps,
  });
};

const early = read('g01_early_big_thigh');
const inwards = read('g04_expected_big');
const gates = gatesOf(STANDARD_RULES);

describe('two courses', () => {
  it('that are the same differ by nothing that can be shown, each with an uncertainty', () => {
    const course = sideCourse(early);
    for (const each of Object.values(courseDifference(course, course) ?? {})) {
      expect(each).toMatchObject({ value: 0, shown: false });
      expect(each?.halfWidth).toBeGreaterThan(0);
    }
  });

  it('that turn opposite ways differ in their change beyond the error, second less first', () => {
    const there = courseDifference(sideCourse(early), sideCourse(inwards));
    const back = courseDifference(sideCourse(inwards), sideCourse(early));
    const change = (inwards.figures?.d ?? 0) - (early.figures?.d ?? 0);
    expect(there?.change).toMatchObject({ shown: true });
    expect(there?.change?.value).toBeCloseTo(change, 9);
    expect(back?.change?.value).toBeCloseTo(-change, 9);
    expect(there?.change?.halfWidth).toBeCloseTo(
      1.96 * Math.hypot(early.figures?.uC ?? 0, inwards.figures?.uC ?? 0),
      9,
    );
    // what they differ by at the gates adds up to that of the change
    const rise = (there?.atTo?.value ?? Number.NaN) - (there?.atFrom?.value ?? Number.NaN);
    expect(rise).toBeCloseTo(change, 0);
  });

  it('of single reps carry the error of one rep, wider than that of all together', () => {
    const [one, other] = early.reps.filter(({ used }) => used);
    if (!one || !other) throw new Error('two used reps were expected');
    const difference = courseDifference(repCourse(one, gates), repCourse(other, gates));
    const together = 1.96 * Math.SQRT2 * (early.figures?.uC ?? 0);
    expect(difference?.change?.halfWidth).toBeGreaterThan(together);
    expect(difference?.change?.value).toBeCloseTo(
      (other.fit?.change.value ?? 0) - (one.fit?.change.value ?? 0),
      9,
    );
  });

  it('say nothing where a course does not reach, and nothing between other gates', () => {
    const short = { ...sideCourse(early), curve: early.course.filter(({ lift }) => lift < 80) };
    expect(courseDifference(short, sideCourse(inwards))?.atTo).toBeNull();
    const other = { ...sideCourse(early), gates: { from: degrees(50), to: degrees(90) } };
    expect(courseDifference(other, sideCourse(inwards))).toBeNull();
    const unfitted = { ...sideCourse(early), change: null, curve: [], frames: [] };
    expect(courseDifference(unfitted, sideCourse(inwards))).toEqual({
      atFrom: null,
      atTo: null,
      change: null,
    });
  });
});
