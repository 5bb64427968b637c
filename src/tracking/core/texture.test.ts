import { describe, expect, it } from 'vitest';
import { planeOf } from './plane.ts';
import { noiseAround, refusalAt, slidesAt, textureAt } from './texture.ts';

const SIZE = 121;
const AT = 60;
const pictureOf = (grey: (x: number, y: number) => number) =>
  planeOf(
    Uint8Array.from({ length: SIZE * SIZE }, (_, k) => grey(k % SIZE, Math.floor(k / SIZE))),
    SIZE,
    SIZE,
  );
const refusalOf = (grey: (x: number, y: number) => number, x = AT, y = AT) =>
  refusalAt(pictureOf(grey), x, y, 17);

const slides = (grey: (x: number, y: number) => number) => slidesAt(pictureOf(grey), AT, AT, 17);

const edge = (x: number) => (x < AT ? 60 : 160);
const dot = (x: number, y: number) => (Math.hypot(x - AT, y - AT) < 7 ? 40 : 180);

describe('the noise about a place', () => {
  it('is never believed to be less than one grey value', () => {
    expect(
      noiseAround(
        pictureOf(() => 90),
        AT,
        AT,
      ),
    ).toBe(1);
    // a slope answers nothing: 1 − 2 + 1 each way
    expect(
      noiseAround(
        pictureOf((x, y) => x + y),
        AT,
        AT,
      ),
    ).toBe(1);
  });

  it('of checks of 90 and 100: each mask answers 8 · 10', () => {
    const checks = pictureOf((x, y) => ((x + y) % 2 === 0 ? 90 : 100));
    expect(noiseAround(checks, AT, AT)).toBeCloseTo(80 / 0.6745 / 6, 10);
  });
});

describe('what a place can be held by', () => {
  it('an edge holds it one way only', () => {
    const { worst, best } = textureAt(pictureOf(edge), AT, AT, 17, 1);
    expect(worst).toBe(Infinity);
    expect(best).toBeLessThan(0.02);
  });

  it('a dot holds it both ways alike', () => {
    const { worst, best } = textureAt(pictureOf(dot), AT, AT, 17, 1);
    expect(worst).toBeLessThan(0.02);
    expect(worst / best).toBeLessThan(1.05);
  });

  it('noise twice as large holds half as well', () => {
    const [one, two] = [1, 2].map((noise) => textureAt(pictureOf(dot), AT, AT, 17, noise).worst);
    expect((two ?? NaN) / (one ?? NaN)).toBeCloseTo(2, 1);
  });
});

describe('a place that cannot be followed', () => {
  it('says why', () => {
    expect(refusalOf(dot)).toBeNull();
    expect(refusalOf(() => 120)).toBe('nothing-to-hold-on-to');
    expect(refusalOf(edge)).toBe('only-an-edge');
    expect(refusalOf(dot, -1, 10)).toBe('outside');
    expect(refusalOf(dot, 8, 60)).toBe('at-the-border');
  });

  it('is not an edge with faint shading, but a mark would slide along it', () => {
    // the outline of a bare limb: a grey value or two of shading in eight pixels along it
    const limb = (x: number, y: number) => edge(x) + (x < AT ? Math.round(6 * Math.sin(y / 8)) : 0);
    expect(refusalOf(limb)).toBeNull();
    expect(slides(limb)).toBe(true);
  });

  it('is not an edge along which a print holds it', () => {
    const print = (x: number, y: number) => edge(x) + 25 * Math.round(Math.sin(y / 3));
    expect(refusalOf(print)).toBeNull();
    expect(slides(print)).toBe(false);
    expect(slides(dot)).toBe(false);
  });
});
