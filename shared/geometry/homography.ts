import { type FramePoint, framePoint } from './points.ts';

/** A point on the floor, metres: x to the image right, z away from the camera. */
export interface FloorPoint {
  readonly x: number;
  readonly z: number;
}

const UNKNOWNS = 8;

/** Gaussian elimination with row exchange; null where the rows do not determine the unknowns. */
const eliminate = (rows: number[][]): number[] | null => {
  const n = rows.length;
  for (let column = 0; column < n; column += 1) {
    const candidates = rows.slice(column).map((row) => Math.abs(row[column] ?? 0));
    const pivotAt = column + candidates.indexOf(Math.max(...candidates));
    const pivot = rows[pivotAt];
    const top = rows[column];
    if (!pivot || !top || !(Math.abs(pivot[column] ?? 0) > 1e-12)) return null;
    rows[pivotAt] = top;
    rows[column] = pivot;
    for (const [i, row] of rows.entries()) {
      if (i === column) continue;
      const factor = (row[column] ?? 0) / (pivot[column] ?? NaN);
      for (let k = column; k <= n; k += 1) row[k] = (row[k] ?? 0) - factor * (pivot[k] ?? 0);
    }
  }
  return rows.map((row, i) => (row[n] ?? NaN) / (row[i] ?? NaN));
};

/**
 * Where a point of the picture lies on the floor, from four floor points seen in the picture, no
 * three of them in a line. Null where they do not determine the floor; the map gives null on and
 * beyond the horizon.
 */
export const floorMap = (
  seen: readonly FramePoint[],
  floor: readonly FloorPoint[],
): ((point: FramePoint) => FloorPoint | null) | null => {
  if (seen.length !== 4 || floor.length !== 4) return null;
  // pixels of the order of one keep the elimination well conditioned
  const size = Math.max(...seen.map(({ u, v }) => Math.max(Math.abs(u), Math.abs(v))));
  if (!(size > 0) || !Number.isFinite(size)) return null;
  const scaled = seen.map(({ u, v }) => framePoint(u / size, v / size));
  const rows: number[][] = [];
  for (const [i, { u, v }] of scaled.entries()) {
    const { x, z } = floor[i] ?? { x: NaN, z: NaN };
    rows.push([u, v, 1, 0, 0, 0, -u * x, -v * x, x]);
    rows.push([0, 0, 0, u, v, 1, -u * z, -v * z, z]);
  }
  const h = eliminate(rows);
  if (h?.length !== UNKNOWNS || !h.every(Number.isFinite)) return null;
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, k = 0] = h;
  const side = (point: FramePoint): number => g * point.u + k * point.v + 1;
  const front = Math.sign(scaled.reduce((sum, point) => sum + side(point), 0));
  return (point) => {
    const { u, v } = framePoint(point.u / size, point.v / size);
    const depth = side({ u, v });
    if (Math.sign(depth) !== front || Math.abs(depth) < 1e-9) return null;
    return { x: (a * u + b * v + c) / depth, z: (d * u + e * v + f) / depth };
  };
};
