import { describe, expect, it } from 'vitest';
import { landmarkAt, spotOf, type Standing } from './spots.ts';
import { swapRoles } from './swap-roles.ts';
import { landmarksIn } from './table.ts';
import { LANDMARK_IDS, type Marks, type View } from './types.ts';

const VIEWS: readonly View[] = ['front', 'back', 'lifted-side', 'support-side'];
const on = (supportSide: Standing['supportSide'], view: View = 'front'): Standing => ({
  supportSide,
  view,
});

describe('places on the body', () => {
  it.each(VIEWS)('are told apart, and found again, in a view from the %s', (view) => {
    for (const side of ['left', 'right'] as const) {
      const ids = landmarksIn(view);
      const spots = ids.map((id) => spotOf(id, on(side, view)));
      expect(new Set(spots).size).toBe(ids.length);
      expect(spots.map((spot) => landmarkAt(spot, on(side, view)))).toEqual(ids);
    }
  });

  it('change their role with the leg stood on, not their place', () => {
    expect(spotOf('asis-support', on('left'))).toBe('asis/left');
    expect(spotOf('asis-lifted', on('right'))).toBe('asis/left');
    expect(spotOf('lifted-knee', on('right'))).toBe('lifted-knee/left');
    expect(spotOf('belt-tip', on('left'))).toBe(spotOf('belt-tip', on('right')));
  });

  it('of one leg only have no name while the other is stood on', () => {
    expect(landmarkAt(spotOf('kneecap', on('left')), on('right'))).toBeNull();
    expect(landmarkAt(spotOf('lifted-knee', on('left')), on('right'))).toBeNull();
  });

  it('agree with the roles that are swapped between reps', () => {
    const marks: Marks = Object.fromEntries(LANDMARK_IDS.map((id) => [id, { hidden: true }]));
    const swapped = swapRoles(marks);
    for (const id of landmarksIn('front')) {
      const there = landmarkAt(spotOf(id, on('left')), on('right'));
      expect(there !== null, id).toBe(there !== null && swapped[there] !== undefined);
    }
  });
});
