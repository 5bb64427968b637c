import { describe, expect, it } from 'vitest';
import { framePoint, rotateAbout } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import { offFrontOf } from './off-front.ts';

const [FOCAL, DISTANCE, LENS] = [1500, 3000, 950];
const camera = {
  width: 1080,
  height: 1920,
  mmPerPx: DISTANCE / FOCAL,
  distanceMm: DISTANCE,
  lensHeightMm: LENS,
  plumbTilt: null,
};

/** The ends of a floor line seen by a level pinhole; its right end turned away by an angle, mm. */
const seen = (turnedAway: number, half: number, aside = 0) => {
  const angle = (turnedAway * Math.PI) / 180;
  const at = (s: number) => {
    const across = aside + s * half * Math.cos(angle);
    const depth = DISTANCE + s * half * Math.sin(angle);
    return framePoint(540 + (FOCAL * across) / depth, 700 + (FOCAL * LENS) / depth);
  };
  return { a: at(-1), b: at(1) };
};

describe('how far the lens stood from dead front', () => {
  it.each([0, 5, 20, 27, -27, 40])('a floor line turned away by %d° tells it', (turned) => {
    const found = offFrontOf(seen(turned, 400), camera);
    expect(Math.abs((found?.by ?? NaN) + turned)).toBeLessThan(1);
  });

  it('counts where the athlete stands in the picture', () => {
    const aside = DISTANCE * Math.tan((8 * Math.PI) / 180);
    expect(offFrontOf(seen(0, 300, aside), camera)?.by).toBeCloseTo(-8, 6);
  });

  it('is the same for touches in the other order, and in a leaning picture whose plumb line is known', () => {
    const line = seen(15, 300);
    const straight = offFrontOf(line, camera);
    expect(offFrontOf({ a: line.b, b: line.a }, camera)).toEqual(straight);
    const lean = (point: { u: number; v: number }) =>
      rotateAbout(point, framePoint(540, 960), degrees(-4));
    const leaning = offFrontOf(
      { a: lean(line.a), b: lean(line.b) },
      { ...camera, plumbTilt: degrees(4) },
    );
    expect(leaning?.by).toBeCloseTo(straight?.by ?? NaN, 9);
  });

  it('is surer from a long line than from two heels', () => {
    const u = (half: number) => offFrontOf(seen(0, half), camera)?.u ?? NaN;
    // 2.4 px at each end, √2 for two, times distance over height
    expect(u(500)).toBeCloseTo(((Math.SQRT2 * 2.4) / 500) * (3000 / 950) * (180 / Math.PI), 6);
    expect(u(100) / u(500)).toBeCloseTo(5, 6);
  });

  it.each([
    ['the scale', { mmPerPx: null }],
    ['the distance', { distanceMm: null }],
    ['the lens height', { lensHeightMm: null }],
    ['a lens above the floor', { lensHeightMm: 0 }],
  ])('is unknown without %s', (_, lack) => {
    expect(offFrontOf(seen(10, 300), { ...camera, ...lack })).toBeNull();
  });

  it('is unknown from touches that are no line across the floor', () => {
    const a = framePoint(500, 1200);
    for (const b of [framePoint(505, 1200), framePoint(560, 1400), a])
      expect(offFrontOf({ a, b }, camera)).toBeNull();
    // the farther one would lie above the horizon of a lens 10 mm up
    const steep = { a: framePoint(500, 1200), b: framePoint(600, 1150) };
    expect(offFrontOf(steep, { ...camera, lensHeightMm: 10 })).toBeNull();
  });
});
