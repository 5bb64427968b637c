import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { regionFragment, spanOfFrames, timeFragment } from './media-fragment.ts';

const at = (ms: number) => milliseconds(ms);

describe('a media fragment', () => {
  // Valid forms: W3C Media Fragments URI 1.0, test cases, t=3,7 and t=3 (seen)
  it('names a span of time', () => {
    expect(timeFragment({ from: at(3000), to: at(7000) })).toBe('t=3,7');
    expect(timeFragment({ from: at(3000), to: null })).toBe('t=3');
  });

  it('keeps frames of 240 a second apart', () => {
    expect(timeFragment({ from: at(1000 / 240), to: at(2000 / 240) })).toBe('t=0.004167,0.008333');
  });

  // The same test cases: xywh=160,120,320,240 (seen)
  it('names a region of whole pixels that holds the circle', () => {
    expect(regionFragment(framePoint(320, 240), 120)).toBe('xywh=200,120,240,240');
    expect(regionFragment(framePoint(320.4, 240.6), 1)).toBe('xywh=319,239,3,3');
  });

  it('stays inside the picture on the left and above', () => {
    expect(regionFragment(framePoint(2, 3), 10)).toBe('xywh=0,0,12,13');
    expect(regionFragment(framePoint(-30, -30), 10)).toBe('xywh=0,0,1,1');
  });
});

describe('the span of some frames', () => {
  const times = [0, 40, 80, 120].map(at);

  it('ends where the next frame begins, so that one frame is not empty', () => {
    // t=3,3 is no fragment: the same test cases
    expect(spanOfFrames(times, 1, 1)).toEqual({ from: 40, to: 80 });
    expect(spanOfFrames(times, 0, 2)).toEqual({ from: 0, to: 120 });
  });

  it('runs to the end of the clip after the last frame', () => {
    expect(spanOfFrames(times, 3, 3)).toEqual({ from: 120, to: null });
  });

  it('is nothing where the clip has no such frames', () => {
    expect(spanOfFrames(times, 2, 4)).toBeNull();
    expect(spanOfFrames(times, 2, 1)).toBeNull();
    expect(spanOfFrames([], 0, 0)).toBeNull();
  });
});
