import { describe, expect, it } from 'vitest';
import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import { draftShape, shapeOf, toolAsks, withPoint } from './tools.ts';

describe('a line on the picture', () => {
  it('asks for one end, then the other, then for nothing', () => {
    const start = { kind: 'line', of: 'rod', points: [] } as const;
    expect(toolAsks(start)).toBe('One end of the rod');
    const one = withPoint({ ...start, points: [] as const }, framePoint(1, 2));
    expect(toolAsks(one)).toBe('The other end of the rod');
    const two = withPoint(one, framePoint(1, 90));
    expect(toolAsks(two)).toBeNull();
    expect(two.points).toEqual([framePoint(1, 2), framePoint(1, 90)]);
  });

  it('a further press begins anew', () => {
    const full = {
      kind: 'line' as const,
      of: 'plumb' as const,
      points: [framePoint(1, 2), framePoint(1, 90)],
    };
    expect(withPoint(full, framePoint(5, 5)).points).toEqual([framePoint(5, 5)]);
  });
});

describe('what a comment points at', () => {
  it('a point is whole at once', () => {
    const tool = { kind: 'shape' as const, of: 'point' as const, points: [framePoint(3, 4)] };
    expect(shapeOf(tool)).toEqual({ kind: 'point', u: 3, v: 4 });
  });

  it('a stroke takes corner after corner, none twice and no more than it may have', () => {
    const start = { kind: 'shape' as const, of: 'stroke' as const, points: [] as FramePoint[] };
    expect(toolAsks(start)).toBe('Draw, or press from corner to corner');
    const one = withPoint(start, framePoint(0, 0));
    expect(shapeOf(one)).toBeNull();
    expect(withPoint(one, framePoint(1, 1)).points).toHaveLength(1);
    const two = withPoint(one, framePoint(30, 40));
    expect(toolAsks(two)).toBeNull();
    expect(shapeOf(two)).toEqual({
      kind: 'stroke',
      points: [
        { u: 0, v: 0 },
        { u: 30, v: 40 },
      ],
    });
    let long = two;
    for (let n = 1; n < 300; n += 1) long = withPoint(long, framePoint(30 + n * 9, 40));
    expect(long.points).toHaveLength(200);
  });

  it('a ring needs its edge, and is never too small to see', () => {
    const ring = { kind: 'shape' as const, of: 'ring' as const, points: [framePoint(0, 0)] };
    expect(shapeOf(ring)).toBeNull();
    expect(draftShape(ring)).toEqual({ kind: 'point', u: 0, v: 0 });
    expect(shapeOf(withPoint(ring, framePoint(30, 40)))).toEqual({
      kind: 'ring',
      u: 0,
      v: 0,
      radius: 50,
    });
    expect(shapeOf(withPoint(ring, framePoint(1, 0)))).toMatchObject({ radius: 6 });
  });
});
