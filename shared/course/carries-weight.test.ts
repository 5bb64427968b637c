import { describe, expect, it } from 'vitest';
import { MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { carriesWeight } from './carries-weight.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import type { RepInput } from './types.ts';

const rep = madeRep('left', () => 0);
const courseOf = (input: RepInput): RepCourse => {
  const course = courseOfRep(input, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};

/** The rep with one landmark 12 px off, wherever its place is said to carry weight or not to. */
const off = (id: LandmarkId, where: boolean): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame, i) => {
    const mark = frame.marks[id];
    const lift = degrees(MADE_LIFTS[i] ?? 0);
    if (!mark || mark.hidden || carriesWeight(id, { lift }) !== where) return frame;
    const point = framePoint(mark.point.u + 12, mark.point.v + 12);
    return { ...frame, marks: { ...frame.marks, [id]: { ...mark, point } } };
  }),
});

describe('an ankle', () => {
  it('counts near the floor, and not with the thigh well up', () => {
    for (const id of ['ankle-lifted', 'ankle-support'] as const) {
      expect(carriesWeight(id, { lift: degrees(12) })).toBe(true);
      expect(carriesWeight(id, { lift: degrees(60) })).toBe(false);
    }
  });
  it('counts where the lift is not known', () => {
    expect(carriesWeight('ankle-lifted', { lift: null })).toBe(true);
    expect(carriesWeight('ankle-lifted', null)).toBe(true);
  });
  it('changes nothing of the course where it carries no weight', () => {
    const course = courseOf(rep);
    for (const id of ['ankle-lifted', 'ankle-support'] as const) {
      const moved = courseOf(off(id, false));
      expect(moved.rep.frames).not.toEqual(course.rep.frames);
      expect(moved.frames).toEqual(course.frames);
      expect(moved.phases).toEqual(course.phases);
    }
  });
});

describe('any other landmark', () => {
  it('counts at every lift', () => {
    expect(carriesWeight('asis-lifted', { lift: degrees(80) })).toBe(true);
    expect(carriesWeight('belt-tip', { lift: degrees(2) })).toBe(true);
    expect(courseOf(off('lifted-knee', true)).frames).not.toEqual(courseOf(rep).frames);
  });
});
