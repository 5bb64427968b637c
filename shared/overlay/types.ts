import type { FramePoint } from '#shared/geometry/points.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';

/** Whose thing it is. `note` is a person's own pointer: a comment, a scale, a plumb line. */
export type OverlayRole = 'support' | 'lifted' | 'midline' | 'note';

/**
 * - `placed`   a person set it or looked at it: full line, with the exact point as a dot
 * - `tracked`  followed by the machine, nobody has looked: thin dashed, no dot
 * - `next`     where the landmark asked for is expected: larger, white, dashed
 * - `conflict` two people set it differently and nobody has decided yet
 */
export type OverlayState = 'placed' | 'tracked' | 'next' | 'conflict';

interface Drawn {
  readonly role: OverlayRole;
  readonly state: OverlayState;
}

/** A straight line between two points of the source frame. */
export interface Line extends Drawn {
  readonly kind: 'line';
  readonly from: FramePoint;
  readonly to: FramePoint;
}

/**
 * Part of a circle. Angles as on a clock face that starts at the top of the picture: 0 points up,
 * 90 to the right, 180 down; the arc runs the shorter way.
 */
export interface Arc extends Drawn {
  readonly kind: 'arc';
  readonly centre: FramePoint;
  /** Pixels of the source. */
  readonly radius: number;
  readonly from: Degrees;
  readonly to: Degrees;
}

/** Support side: a ring with a dot. With a radius (source pixels) it is a ring that a person drew. */
export interface Ring extends Drawn {
  readonly kind: 'ring';
  readonly at: FramePoint;
  readonly radius: number | null;
  readonly landmark: LandmarkId | null;
}

/** A line drawn by hand, corner to corner; two corners or more. */
export interface Stroke extends Drawn {
  readonly kind: 'stroke';
  readonly points: readonly FramePoint[];
}

/** Lifted side: a diamond. */
export interface Diamond extends Drawn {
  readonly kind: 'diamond';
  readonly at: FramePoint;
  readonly landmark: LandmarkId | null;
}

/** Midline of trunk and pelvis: a square bracket. */
export interface Bracket extends Drawn {
  readonly kind: 'bracket';
  readonly at: FramePoint;
  readonly landmark: LandmarkId | null;
}

/** Words beside a point; the painter keeps them clear of it and inside the picture. */
export interface Label extends Drawn {
  readonly kind: 'label';
  readonly at: FramePoint;
  readonly text: string;
  /** Which way the words run from the point. */
  readonly towards: 'left' | 'right' | 'centre';
}

export type Primitive = Line | Arc | Stroke | Ring | Diamond | Bracket | Label;
/** Shapes that stand for one landmark. */
export type MarkShape = Ring | Diamond | Bracket;
