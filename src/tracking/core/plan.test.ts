import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { neighbours, requestFault, wayBack, wayForward } from './plan.ts';

const point = (id: string, ...frames: number[]) => ({
  id,
  keyframes: frames.map((n) => ({ frame: frameIndex(n), point: framePoint(10, 10) })),
});
const request = (from: number, to: number, ...points: ReturnType<typeof point>[]) => ({
  points,
  from: frameIndex(from),
  to: frameIndex(to),
});

describe('requestFault', () => {
  it('finds none in a request that can be followed', () => {
    expect(requestFault(request(0, 9, point('a', 3), point('b', 9, 0)), 10)).toBeNull();
  });

  it.each([
    ['a span beyond the clip', request(0, 10, point('a', 3)), /span/],
    ['a span turned round', request(5, 4, point('a', 3)), /span/],
    ['two of one name', request(0, 9, point('a', 3), point('a', 4)), /one name/],
    ['no keyframe', request(0, 9, point('a')), /no keyframe/],
    ['a frame twice', request(0, 9, point('a', 3, 3)), /two keyframes/],
    ['a keyframe beyond the clip', request(0, 9, point('a', 12)), /no place/],
  ])('finds %s', (_, asked, words) => {
    expect(requestFault(asked, 10)).toMatch(words);
  });

  it('finds a place that is no number', () => {
    const keyframes = [{ frame: frameIndex(3), point: framePoint(NaN, 1) }];
    expect(requestFault(request(0, 9, { id: 'a', keyframes }), 10)).toMatch(/no place/);
  });
});

describe('the ways', () => {
  it('begin at the keyframe that stands before, or after, the span', () => {
    const asked = request(10, 20, point('a', 2, 7, 15, 28, 40));
    expect(wayForward(asked)).toEqual({ first: 7, last: 20 });
    expect(wayBack(asked)).toEqual({ first: 28, last: 10 });
  });

  it('begin within the span where no keyframe stands outside', () => {
    const asked = request(10, 20, point('a', 14), point('b', 16));
    expect(wayForward(asked)).toEqual({ first: 14, last: 20 });
    expect(wayBack(asked)).toEqual({ first: 16, last: 10 });
  });

  it('are only one where all keyframes lie on one side', () => {
    expect(wayForward(request(10, 20, point('a', 30)))).toBeNull();
    expect(wayBack(request(10, 20, point('a', 3)))).toBeNull();
  });
});

describe('neighbours', () => {
  const keys = [12, 3, 20].map(frameIndex);
  it('are the nearest on both sides, the frame itself excluded', () => {
    expect(neighbours(keys, 12)).toEqual({ before: 3, after: 20 });
    expect(neighbours(keys, 1)).toEqual({ before: null, after: 3 });
    expect(neighbours(keys, 25)).toEqual({ before: 20, after: null });
  });
});
