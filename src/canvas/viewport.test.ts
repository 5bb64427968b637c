import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { framePoint, stagePoint } from '#shared/geometry/points.ts';
import {
  beyondCopy,
  centredOn,
  fit,
  LARGEST_SCALE,
  panBy,
  resized,
  toFrame,
  toStage,
  within,
  zoomAt,
} from './viewport.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const FRAME = { width: 1080, height: 1920 };
const STAGE = { width: 350, height: 622 };

const coordinate = fc.double({ min: -20_000, max: 20_000, noNaN: true });
const viewport = fc.record({
  scale: fc.double({ min: 0.02, max: LARGEST_SCALE, noNaN: true }),
  x: coordinate,
  y: coordinate,
});

describe('frame and stage', () => {
  it('a point comes back to where it was, to a thousandth of a pixel', () => {
    fc.assert(
      fc.property(viewport, coordinate, coordinate, (view, u, v) => {
        const back = toFrame(view, toStage(view, framePoint(u, v)));
        expect(Math.abs(back.u - u)).toBeLessThan(1e-3);
        expect(Math.abs(back.v - v)).toBeLessThan(1e-3);
      }),
    );
  });

  it('a literal place', () => {
    expect(toStage({ scale: 0.5, x: 10, y: 20 }, framePoint(100, 200))).toEqual({ x: 60, y: 120 });
    expect(toFrame({ scale: 0.5, x: 10, y: 20 }, stagePoint(60, 120))).toEqual({ u: 100, v: 200 });
  });
});

describe('fit', () => {
  it('shows the whole frame in the middle', () => {
    expect(fit({ width: 100, height: 200 }, { width: 300, height: 200 })).toEqual({
      scale: 1,
      x: 100,
      y: 0,
    });
  });
});

describe('zoomAt', () => {
  it('keeps the place under the pointer', () => {
    const start = centredOn(framePoint(540, 900), 1, FRAME, STAGE);
    const pointer = stagePoint(120, 300);
    const place = toFrame(start, pointer);
    const zoomed = zoomAt(start, pointer, 1.7, FRAME, STAGE);
    expect(zoomed.scale).toBeCloseTo(1.7, 10);
    expect(toFrame(zoomed, pointer).u).toBeCloseTo(place.u, 6);
    expect(toFrame(zoomed, pointer).v).toBeCloseTo(place.v, 6);
  });

  it('ends at the whole frame and at single pixels', () => {
    const start = fit(FRAME, STAGE);
    expect(zoomAt(start, stagePoint(0, 0), 0.1, FRAME, STAGE)).toEqual(start);
    expect(zoomAt(start, stagePoint(0, 0), 1e6, FRAME, STAGE).scale).toBe(LARGEST_SCALE);
  });
});

describe('within', () => {
  it('never leaves a gap beside a frame that is larger than the stage', () => {
    fc.assert(
      fc.property(viewport, (view) => {
        const held = within(view, FRAME, STAGE);
        const width = held.scale * FRAME.width;
        if (width >= STAGE.width) {
          expect(held.x).toBeLessThanOrEqual(1e-9);
          expect(held.x + width).toBeGreaterThanOrEqual(STAGE.width - 1e-6);
        } else expect(held.x).toBeCloseTo((STAGE.width - width) / 2, 9);
      }),
    );
  });

  it('stops a pan at the edge', () => {
    const start = centredOn(framePoint(540, 900), 1, FRAME, STAGE);
    expect(panBy(start, { dx: 1e5, dy: -1e5 }, FRAME, STAGE)).toEqual({
      scale: 1,
      x: 0,
      y: STAGE.height - FRAME.height,
    });
  });
});

describe('resized', () => {
  it('a whole frame stays whole', () => {
    const next = { width: 304, height: 540 };
    expect(resized(fit(FRAME, STAGE), STAGE, FRAME, next)).toEqual(fit(FRAME, next));
  });

  it('a magnified place stays in the middle', () => {
    const start = centredOn(framePoint(500, 900), 2, FRAME, STAGE);
    const next = { width: 390, height: 372 };
    const view = resized(start, STAGE, FRAME, next);
    const middle = toFrame(view, stagePoint(195, 186));
    expect(middle.u).toBeCloseTo(500, 6);
    expect(middle.v).toBeCloseTo(900, 6);
    expect(view.scale).toBe(2);
  });
});

describe('beyondCopy', () => {
  const copy = { width: 540, height: 960 };
  it('asks for the phone’s own picture once the copy would blur', () => {
    expect(beyondCopy({ scale: 0.5, x: 0, y: 0 }, FRAME, copy, 1)).toBe(false);
    expect(beyondCopy({ scale: 0.6, x: 0, y: 0 }, FRAME, copy, 1)).toBe(true);
    expect(beyondCopy({ scale: 0.3, x: 0, y: 0 }, FRAME, copy, 2)).toBe(true);
  });
  it('never where the copy has every pixel of the phone', () => {
    expect(beyondCopy({ scale: 8, x: 0, y: 0 }, FRAME, FRAME, 2)).toBe(false);
  });
});
