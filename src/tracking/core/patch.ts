import type { Plane } from './plane.ts';
import type { Warp } from './warp.ts';

/**
 * The square patch of (2·radius + 1)² values that the warp finds in the plane, row by row, into
 * `out`. Beyond the picture its edge goes on. Answers the share of it that lies within, 0 to 1.
 */
export const samplePatch = (
  plane: Plane,
  warp: Warp,
  radius: number,
  out: Float32Array,
): number => {
  const { data, width, height, stride } = plane;
  const { c, s, tx, ty } = warp;
  const size = 2 * radius + 1;
  const lastX = width - 1;
  const lastY = height - 1;
  const lastColumn = Math.max(0, width - 2);
  const lastRow = Math.max(0, height - 2);
  const right = width > 1 ? 1 : 0;
  const below = height > 1 ? stride : 0;
  let within = 0;
  let k = 0;
  for (let py = -radius; py <= radius; py += 1) {
    let x = tx - c * radius - s * py;
    let y = ty - s * radius + c * py;
    for (let n = 0; n < size; n += 1, k += 1, x += c, y += s) {
      let cx = x;
      let cy = y;
      if (x >= 0 && y >= 0 && x <= lastX && y <= lastY) within += 1;
      else {
        cx = x < 0 ? 0 : x > lastX ? lastX : x;
        cy = y < 0 ? 0 : y > lastY ? lastY : y;
      }
      // towards zero is downwards here
      let column = cx | 0;
      let row = cy | 0;
      if (column > lastColumn) column = lastColumn;
      if (row > lastRow) row = lastRow;
      const fx = cx - column;
      const fy = cy - row;
      const at = row * stride + column;
      const a = data[at] as number;
      const b = data[at + right] as number;
      const d = data[at + below] as number;
      const e = data[at + below + right] as number;
      const top = a + fx * (b - a);
      out[k] = top + fy * (d + fx * (e - d) - top);
    }
  }
  return within / (size * size);
};

/** The middle (2·radius + 1)² of a patch that is one pixel wider on every side. */
export const innerPatch = (wide: Float32Array, radius: number): Float32Array => {
  const size = 2 * radius + 1;
  const out = new Float32Array(size * size);
  for (let row = 0; row < size; row += 1) {
    const from = (row + 1) * (size + 2) + 1;
    out.set(wide.subarray(from, from + size), row * size);
  }
  return out;
};

export interface Gradients {
  readonly gx: Float32Array;
  readonly gy: Float32Array;
}

/** Half the difference of the neighbours on both sides, of the middle of a patch one pixel wider. */
export const gradientsOf = (wide: Float32Array, radius: number): Gradients => {
  const size = 2 * radius + 1;
  const row = size + 2;
  const gx = new Float32Array(size * size);
  const gy = new Float32Array(size * size);
  for (let y = 0, k = 0; y < size; y += 1) {
    for (let x = 0; x < size; x += 1, k += 1) {
      const at = (y + 1) * row + x + 1;
      gx[k] = ((wide[at + 1] as number) - (wide[at - 1] as number)) / 2;
      gy[k] = ((wide[at + row] as number) - (wide[at - row] as number)) / 2;
    }
  }
  return { gx, gy };
};
