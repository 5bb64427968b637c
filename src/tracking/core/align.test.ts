import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seededRandom } from '../../../docker-free-scripts/demo-clips/model/random.ts';
import { align, compare } from './align.ts';
import { type Plane, planeOf } from './plane.ts';
import { makeTemplate } from './template.ts';
import { atPlace } from './warp.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718, numRuns: 60 });

interface Wave {
  readonly kx: number;
  readonly ky: number;
  readonly phase: number;
}

const random = seededRandom(7);
const WAVES: Wave[] = Array.from({ length: 14 }, () => ({
  kx: (random() - 0.5) * 0.7,
  ky: (random() - 0.5) * 0.7,
  phase: random() * 6.28,
}));

const SIZE = 96;
/** A texture that is known between the pixels too, moved, with another brightness and contrast. */
const cloth = (dx: number, dy: number, gain = 1, bias = 0): Plane =>
  planeOf(
    Float32Array.from({ length: SIZE * SIZE }, (_, k) => {
      const x = (k % SIZE) - dx;
      const y = Math.floor(k / SIZE) - dy;
      const grey = WAVES.reduce((sum, w) => sum + 6 * Math.sin(w.kx * x + w.ky * y + w.phase), 120);
      return gain * grey + bias;
    }),
    SIZE,
    SIZE,
  );

const MIDDLE = atPlace(48, 48);
const still = makeTemplate(cloth(0, 0), MIDDLE, 12, 'move');
const free = makeTemplate(cloth(0, 0), MIDDLE, 17, 'similar');

const shift = fc.double({ min: -3, max: 3, noNaN: true });

describe('align', () => {
  it('finds a known shift to a twentieth of a pixel', () => {
    fc.assert(
      fc.property(shift, shift, (dx, dy) => {
        for (const template of [still, free]) {
          const found = align(cloth(dx, dy), template, MIDDLE, 8);
          expect(found?.correlation).toBeGreaterThan(0.99);
          expect(
            Math.hypot((found?.warp.tx ?? NaN) - 48 - dx, (found?.warp.ty ?? NaN) - 48 - dy),
          ).toBeLessThan(0.05);
        }
      }),
    );
  });

  it('does not care for brightness and contrast', () => {
    fc.assert(
      fc.property(
        shift,
        shift,
        fc.double({ min: 0.4, max: 1.6, noNaN: true }),
        fc.double({ min: -60, max: 60, noNaN: true }),
        (dx, dy, gain, bias) => {
          const plain = align(cloth(dx, dy), free, MIDDLE, 8);
          const other = align(cloth(dx, dy, gain, bias), free, MIDDLE, 8);
          expect(other?.warp.tx).toBeCloseTo(plain?.warp.tx ?? NaN, 3);
          expect(other?.warp.ty).toBeCloseTo(plain?.warp.ty ?? NaN, 3);
          expect(other?.gain).toBeCloseTo(gain * (plain?.gain ?? NaN), 2);
        },
      ),
    );
  });

  it('has no answer on a flat patch', () => {
    const flat = planeOf(new Uint8Array(SIZE * SIZE).fill(120), SIZE, SIZE);
    expect(
      align(cloth(0, 0), makeTemplate(flat, MIDDLE, 12, 'move'), MIDDLE, 8)?.correlation ?? 0,
    ).toBe(0);
    expect(align(flat, still, MIDDLE, 8)?.correlation ?? 0).toBe(0);
  });

  it('has no answer where it would run away', () => {
    const found = align(cloth(6, 0), still, MIDDLE, 1);
    expect(found === null || Math.abs(found.warp.tx - 48) <= 1).toBe(true);
  });

  it('never lets a NaN out, whatever the pixels and wherever the start', () => {
    const bytes = fc.uint8Array({ minLength: 400, maxLength: 400 });
    const place = fc.double({ min: -60, max: 80, noNaN: true });
    fc.assert(
      fc.property(bytes, bytes, place, place, (a, b, x, y) => {
        const template = makeTemplate(planeOf(a, 20, 20), atPlace(10, 10), 6, 'similar');
        const found = align(planeOf(b, 20, 20), template, atPlace(x, y), 9);
        if (!found) return;
        const { warp, correlation, gain, within } = found;
        for (const value of [warp.c, warp.s, warp.tx, warp.ty, correlation, gain, within])
          expect(Number.isFinite(value)).toBe(true);
      }),
    );
  });
});

describe('compare', () => {
  it('is 1 with itself, −1 with its negative and 0 with nothing', () => {
    expect(compare(cloth(0, 0), still, MIDDLE).correlation).toBeCloseTo(1, 6);
    expect(compare(cloth(0, 0, -1, 255), still, MIDDLE).correlation).toBeCloseTo(-1, 6);
    const flat = planeOf(new Uint8Array(SIZE * SIZE), SIZE, SIZE);
    expect(compare(flat, still, MIDDLE).correlation).toBe(0);
  });
});
