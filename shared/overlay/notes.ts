import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import type { Line, Ring, Stroke } from './types.ts';

/** What a comment points at, in pixels of the source frame; the contract's `Shape` fits in. */
export type NoteShape =
  | { readonly kind: 'point'; readonly u: number; readonly v: number }
  | { readonly kind: 'ring'; readonly u: number; readonly v: number; readonly radius: number }
  | {
      readonly kind: 'stroke';
      readonly points: readonly { readonly u: number; readonly v: number }[];
    };

const ring = (at: FramePoint, radius: number | null): Ring => ({
  kind: 'ring',
  at,
  radius,
  landmark: null,
  role: 'note',
  state: 'placed',
});

export const noteShape = (shape: NoteShape): Ring | Stroke =>
  shape.kind === 'stroke'
    ? {
        kind: 'stroke',
        points: shape.points.map(({ u, v }) => framePoint(u, v)),
        role: 'note',
        state: 'placed',
      }
    : ring(framePoint(shape.u, shape.v), shape.kind === 'ring' ? shape.radius : null);

/** A rod, a body height or a plumb line: a line with a ring at each end. */
export const noteLine = (a: FramePoint, b: FramePoint): (Line | Ring)[] => [
  { kind: 'line', from: a, to: b, role: 'note', state: 'placed' },
  ring(a, null),
  ring(b, null),
];
