import { describe, expect, it } from 'vitest';
import { dotAt } from './dot.ts';
import { outlineOf } from './outline.ts';
import { planeOf } from './plane.ts';

const SIZE = 61;
const FINE = 8;
/** Every pixel is the mean of 64 places in it, as a lens sees an edge. */
const pictureOf = (inside: (x: number, y: number) => boolean, ink = 40, paper = 180) => {
  const data = new Uint8Array(SIZE * SIZE);
  for (let k = 0; k < data.length; k += 1) {
    let hits = 0;
    for (let n = 0; n < FINE * FINE; n += 1) {
      const x = (k % SIZE) - 0.5 + ((n % FINE) + 0.5) / FINE;
      const y = Math.floor(k / SIZE) - 0.5 + (Math.floor(n / FINE) + 0.5) / FINE;
      if (inside(x, y)) hits += 1;
    }
    data[k] = Math.round(paper + ((ink - paper) * hits) / (FINE * FINE));
  }
  return planeOf(data, SIZE, SIZE);
};
const CENTRE = { x: 30.3, y: 28.6 };
const round =
  (radius: number, { x: cx, y: cy } = CENTRE) =>
  (x: number, y: number) =>
    Math.hypot(x - cx, y - cy) < radius;

describe('a round sticker', () => {
  it.each([
    ['dark', 7, 40, 180],
    ['dark', 3.5, 40, 180],
    ['light', 9, 220, 90],
  ] as const)('%s, %s px: its middle to a twentieth of a pixel', (tone, radius, ink, paper) => {
    const dot = dotAt(pictureOf(round(radius), ink, paper), { x: 33, y: 26 });
    expect(dot?.tone).toBe(tone);
    expect(Math.abs((dot?.centre.x ?? NaN) - CENTRE.x)).toBeLessThan(0.05);
    expect(Math.abs((dot?.centre.y ?? NaN) - CENTRE.y)).toBeLessThan(0.05);
    expect(Math.abs((dot?.radius ?? NaN) - radius)).toBeLessThan(0.25);
  });

  it('has an even edge all around; seen aslant it is oval by as much as it is', () => {
    const plain = outlineOf(pictureOf(round(8)), CENTRE, 8);
    expect(plain?.share).toBe(1);
    expect(plain?.rough).toBeLessThan(0.1);
    expect(plain?.oval).toBeLessThan(0.02);
    const aslant = (x: number, y: number) =>
      Math.hypot((x - CENTRE.x) / 10, (y - CENTRE.y) / 8) < 1;
    expect(outlineOf(pictureOf(aslant), CENTRE, 9)?.oval).toBeCloseTo(1 / 9, 1);
  });

  it('is none where it is a bar, an edge, or nothing', () => {
    const touch = { x: 31, y: 29 };
    expect(
      dotAt(
        pictureOf((x) => Math.abs(x - 30) < 4),
        touch,
      ),
    ).toBeNull();
    expect(
      dotAt(
        pictureOf((x) => x < 30),
        touch,
      ),
    ).toBeNull();
    expect(
      dotAt(
        pictureOf(() => false),
        touch,
      ),
    ).toBeNull();
  });

  it('is none where it lies too far from the touch', () => {
    expect(dotAt(pictureOf(round(5, { x: 50, y: 50 })), { x: 15, y: 15 })).toBeNull();
  });
});
