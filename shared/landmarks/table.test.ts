import { describe, expect, it } from 'vitest';
import { madeMarks } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { swapRoles } from './swap-roles.ts';
import { landmark, LANDMARKS, landmarksIn, landmarksOf, roleIn } from './table.ts';
import { LANDMARK_SETS } from './types.ts';

describe('landmark sets', () => {
  it('need ten landmarks a frame bare, nine with each pointer', () => {
    expect(LANDMARK_SETS.map((set) => landmarksOf(set).length)).toEqual([10, 9, 9]);
  });

  it('can all be marked from the front', () => {
    for (const set of LANDMARK_SETS)
      for (const id of landmarksOf(set)) expect(landmarksIn('front')).toContain(id);
  });

  it('keep the pointers to the sets that are named after them', () => {
    expect(landmarksOf('bare')).not.toContain('belt-tip');
    expect(landmarksOf('belt')).toContain('belt-tip');
    expect(landmarksOf('belt')).not.toContain('thigh-tip');
    expect(landmarksOf('belt+thigh')).not.toContain('kneecap');
  });
});

describe('landmarks', () => {
  it('say in a sentence where they are found', () => {
    for (const { where, label } of LANDMARKS) {
      expect(where).toMatch(/^[A-Z].{20,}\.$/);
      expect(label).not.toBe('');
    }
    expect(landmark('asis-support').where).toContain('Follow the top of the hip bone forward');
  });

  it('take their shape from the side the camera sees', () => {
    expect(roleIn('trochanter', 'lifted-side')).toBe('lifted');
    expect(roleIn('trochanter', 'support-side')).toBe('support');
    expect(roleIn('belt-tip', 'front')).toBe('midline');
    expect(roleIn('ankle-lifted', 'front')).toBe('lifted');
  });
});

describe('marks of a quiet stance shared by both sides', () => {
  const marks = madeMarks('left', { lift: degrees(0), femur: degrees(0), pelvis: degrees(0) });

  it('change sides and change back', () => {
    const swapped = swapRoles(marks);
    expect(swapped['asis-lifted']).toEqual(marks['asis-support']);
    expect(swapRoles(swapped)['ankle-support']).toEqual(marks['ankle-support']);
    expect(swapped['belt-tip']).toEqual(marks['belt-tip']);
  });

  it('leave out what only one leg carries', () => {
    expect(swapRoles(marks).kneecap).toBeUndefined();
  });
});
