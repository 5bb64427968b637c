import { expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { noteLine, noteShape } from './notes.ts';

it('draws what a comment points at, a ring with its own radius', () => {
  expect(noteShape({ kind: 'ring', u: 3, v: 4, radius: 20 })).toEqual({
    kind: 'ring',
    at: { u: 3, v: 4 },
    radius: 20,
    landmark: null,
    role: 'note',
    state: 'placed',
  });
  expect(noteShape({ kind: 'point', u: 3, v: 4 }).radius).toBeNull();
});

it('draws a rod as a line with its two ends', () => {
  expect(noteLine(framePoint(1, 2), framePoint(1, 90)).map((each) => each.kind)).toEqual([
    'line',
    'ring',
    'ring',
  ]);
});
