import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import { trialOf } from '#shared/evaluate/trial.ts';
import { ASSUMED_MARK_ERROR, type FrameInput } from '#shared/measures/inputs.ts';
import { measurable, measuredNote } from './measured-note.ts';

const file = new URL('../../tests/fixtures/golden/g01_early_big_thigh.json', import.meta.url);
const rep = trialOf(JSON.parse(readFileSync(file, 'utf8'))).reps[0];
if (!rep) throw new Error('no rep');
const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR);
if (!isCourse(course)) throw new Error('no course');
const { setting } = course;
const high = course.frames.find(({ lift }) => lift !== null && lift > 80);
const frame = rep.frames.find((each) => each.frame === high?.frame);
if (!high || !frame) throw new Error('no frame');
const note = (id: string, on: FrameInput = frame) =>
  measuredNote(id, on, setting, ASSUMED_MARK_ERROR);

describe('a measure in a comment', () => {
  it('says what the measure says of that frame, with its ±', () => {
    const text = note('lift')?.shape.text ?? '';
    const [value, within] = text.split('±').map(parseFloat);
    expect(value).toBeCloseTo(high.lift ?? NaN, 1);
    expect(within).toBeCloseTo(high.liftHalfWidth ?? NaN, 1);
    expect(note('lift')?.shape.label).toBe('Lift of the thigh');
  });

  it('stands in the middle of the marks it is taken from', () => {
    const { u, v } = note('pelvic-obliquity')?.shape ?? { u: NaN, v: NaN };
    const spots = (['asis-support', 'asis-lifted'] as const).map((id) => {
      const mark = frame.marks[id];
      return mark && !mark.hidden ? mark.point : { u: NaN, v: NaN };
    });
    expect(u).toBeCloseTo(((spots[0]?.u ?? NaN) + (spots[1]?.u ?? NaN)) / 2);
    expect(v).toBeCloseTo(((spots[0]?.v ?? NaN) + (spots[1]?.v ?? NaN)) / 2);
  });

  it('is not offered, nor shown, where it cannot be taken', () => {
    const offered = measurable(frame, setting, ASSUMED_MARK_ERROR).map(({ measure }) => measure.id);
    expect(offered).toContain('turn');
    expect(offered).not.toContain('pelvic-tilt');
    expect(note('pelvic-tilt')).toBeNull();
    expect(note('an-angle-of-my-own')).toBeNull();
    const { 'asis-lifted': _gone, ...marks } = frame.marks;
    expect(note('pelvic-obliquity', { ...frame, marks })).toBeNull();
  });

  it('says where it rests on a mark that was followed and not looked at', () => {
    expect(note('pelvic-obliquity')?.provisional).toBe(false);
    const asis = frame.marks['asis-lifted'];
    if (!asis || asis.hidden) throw new Error('no mark');
    const hollow = { ...asis, source: 'tracked', looked: false } as const;
    const marks = { ...frame.marks, 'asis-lifted': hollow };
    expect(note('pelvic-obliquity', { ...frame, marks })?.provisional).toBe(true);
  });
});
