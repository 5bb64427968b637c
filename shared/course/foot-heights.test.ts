import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import { frontFootHeights, sideFootHeights } from './foot-heights.ts';
import type { RepInput } from './types.ts';

const rep = madeRep('left', () => 0);
const courseOf = (input: RepInput): RepCourse => {
  const course = courseOfRep(input, 'bare', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};
const without = (id: LandmarkId, wanted: (index: number) => boolean = () => true): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame, i) => {
    const { [id]: _gone, ...marks } = frame.marks;
    return wanted(i) ? { ...frame, marks } : frame;
  }),
});

describe('the height of the lifted foot from the front', () => {
  it('is nought in quiet stance and grows with the lift', () => {
    const heights = frontFootHeights(courseOf(rep));
    expect(heights).toHaveLength(rep.frames.length);
    expect(Math.abs(heights[0]?.height ?? NaN)).toBeLessThan(1);
    expect(heights[30]?.height).toBeGreaterThan(100);
    // 2.4 px each, at 2 mm per pixel
    expect(heights[0]?.u).toBeCloseTo(2 * Math.hypot(2.4, 2.4), 9);
  });

  it('is unknown where an ankle is not marked: of a frame, or of the stance', () => {
    const gap = frontFootHeights(courseOf(without('ankle-lifted', (i) => i === 30)));
    expect(gap).toHaveLength(rep.frames.length - 1);
    for (const id of ['ankle-lifted', 'ankle-support'] as const)
      expect(frontFootHeights(courseOf(without(id)))).toEqual([]);
  });
});

describe('the height of the lifted foot from the side', () => {
  const side: RepInput = {
    ...rep,
    camera: { ...rep.camera, view: 'lifted-side', toes: 'image-right' },
  };

  it('is as the front camera sees it, less certain where nobody measured the lens', () => {
    const known = sideFootHeights(courseOf(side), courseOf(rep));
    expect(known).toHaveLength(rep.frames.length);
    expect(Math.abs(known[0]?.height ?? NaN)).toBeLessThan(1);
    const guessed = courseOf({ ...rep, camera: { ...rep.camera, lensHeightMm: null } });
    const unsure = sideFootHeights(courseOf(side), guessed);
    expect(unsure).toHaveLength(known.length);
    expect(unsure[30]?.u).toBeGreaterThan(known[30]?.u ?? NaN);
  });

  it('is unknown without the way the toes point or the ankle', () => {
    const blind = without('ankle-support');
    const unknown = { ...blind, camera: { ...rep.camera, lensHeightMm: null } };
    expect(sideFootHeights(courseOf(side), courseOf(unknown))).toEqual([]);
    const turned = { ...side, camera: { ...side.camera, toes: null } };
    expect(sideFootHeights(courseOf(turned), courseOf(rep))).toEqual([]);
    const bare = { ...side, frames: without('ankle-lifted').frames };
    expect(sideFootHeights(courseOf(bare), courseOf(rep))).toEqual([]);
    const gap = { ...side, frames: without('ankle-lifted', (i) => i === 30).frames };
    expect(sideFootHeights(courseOf(gap), courseOf(rep))).toHaveLength(rep.frames.length - 1);
  });
});
