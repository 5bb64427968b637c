import { gradientsOf, innerPatch, samplePatch } from './patch.ts';
import type { Plane } from './plane.ts';
import type { Warp } from './warp.ts';
import { windowOf } from './window.ts';

/** `move`: the patch only moves. `similar`: it may also turn and change its size. */
export type Freedom = 'move' | 'similar';

/**
 * A patch prepared to be found again. Brightness and contrast are taken out beforehand: neither
 * adding a number to the picture nor multiplying it changes what is found.
 */
export interface Template {
  readonly radius: number;
  /** The patch with its mean taken out. */
  readonly values: Float32Array;
  /** The weighted patch with its mean taken out: its product with a patch tells their contrast. */
  readonly weighted: Float32Array;
  readonly window: Float32Array;
  /** Weighted standard deviation, grey values; 0 where the patch is flat. */
  readonly contrast: number;
  /** Per freedom: how the patch changes, weighted, with brightness and contrast taken out. */
  readonly slopes: readonly Float32Array[];
  /** Products of the slopes with one another, row by row. */
  readonly normal: readonly number[];
  /** Sum of the window's squares: one over the number of pixels that count. */
  readonly crowding: number;
  /** The share of the patch that lay within the picture, 0 to 1. */
  readonly within: number;
}

const weightedSum = (values: Float32Array, weights: Float32Array): number => {
  let sum = 0;
  for (let k = 0; k < values.length; k += 1) sum += (values[k] as number) * (weights[k] as number);
  return sum;
};

/** Columns of the patch's change: right, down, larger by a rim's pixel, turned by a rim's pixel. */
const changes = (wide: Float32Array, radius: number, freedom: Freedom): Float32Array[] => {
  const { gx, gy } = gradientsOf(wide, radius);
  if (freedom === 'move') return [gx, gy];
  const larger = new Float32Array(gx.length);
  const turned = new Float32Array(gx.length);
  for (let y = -radius, k = 0; y <= radius; y += 1) {
    for (let x = -radius; x <= radius; x += 1, k += 1) {
      const right = (gx[k] as number) / radius;
      const down = (gy[k] as number) / radius;
      larger[k] = right * x + down * y;
      turned[k] = down * x - right * y;
    }
  }
  return [gx, gy, larger, turned];
};

export const makeTemplate = (
  plane: Plane,
  warp: Warp,
  radius: number,
  freedom: Freedom,
): Template => {
  const wide = new Float32Array((2 * radius + 3) ** 2);
  const within = samplePatch(plane, warp, radius + 1, wide);
  return templateOf(wide, radius, freedom, within);
};

/** From a patch that is one pixel wider on every side. */
export const templateOf = (
  wide: Float32Array,
  radius: number,
  freedom: Freedom,
  within = 1,
): Template => {
  const window = windowOf(radius);
  const values = innerPatch(wide, radius);
  const mean = weightedSum(values, window);
  const weighted = new Float32Array(values.length);
  let variance = 0;
  for (let k = 0; k < values.length; k += 1) {
    const value = (values[k] as number) - mean;
    values[k] = value;
    weighted[k] = value * (window[k] as number);
    variance += value * (weighted[k] as number);
  }
  const columns = changes(wide, radius, freedom);
  const slopes = columns.map((column) => {
    const average = weightedSum(column, window);
    const likeness = variance > 0 ? weightedSum(column, weighted) / variance : 0;
    const slope = new Float32Array(column.length);
    for (let k = 0; k < column.length; k += 1)
      slope[k] =
        ((column[k] as number) - average - likeness * (values[k] as number)) *
        (window[k] as number);
    return slope;
  });
  // a weighted slope times a bare column is the product of both slopes
  const normal = slopes.flatMap((slope) => columns.map((column) => weightedSum(column, slope)));
  let crowding = 0;
  for (const weight of window) crowding += weight * weight;
  return {
    crowding,
    radius,
    values,
    weighted,
    window,
    contrast: Math.sqrt(variance),
    slopes,
    normal,
    within,
  };
};
