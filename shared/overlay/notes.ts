import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import type { Label, Line, Ring, Stroke } from './types.ts';

/** A measure of the registry, worked out: what is written beside its landmarks. */
export interface MeasuredShape {
  readonly kind: 'measured';
  readonly u: number;
  readonly v: number;
  readonly label: string;
  /** The value with its ±. */
  readonly text: string;
}

/** What a comment points at, in pixels of the source frame; what the contract's `Shape` has drawn by hand fits in. */
export type NoteShape =
  | MeasuredShape
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

export const noteShape = (shape: NoteShape): Ring | Stroke | Label => {
  const drawn = { role: 'note', state: 'placed' } as const;
  switch (shape.kind) {
    case 'stroke':
      return {
        kind: 'stroke',
        points: shape.points.map(({ u, v }) => framePoint(u, v)),
        ...drawn,
      };
    case 'measured': {
      const text = `${shape.label} ${shape.text}`;
      return { kind: 'label', at: framePoint(shape.u, shape.v), text, towards: 'centre', ...drawn };
    }
    case 'ring':
      return ring(framePoint(shape.u, shape.v), shape.radius);
    case 'point':
      return ring(framePoint(shape.u, shape.v), null);
  }
};

/** A rod, a body height or a plumb line: a line with a ring at each end. */
export const noteLine = (a: FramePoint, b: FramePoint): (Line | Ring)[] => [
  { kind: 'line', from: a, to: b, role: 'note', state: 'placed' },
  ring(a, null),
  ring(b, null),
];
