import { describe, expect, it } from 'vitest';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { markedRep } from '#tests/fixtures/clips/marked.ts';
import { loadTruth } from '#tests/fixtures/clips/truth.ts';
import { courseOfRep, isCourse } from './course-of-rep.ts';
import type { RepInput } from './types.ts';

const truth = loadTruth('right-side');
const courseOf = (rep: RepInput) => {
  const course = courseOfRep(rep, 'bare', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};

/** The same rep as a coach marks it to whom the standing foot is covered by the other in these frames. */
const coveredIn = (rep: RepInput, covered: (index: number) => boolean): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame, index) => {
    const { 'ankle-support': support, ...marks } = frame.marks;
    return support && !covered(index) ? frame : { ...frame, marks };
  }),
});

describe.each([
  ['the standing foot covered all the time', () => true],
  ['the standing foot covered in quiet stance', (index: number) => index < 6],
] as const)('a clip from the lifted side, %s', (_name, covered) => {
  it.each([0, 1, 2])('shows the lift of rep %i and when the foot leaves the floor', (index) => {
    const known = truth.reps[index];
    const course = courseOf(coveredIn(markedRep(truth, index, 1, 7), covered));
    const { boundaries, byFrame } = course.phases;
    const timeOf = (frame: number | undefined): number => truth.frames[frame ?? -1]?.tMs ?? NaN;
    expect(boundaries.quietFrom).toBe(timeOf(known?.quietFrames[0]));
    // somewhere between the same two marked frames
    const apart = Math.abs((boundaries.footOff ?? NaN) - timeOf(known?.footOffFrame));
    expect(apart).toBeLessThanOrEqual(2 * (course.phases.footOffHalfGap ?? NaN));
    expect(byFrame.filter((phase) => phase === 'quiet').length).toBeGreaterThanOrEqual(3);
    expect(Math.abs((course.fMax ?? NaN) - (known?.maxLift ?? NaN))).toBeLessThan(3);
    expect(course.frames.every(({ lift }) => lift !== null)).toBe(true);
  });
});
