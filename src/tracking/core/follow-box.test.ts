import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Box } from '#shared/geometry/boxes.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { type FrameIndex, frameIndex } from '#shared/timing/units.ts';
import type { Track, TrackState } from '../types.ts';
import { anchorsOf, followBox } from './follow-box.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const drawn = {
  frame: frameIndex(5),
  box: { left: 400, top: 200, width: 100, height: 120 },
};
const span = { from: frameIndex(0), to: frameIndex(10), width: 1080, height: 1920 };

/** Every anchor goes `step` pixels right a frame; `stateOf` says how surely it is known. */
const tracks = (
  stateOf: (frame: number, anchor: number) => TrackState,
  step = 8,
  stray: (anchor: number) => number = () => 0,
): Track[] =>
  anchorsOf(drawn).map(({ id, keyframes }, anchor) => ({
    id,
    places: Array.from({ length: 11 }, (_, n) => {
      const state = stateOf(n, anchor);
      const { u = NaN, v = NaN } = keyframes[0]?.point ?? {};
      const point = framePoint(u + step * (n - 5) + (n === 5 ? 0 : stray(anchor)), v);
      return {
        ...{ frame: frameIndex(n), state, confidence: state === 'sure' ? 1 : 0.3 },
        point: state === 'lost' ? null : point,
      };
    }),
  }));

const on = (boxes: ReturnType<typeof followBox>, frame: number) => {
  const found = boxes.find((box) => box.frame === frame);
  if (!found) throw new RangeError(`no box on ${frame}`);
  return found;
};
const contains = (outer: Box, inner: Box): boolean =>
  outer.left <= inner.left + 1e-9 &&
  outer.top <= inner.top + 1e-9 &&
  outer.left + outer.width >= inner.left + inner.width - 1e-9 &&
  outer.top + outer.height >= inner.top + inner.height - 1e-9;

describe('followBox', () => {
  it('goes where its anchors go, both ways, and keeps its size', () => {
    const boxes = followBox(
      drawn,
      tracks(() => 'sure'),
      span,
    );
    expect(boxes.map(({ frame }) => frame)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    expect(on(boxes, 5).box).toEqual(drawn.box);
    expect(on(boxes, 8).box).toEqual({ ...drawn.box, left: 424 });
    expect(on(boxes, 0).box).toEqual({ ...drawn.box, left: 360 });
    expect(boxes.every(({ state }) => state === 'sure')).toBe(true);
  });

  it('passes over a few anchors that stick to what is behind', () => {
    const boxes = followBox(
      drawn,
      tracks(
        () => 'sure',
        8,
        (n) => (n < 3 ? -60 : 0),
      ),
      span,
    );
    expect(on(boxes, 9).box.left).toBeCloseTo(432, 9);
  });

  it('grows from its last place while it is lost, more with every frame', () => {
    const boxes = followBox(
      drawn,
      tracks((n) => (n > 6 ? 'lost' : 'sure')),
      span,
    );
    expect(on(boxes, 6).state).toBe('sure');
    expect(on(boxes, 7)).toMatchObject({ state: 'lost' });
    for (let n = 7; n <= 10; n += 1) {
      expect(contains(on(boxes, n).box, on(boxes, n - 1).box)).toBe(true);
      expect(on(boxes, n).box.width).toBeGreaterThan(on(boxes, n - 1).box.width);
    }
    expect(on(boxes, 7).box).toEqual({ left: 402, top: 194, width: 112, height: 132 });
  });

  it('does not trust what is unsure', () => {
    const boxes = followBox(
      drawn,
      tracks((n) => (n === 5 ? 'sure' : 'unsure')),
      span,
    );
    expect(boxes.filter(({ state }) => state === 'sure').map(({ frame }) => frame)).toEqual([5]);
  });

  it('is as it was drawn again once it is found', () => {
    const boxes = followBox(
      drawn,
      tracks((n) => (n === 7 || n === 8 ? 'lost' : 'sure')),
      span,
    );
    expect(on(boxes, 8).box.width).toBeGreaterThan(100);
    expect(on(boxes, 9).box).toEqual({ ...drawn.box, left: 432 });
  });

  it('covers the whole picture in the end, and where it left it', () => {
    const none = followBox(drawn, [], { ...span, growth: 30 });
    expect(on(none, 10).box).toEqual({ left: 0, top: 0, width: 1080, height: 1920 });
    const away = followBox(
      drawn,
      tracks(() => 'sure', 400),
      span,
    );
    expect(on(away, 10).box).toEqual({ left: 0, top: 0, width: 1080, height: 1920 });
  });

  it('grows with the head that comes nearer, and never shrinks below what was drawn', () => {
    const scaled = (factor: number): Track[] =>
      anchorsOf(drawn).map(({ id, keyframes }) => ({
        id,
        places: [
          {
            ...{ frame: frameIndex(6), state: 'sure', confidence: 1 },
            point: framePoint(
              450 + factor * ((keyframes[0]?.point.u ?? NaN) - 450),
              260 + factor * ((keyframes[0]?.point.v ?? NaN) - 260),
            ),
          },
        ],
      }));
    const nearer = on(followBox(drawn, scaled(1.2), span), 6).box;
    expect(nearer.left).toBeCloseTo(390, 6);
    expect(nearer.width).toBeCloseTo(120, 6);
    expect(on(followBox(drawn, scaled(0.9), span), 6).box).toMatchObject({
      width: 100,
      height: 120,
    });
  });

  it('always covers the drawn size or the picture’s rest, whatever is lost', () => {
    const states = fc.array(fc.constantFrom<TrackState>('sure', 'unsure', 'lost'), {
      minLength: 99,
      maxLength: 99,
    });
    fc.assert(
      fc.property(states, (list) => {
        const boxes = followBox(
          drawn,
          tracks((n, anchor) => list[n * 9 + anchor] ?? 'lost'),
          span,
        );
        expect(boxes).toHaveLength(11);
        for (const { box } of boxes) {
          expect(box.width).toBeGreaterThanOrEqual(100 - 1e-9);
          expect(box.height).toBeGreaterThanOrEqual(120 - 1e-9);
          expect(box.left).toBeGreaterThanOrEqual(0);
        }
      }),
    );
  });

  it('knows only frames of the span, also where it was drawn outside', () => {
    const late = followBox(
      drawn,
      tracks(() => 'sure'),
      { ...span, from: 7 as FrameIndex },
    );
    expect(late.map(({ frame }) => frame)).toEqual([7, 8, 9, 10]);
  });
});
