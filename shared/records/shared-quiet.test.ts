import { describe, expect, it } from 'vitest';
import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { type Borrowing, quietFramesOf, sharedQuietOf, withSharedQuiet } from './shared-quiet.ts';

const lender: RepInput = { ...madeRep('left', () => 0), id: 'first' };
/** The same lift in a row: it begins with the foot in the air. */
const marching: RepInput = { ...lender, id: 'second', frames: lender.frames.slice(20) };

const of = (input: RepInput, quietFrom: string | null = null, clipId = 'clip'): Borrowing => ({
  input,
  clipId,
  quietFrom,
});
const turns = (rep: RepInput | null | undefined): number => {
  const course = rep && courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!course || !isCourse(course)) throw new Error('no course');
  return course.frames.filter(({ turn }) => turn !== null).length;
};

describe('a quiet stance that several reps share', () => {
  it('is the quiet frames of the lender, and gives the other rep its turn', () => {
    const quiet = quietFramesOf(lender);
    expect(quiet.length).toBeGreaterThanOrEqual(3);
    expect(quietFramesOf(marching)).toEqual([]);
    const [first, second] = withSharedQuiet([of(lender), of(marching, 'first')]);
    expect(first?.input).toBe(lender);
    expect(second?.input?.sharedQuiet).toEqual(quiet);
    expect(turns(marching)).toBe(0);
    expect(turns(second?.input)).toBeGreaterThan(15);
  });

  it('is taken only from another rep of the same clip and side that has one', () => {
    const taken = (from: Borrowing, quietFrom = 'first') =>
      sharedQuietOf(of(marching, quietFrom), [from, of(marching, quietFrom)]);
    expect(taken(of(lender))).not.toBeNull();
    expect(taken(of(lender, null, 'another clip'))).toBeNull();
    expect(taken(of({ ...lender, supportSide: 'right' }))).toBeNull();
    expect(taken(of({ ...marching, id: 'first' }))).toBeNull();
    expect(taken(of(lender), 'second')).toBeNull();
    expect(taken(of(lender), 'deleted')).toBeNull();
  });
});

describe('quiet frames', () => {
  it('are none of a rep without marks or without a scale', () => {
    expect(quietFramesOf({ ...lender, frames: [] })).toEqual([]);
    const camera = { ...lender.camera, mmPerPx: null };
    expect(quietFramesOf({ ...lender, camera })).toEqual([]);
  });

  it('are found with bare landmarks too', () => {
    const bare: RepInput = {
      ...lender,
      frames: lender.frames.map((frame) => {
        const { 'belt-tip': _belt, 'thigh-tip': _thigh, kneecap: _knee, ...marks } = frame.marks;
        return { ...frame, marks };
      }),
    };
    expect(quietFramesOf(bare)).toHaveLength(quietFramesOf(lender).length);
  });

  it('are not lent to a rep that is not measured', () => {
    const nobody: Borrowing = { input: null, clipId: 'clip', quietFrom: 'first' };
    expect(sharedQuietOf(nobody, [of(lender), nobody])).toBeNull();
    expect(withSharedQuiet([nobody])).toEqual([nobody]);
  });
});
