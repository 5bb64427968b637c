import { describe, expect, it } from 'vitest';
import { DepthPicture } from './fill.ts';
import { ShadowMap, TO_LAMP } from './light.ts';
import { type Ring, Surfaces } from './surfaces.ts';

/** An upright post of 100 mm radius around x, y, from the top down. */
const post = (x: number, y: number, top: number): readonly Ring[] =>
  [top, 0].map((z) => ({
    centre: [x, y, z] as const,
    left: [0, 1, 0] as const,
    forward: [1, 0, 0] as const,
    halfWidth: 100,
    front: 100,
    back: 100,
    squareness: 2,
    v: z,
  }));

const filled = (rings: readonly Ring[]): Surfaces => {
  const surfaces = new Surfaces();
  surfaces.tube(rings, 24, 0, 0);
  return surfaces;
};

describe('a tube', () => {
  it('turns every side normal outwards', () => {
    const { points, normals, pointCount } = filled(post(0, 0, 500));
    for (let p = 0; p < pointCount - 2; p += 1) {
      const outward =
        (points[3 * p] ?? 0) * (normals[3 * p] ?? 0) +
        (points[3 * p + 1] ?? 0) * (normals[3 * p + 1] ?? 0);
      expect(outward).toBeGreaterThan(99);
    }
  });
});

describe('a depth picture', () => {
  it('shows the nearer of two surfaces and only what faces the eye', () => {
    const surfaces = filled(post(0, 0, 500));
    const picture = new DepthPicture(60, 60);
    picture.clear({ left: 0, top: 0, right: 60, bottom: 60 });
    // seen from +x without perspective, 10 mm a pixel
    for (let p = 0; p < surfaces.pointCount; p += 1) {
      picture.x[p] = 30 + (surfaces.points[3 * p + 1] ?? 0) / 10;
      picture.y[p] = 55 - (surfaces.points[3 * p + 2] ?? 0) / 10;
      picture.w[p] = surfaces.points[3 * p] ?? 0;
    }
    picture.fill(surfaces);
    expect(picture.near[30 * 60 + 30]).toBeGreaterThan(95);
    expect(picture.owner[30 * 60 + 5]).toBe(-1);
    expect(picture.owner[30 * 60 + 30]).toBeGreaterThanOrEqual(0);
  });
});

describe('the lamp', () => {
  const map = new ShadowMap();
  map.draw(filled(post(0, 0, 1500)));

  it('does not reach the floor behind a post, seen along its own light', () => {
    const away = 900 / TO_LAMP[2];
    const [x, y] = [-TO_LAMP[0] * away, -TO_LAMP[1] * away];
    expect(map.lit(x, y, 0, 5, false, 3)).toBe(0);
  });

  it('reaches the floor between itself and the post, and far aside', () => {
    expect(map.lit(TO_LAMP[0] * 600, TO_LAMP[1] * 600, 0, 5, false, 3)).toBe(1);
    expect(map.lit(0, 1900, 0, 5, true, 0)).toBe(1);
  });
});
