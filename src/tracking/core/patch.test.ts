import { describe, expect, it } from 'vitest';
import { gradientsOf, innerPatch, samplePatch } from './patch.ts';
import { planeOf, sampleAt } from './plane.ts';
import { atPlace, undo } from './warp.ts';

const picture = planeOf(
  Uint8Array.from([10, 20, 30, 40, 50, 60, 70, 80, 90, 100, 110, 120, 130, 140, 150, 160]),
  4,
  4,
);

describe('samplePatch', () => {
  it('is the pixels themselves at a whole place', () => {
    const out = new Float32Array(9);
    expect(samplePatch(picture, atPlace(1, 1), 1, out)).toBe(1);
    expect([...out]).toEqual([10, 20, 30, 50, 60, 70, 90, 100, 110]);
  });

  it('lies between four pixels at a half', () => {
    const out = new Float32Array(1);
    samplePatch(picture, atPlace(1.5, 1.5), 0, out);
    expect(out[0]).toBe(85);
    expect(sampleAt(picture, 1.5, 1.5)).toBe(85);
  });

  it('turns with the warp', () => {
    const out = new Float32Array(9);
    samplePatch(picture, { c: 0, s: 1, tx: 1, ty: 1 }, 1, out);
    // what lies to the right in the patch lies below in the picture
    expect([...out]).toEqual([30, 70, 110, 20, 60, 100, 10, 50, 90]);
  });

  it('tells how much lies within, and lets the edge go on', () => {
    const out = new Float32Array(9);
    expect(samplePatch(picture, atPlace(0, 0), 1, out)).toBeCloseTo(4 / 9, 12);
    expect([...out]).toEqual([10, 10, 20, 10, 10, 20, 50, 50, 60]);
  });
});

describe('gradientsOf', () => {
  it('is half the difference of both neighbours', () => {
    const wide = Float32Array.from([0, 1, 0, 2, 5, 8, 0, 11, 0]);
    const { gx, gy } = gradientsOf(wide, 0);
    expect([...gx, ...gy]).toEqual([3, 5]);
    expect([...innerPatch(wide, 0)]).toEqual([5]);
  });
});

describe('undo', () => {
  it('takes a move back along the turned axes', () => {
    const warp = undo({ c: 0, s: 1, tx: 10, ty: 20 }, 2, 0, 0, 0);
    expect(warp).toEqual({ c: 0, s: 1, tx: 10, ty: 18 });
  });

  it('takes a growth back', () => {
    const { c, s } = undo(atPlace(0, 0), 0, 0, 0.25, 0);
    expect(c).toBeCloseTo(0.8, 12);
    expect(s).toBeCloseTo(0, 12);
  });
});
