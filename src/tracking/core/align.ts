import { samplePatch } from './patch.ts';
import type { Plane } from './plane.ts';
import { solveSymmetric } from './solve.ts';
import type { Template } from './template.ts';
import { scaleOf, undo, type Warp } from './warp.ts';

export interface Aligned {
  readonly warp: Warp;
  /** Likeness of patch and picture there, −1 to 1, whatever their brightness and contrast. */
  readonly correlation: number;
  /** The picture's contrast over the patch's. */
  readonly gain: number;
  /** The share of the patch that lies within the picture, 0 to 1. */
  readonly within: number;
}

/** Flatter than this, there is nothing to compare, grey values. */
const LEAST_CONTRAST = 0.3;
/** Steps smaller than this change nothing that could be seen, pixels. */
const SETTLED = 0.004;
/** Noise and unlikeness to reckon with, grey values: how strongly size and turn are held. */
const DOUBT = 3;
/** How far the rim of a patch turns or grows between two pictures, pixels (one standard deviation). */
const RIM_CHANGE = 1;

/** One buffer per size of patch: aligning happens thousands of times a second. */
const buffers = new Map<number, Float32Array>();
const bufferFor = (length: number): Float32Array => {
  const known = buffers.get(length) ?? new Float32Array(length);
  buffers.set(length, known);
  return known;
};

interface Look {
  readonly correlation: number;
  readonly gain: number;
  readonly within: number;
  /** What lies there; overwritten by the next look. */
  readonly patch: Float32Array;
}

/** Weighted products of the patch with the template's slopes: where it would rather be. */
const pullsOf = ({ slopes }: Template, patch: Float32Array): number[] => {
  const [right, down, larger, turned] = slopes;
  if (!right || !down) return [];
  let [a, b, c, d] = [0, 0, 0, 0];
  if (larger && turned)
    for (let k = 0; k < patch.length; k += 1) {
      const value = patch[k] as number;
      a += (right[k] as number) * value;
      b += (down[k] as number) * value;
      c += (larger[k] as number) * value;
      d += (turned[k] as number) * value;
    }
  else
    for (let k = 0; k < patch.length; k += 1) {
      const value = patch[k] as number;
      a += (right[k] as number) * value;
      b += (down[k] as number) * value;
    }
  return larger ? [a, b, c, d] : [a, b];
};

const lookAt = (plane: Plane, template: Template, warp: Warp): Look => {
  const { window, weighted, contrast, radius } = template;
  const patch = bufferFor(window.length);
  const within = samplePatch(plane, warp, radius, patch);
  let sum = 0;
  let squares = 0;
  let product = 0;
  for (let k = 0; k < patch.length; k += 1) {
    const value = patch[k] as number;
    const share = value * (window[k] as number);
    sum += share;
    squares += share * value;
    product += value * (weighted[k] as number);
  }
  const spread = Math.sqrt(Math.max(0, squares - sum * sum));
  const seen = contrast > LEAST_CONTRAST && spread > LEAST_CONTRAST;
  return {
    correlation: seen ? Math.min(1, Math.max(-1, product / (contrast * spread))) : 0,
    gain: seen ? product / (contrast * contrast) : 0,
    within,
    patch,
  };
};

/** Likeness of the template to the picture where the warp puts it. */
export const compare = (plane: Plane, template: Template, warp: Warp): Aligned => {
  return { ...pick(lookAt(plane, template, warp)), warp };
};

const pick = ({ correlation, gain, within }: Look): Omit<Aligned, 'warp'> => ({
  correlation,
  gain,
  within,
});

/**
 * Finds the template near `start` by going downhill (inverse-compositional: what depends on the
 * template alone was prepared with it). Where size and turn are free they are held softly at those
 * of `start`, because a round dot on plain ground does not tell how it is turned.
 * Null where nothing determines the place or it runs away by more than `reach` pixels.
 */
export const align = (
  plane: Plane,
  template: Template,
  start: Warp,
  reach: number,
  steps = 12,
): Aligned | null => {
  const { normal, slopes, radius } = template;
  const count = slopes.length;
  const hold = (template.crowding * DOUBT * DOUBT) / (RIM_CHANGE * RIM_CHANGE);
  const held = normal.map((value, k) =>
    k % (count + 1) === 0 && k >= 2 * count ? value + hold : value,
  );
  let warp = start;
  let now = lookAt(plane, template, warp);
  let best: Aligned = { ...pick(now), warp };
  for (let n = 0; n < steps; n += 1) {
    if (!(now.gain > 0.05)) break;
    const right = pullsOf(template, now.patch).map((pull) => pull / now.gain);
    if (count === 4) {
      const c = warp.c * start.c + warp.s * start.s;
      const s = warp.s * start.c - warp.c * start.s;
      const larger = Math.log(scaleOf(warp) / scaleOf(start));
      right[2] = (right[2] ?? 0) + hold * larger * radius;
      right[3] = (right[3] ?? 0) + hold * Math.atan2(s, c) * radius;
    }
    const step = solveSymmetric(held, right);
    if (!step) return null;
    const [dx = 0, dy = 0, larger = 0, turned = 0] = step;
    warp = undo(warp, dx, dy, larger / radius, turned / radius);
    if (!(Math.hypot(warp.tx - start.tx, warp.ty - start.ty) <= reach)) return null;
    now = lookAt(plane, template, warp);
    if (now.correlation >= best.correlation) best = { ...pick(now), warp };
    if (Math.hypot(dx, dy) < SETTLED && Math.hypot(larger, turned) < 4 * SETTLED) break;
  }
  return Number.isFinite(best.correlation) ? best : null;
};
