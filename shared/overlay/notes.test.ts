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
  expect(noteShape({ kind: 'point', u: 3, v: 4 })).toMatchObject({ kind: 'ring', radius: null });
});

it('draws a rod as a line with its two ends', () => {
  expect(noteLine(framePoint(1, 2), framePoint(1, 90)).map((each) => each.kind)).toEqual([
    'line',
    'ring',
    'ring',
  ]);
});

it('draws a stroke corner to corner', () => {
  const points = [
    { u: 1, v: 2 },
    { u: 5, v: 2 },
    { u: 5, v: 9 },
  ];
  expect(noteShape({ kind: 'stroke', points })).toEqual({
    kind: 'stroke',
    points,
    role: 'note',
    state: 'placed',
  });
});

it('writes a measure in the middle of what it is taken from', () => {
  const shape = { kind: 'measured', u: 3, v: 4, label: 'Heel rise', text: '+12 mm ± 6' } as const;
  expect(noteShape(shape)).toMatchObject({
    kind: 'label',
    at: { u: 3, v: 4 },
    text: 'Heel rise +12 mm ± 6',
    towards: 'centre',
  });
});
