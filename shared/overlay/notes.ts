import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import type { Line, Ring } from './types.ts';

/** What a comment points at, in pixels of the source frame; the contract's `Shape` fits in. */
export type NoteShape =
  | { readonly kind: 'point'; readonly u: number; readonly v: number }
  | { readonly kind: 'ring'; readonly u: number; readonly v: number; readonly radius: number };

export const noteShape = (shape: NoteShape): Ring => ({
  kind: 'ring',
  at: framePoint(shape.u, shape.v),
  radius: shape.kind === 'ring' ? shape.radius : null,
  landmark: null,
  role: 'note',
  state: 'placed',
});

/** A rod, a body height or a plumb line: a line with a ring at each end. */
export const noteLine = (a: FramePoint, b: FramePoint): (Line | Ring)[] => [
  { kind: 'line', from: a, to: b, role: 'note', state: 'placed' },
  noteShape({ kind: 'point', ...a }),
  noteShape({ kind: 'point', ...b }),
];
