import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { anchorsOf } from '#src/tracking/core/follow-box.ts';
import type { FollowRequest, Tracker } from '#src/tracking/types.ts';
import { followHeads, joined, reachOf } from './follow-head.ts';

const box = (left: number) => ({ left, top: 100, width: 60, height: 80 });
const picture = { width: 1080, height: 1920 };

/** Anchors that go two pixels right a frame, and are lost from a frame on. */
const tracker = (lostFrom: number, asked: FollowRequest[]): Tracker => ({
  kind: 'decoder',
  follow: (request, options) => {
    asked.push(request);
    options?.onProgress?.({ done: 1, total: 2, held: false });
    const frames = Array.from(
      { length: request.to - request.from + 1 },
      (_, n) => request.from + n,
    );
    const tracks = request.points.map(({ id, keyframes }) => ({
      id,
      places: frames.map((frame) => {
        const key = keyframes[0];
        if (!key || frame >= lostFrom)
          return { frame: frameIndex(frame), point: null, confidence: 0, state: 'lost' as const };
        const point = framePoint(key.point.u + 2 * (frame - key.frame), key.point.v);
        return { frame: frameIndex(frame), point, confidence: 0.8, state: 'sure' as const };
      }),
    }));
    return Promise.resolve({ tracks, refused: [] });
  },
  look: () => Promise.reject(new Error('not asked')),
  giveWay: () => undefined,
  close: () => undefined,
});

describe('following a drawn box', () => {
  it('goes both ways as far as the next drawn box, and keeps only what is sure', async () => {
    const asked: FollowRequest[] = [];
    const parts: number[] = [];
    const drawn = [
      { frame: 4, box: box(100) },
      { frame: 10, box: box(200) },
    ];
    const followed = await followHeads(
      tracker(12, asked),
      drawn,
      { last: 14, picture },
      { signal: new AbortController().signal, onProgress: (part) => parts.push(part) },
    );
    expect(asked.map(({ from, to }) => [from, to])).toEqual([
      [0, 9],
      [5, 14],
    ]);
    expect(parts).toEqual([0.25, 0.75]);
    expect(followed.map(({ frame }) => frame)).toEqual([0, 1, 2, 3, 5, 6, 7, 8, 9, 11]);
    expect(followed[0]?.confidence).toBeCloseTo(0.8, 9);
    expect(followed[0]?.box.left).toBeCloseTo(92, 9);
    // between both, both places are covered: 104 from the first, 192 from the second
    const between = followed.find(({ frame }) => frame === 6);
    expect(between?.box.left).toBeCloseTo(104, 9);
    expect(between?.box.width).toBeCloseTo(192 + 60 - 104, 9);
  });

  it('reaches to the ends of the clip where nothing else is drawn', () => {
    expect(reachOf(7, [{ frame: 7, box: box(0) }], 20)).toEqual({ from: 0, to: 20 });
  });

  it('is as unsure as the less sure of two', () => {
    const at = (left: number, confidence: number) => ({ frame: 3, box: box(left), confidence });
    expect(joined([[at(0, 0.9)], [at(10, 0.6)]])).toEqual([
      { frame: 3, box: { left: 0, top: 100, width: 70, height: 80 }, confidence: 0.6 },
    ]);
  });

  it('holds on to nine points of the box', () => {
    expect(anchorsOf({ frame: frameIndex(1), box: box(100) })).toHaveLength(9);
  });
});
