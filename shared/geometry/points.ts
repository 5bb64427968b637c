import { degrees, type Degrees, radians, toDegrees, toRadians } from './units.ts';

/**
 * A point in pixels of the upright, un-mirrored source frame (after rotation metadata and pixel
 * aspect): u to the right, v downwards, origin at the top left corner. This is what is stored.
 */
export interface FramePoint {
  readonly u: number;
  readonly v: number;
}

/** A point in CSS pixels of the stage the frame is drawn on: x right, y down. Never stored. */
export interface StagePoint {
  readonly x: number;
  readonly y: number;
}

export const framePoint = (u: number, v: number): FramePoint => ({ u, v });
export const stagePoint = (x: number, y: number): StagePoint => ({ x, y });

export const midpoint = (a: FramePoint, b: FramePoint): FramePoint =>
  framePoint((a.u + b.u) / 2, (a.v + b.v) / 2);

/** Length of the line between two points, in pixels. */
export const distance = (a: FramePoint, b: FramePoint): number => Math.hypot(b.u - a.u, b.v - a.v);

export const meanPoint = (points: readonly FramePoint[]): FramePoint | null => {
  if (points.length === 0) return null;
  const sum = points.reduce((s, p) => ({ u: s.u + p.u, v: s.v + p.v }), { u: 0, v: 0 });
  return framePoint(sum.u / points.length, sum.v / points.length);
};

/** Turns a point about a centre; positive turns u towards v, clockwise on the screen. */
export const rotateAbout = (point: FramePoint, centre: FramePoint, by: Degrees): FramePoint => {
  const angle = toRadians(by);
  const du = point.u - centre.u;
  const dv = point.v - centre.v;
  return framePoint(
    centre.u + du * Math.cos(angle) - dv * Math.sin(angle),
    centre.v + du * Math.sin(angle) + dv * Math.cos(angle),
  );
};

/**
 * How far a plumb line leans in the picture, from two touches on it in any order. Positive: its
 * lower end lies to the right of its upper end. Rotating all marks by this angle makes it vertical.
 * Null when the two touches are the same point.
 */
export const plumbTilt = (a: FramePoint, b: FramePoint): Degrees | null => {
  const [top, bottom] = a.v <= b.v ? [a, b] : [b, a];
  if (distance(top, bottom) === 0) return null;
  return degrees(toDegrees(radians(Math.atan2(bottom.u - top.u, bottom.v - top.v))));
};
