import { distance, type FramePoint } from '#shared/geometry/points.ts';
import type { Scale } from '#shared/contracts/clips.ts';
import { LONGEST_STROKE, type Shape } from '#shared/contracts/comments.ts';
import type { NoteShape } from '#shared/overlay/notes.ts';

/** Corners of a stroke are never closer than this, source px. */
const LEAST_STEP = 5;

/** What a press on the picture does. */
export type Tool =
  /** Places the landmark that is asked for. */
  | { readonly kind: 'mark' }
  /** Moves the picture; nothing is placed. */
  | { readonly kind: 'look' }
  /** Two points: on a thing of known length, a plumb line, the floor line, or a smeared dot. */
  | { readonly kind: 'line'; readonly of: LineOf; readonly points: readonly FramePoint[] }
  /** What a comment points at: a point, a ring by its middle and its edge, or a stroke corner by corner. */
  | {
      readonly kind: 'shape';
      readonly of: DrawnKind;
      readonly points: readonly FramePoint[];
    };
export type LineOf = Extract<Scale['from'], 'rod' | 'body-height'> | 'plumb' | 'floor' | 'smear';

/** What a hand draws; a measure is chosen instead. */
export type DrawnKind = Exclude<Shape['kind'], 'measure'>;

export const MARK: Tool = { kind: 'mark' };
export const LOOK: Tool = { kind: 'look' };

/** The first and the second end of each line. */
const LINE_ASKS: Record<LineOf, readonly [string, string]> = {
  rod: ['One end of the rod', 'The other end of the rod'],
  'body-height': ['The crown of the head', 'The floor at the heels'],
  plumb: ['The upper end of the plumb line', 'The lower end of the plumb line'],
  floor: ['One heel, or one end of the floor line', 'The other heel, or its other end'],
  smear: ['Where the smear of the dot begins', 'Where the smear of the dot ends'],
};

/** What the tool still wants, in words; null where it wants nothing. */
export const toolAsks = (tool: Tool): string | null => {
  if (tool.kind === 'line') return LINE_ASKS[tool.of][tool.points.length] ?? null;
  if (tool.kind === 'shape') {
    if (tool.of === 'stroke')
      return tool.points.length < 2 ? 'Draw, or press from corner to corner' : null;
    if (tool.of === 'point') return tool.points.length === 0 ? 'What you mean' : null;
    if (tool.points.length >= 2) return null;
    return tool.points.length === 0 ? 'The middle of the ring' : 'The edge of the ring';
  }
  return null;
};

/** A stroke takes every corner until it is as long as one may be. */
const withCorner = (points: readonly FramePoint[], point: FramePoint): readonly FramePoint[] => {
  const last = points.at(-1);
  const same = last !== undefined && distance(last, point) < LEAST_STEP;
  return same || points.length >= LONGEST_STROKE ? points : [...points, point];
};

/** The tool with one more point; a full one begins anew. */
export const withPoint = <T extends Extract<Tool, { points: readonly FramePoint[] }>>(
  tool: T,
  point: FramePoint,
): T => {
  if (tool.kind === 'shape' && tool.of === 'stroke')
    return { ...tool, points: withCorner(tool.points, point) };
  const full = toolAsks(tool) === null;
  return { ...tool, points: full ? [point] : [...tool.points, point] };
};

/** A ring is never smaller than this, source px: a touch cannot draw less. */
const LEAST_RADIUS = 6;

/** The shape drawn so far; null until it is whole. */
export const shapeOf = (tool: Tool): Extract<Shape, { kind: DrawnKind }> | null => {
  if (tool.kind !== 'shape') return null;
  const [middle, edge] = tool.points;
  if (!middle) return null;
  if (tool.of === 'stroke')
    return tool.points.length < 2
      ? null
      : { kind: 'stroke', points: tool.points.map(({ u, v }) => ({ u, v })) };
  if (tool.of === 'point') return { kind: 'point', u: middle.u, v: middle.v };
  if (!edge) return null;
  const radius = Math.min(5000, Math.max(LEAST_RADIUS, distance(middle, edge)));
  return { kind: 'ring', u: middle.u, v: middle.v, radius };
};

/** What is drawn while the tool is in use: the whole shape, or its first point. */
export const draftShape = (tool: Tool): NoteShape | null => {
  const whole = shapeOf(tool);
  if (whole) return whole;
  const first = tool.kind === 'shape' ? tool.points[0] : undefined;
  return first ? { kind: 'point', u: first.u, v: first.v } : null;
};
