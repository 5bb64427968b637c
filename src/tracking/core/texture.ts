import type { RefusalCode } from '../types.ts';
import { gradientsOf, samplePatch } from './patch.ts';
import type { Plane } from './plane.ts';
import { pyramidAround, toLevelX, toLevelY } from './pyramid.ts';
import { eigenvalues } from './solve.ts';
import { atPlace } from './warp.ts';
import { windowOf } from './window.ts';

/** Compressed film is smooth where it is wrong: less noise than this is not believed, grey values. */
const LEAST_NOISE = 1;
const NOISE_RADIUS = 40;

/**
 * Noise about a place, standard deviation in grey values: the median of what a mask that answers
 * nothing to planes and edges finds (Immerkær's, made robust against texture by the median).
 */
export const noiseAround = (plane: Plane, x: number, y: number): number => {
  const { data, width, height, stride } = plane;
  const left = Math.max(1, Math.round(x) - NOISE_RADIUS);
  const right = Math.min(width - 2, Math.round(x) + NOISE_RADIUS);
  const top = Math.max(1, Math.round(y) - NOISE_RADIUS);
  const bottom = Math.min(height - 2, Math.round(y) + NOISE_RADIUS);
  const found: number[] = [];
  for (let row = top; row <= bottom; row += 2) {
    for (let column = left; column <= right; column += 2) {
      const at = row * stride + column;
      const p = (dy: number, dx: number): number => data[at + dy * stride + dx] as number;
      const corners = p(-1, -1) + p(-1, 1) + p(1, -1) + p(1, 1);
      const sides = p(-1, 0) + p(1, 0) + p(0, -1) + p(0, 1);
      found.push(Math.abs(corners - 2 * sides + 4 * p(0, 0)));
    }
  }
  if (found.length === 0) return LEAST_NOISE;
  found.sort((a, b) => a - b);
  const median = found[found.length >> 1] as number;
  // the mask multiplies the noise by 6; 0.6745 deviations are the median of a normal spread
  return Math.max(LEAST_NOISE, median / 0.6745 / 6);
};

export interface Texture {
  /** How well a place can be held along the worse and the better direction: one deviation, pixels. */
  readonly worst: number;
  readonly best: number;
}

/** Neighbouring pixels err alike: that many are worth one. */
const ALIKE_PIXELS = 2;
/** What is left of noise of variance 1 on the level of half the size: a mean of four. */
const HALVED_NOISE = 1 / 4;

/**
 * What the slopes of a patch say against the noise, taken on the level of half the size, where most
 * of the noise is smoothed away. What is left of it has slopes too: they are taken off first.
 */
export const textureAt = (
  plane: Plane,
  x: number,
  y: number,
  radius: number,
  noise: number,
): Texture => {
  const level = pyramidAround(plane, x, y, radius + 8, 2)[1];
  if (!level) return { worst: Infinity, best: Infinity };
  const half = Math.max(2, Math.round(radius / level.scale));
  const wide = new Float32Array((2 * half + 3) ** 2);
  samplePatch(level.plane, atPlace(toLevelX(level, x), toLevelY(level, y)), half + 1, wide);
  const { gx, gy } = gradientsOf(wide, half);
  const window = windowOf(half);
  let [xx, xy, yy, squares] = [0, 0, 0, 0];
  for (let k = 0; k < gx.length; k += 1) {
    const weight = window[k] as number;
    const a = gx[k] as number;
    const b = gy[k] as number;
    xx += weight * a * a;
    xy += weight * a * b;
    yy += weight * b * b;
    squares += weight * weight;
  }
  const variance = noise * noise * HALVED_NOISE;
  const own = variance / 2;
  const [low, high] = eigenvalues(xx, xy, yy);
  const deviation = (slope: number): number =>
    slope > own
      ? level.scale * Math.sqrt((ALIKE_PIXELS * squares * variance) / (slope - own))
      : Infinity;
  return { worst: deviation(low), best: deviation(high) };
};

/** The loosest hold that is followed, pixels; set on rendered cloth of known truth. */
const LOOSEST = 0.35;

/** Held so much worse one way than the other, and no better than this there, pixels: it slides along an edge. */
const ONE_WAY = 7;
const SLIDES_FROM = 0.1;

/**
 * Whether a mark here would slide along an edge, such as the outline of a bare limb: it can be followed, and what is
 * found has to be looked at.
 */
export const slidesAt = (plane: Plane, x: number, y: number, radius: number): boolean => {
  const { worst, best } = textureAt(plane, x, y, radius, noiseAround(plane, x, y));
  return worst > SLIDES_FROM && worst > ONE_WAY * best && Number.isFinite(best);
};

/** Why a place cannot be followed; null where it can. */
export const refusalAt = (
  plane: Plane,
  x: number,
  y: number,
  radius: number,
): RefusalCode | null => {
  if (!(x >= -0.5 && y >= -0.5 && x <= plane.width - 0.5 && y <= plane.height - 0.5))
    return 'outside';
  const border = radius / 2;
  if (x < border || y < border || x > plane.width - 1 - border || y > plane.height - 1 - border)
    return 'at-the-border';
  const { worst, best } = textureAt(plane, x, y, radius, noiseAround(plane, x, y));
  if (worst <= LOOSEST) return null;
  return best <= LOOSEST / 3 ? 'only-an-edge' : 'nothing-to-hold-on-to';
};
