import type { Plane } from '../core/plane.ts';

/** Mean grey of square cells, row by row: coarse enough that sensor noise and sway within a cell vanish. */
export interface Grid {
  readonly cells: Float32Array;
  readonly columns: number;
  readonly rows: number;
}

/** Cells along the picture's long edge. At 3 m a cell is some 25 mm of the body. */
const LONG_EDGE = 120;

/** Cells that would reach beyond the right or lower border are narrower, never left out. */
export const gridOf = ({ data, width, height, stride }: Plane): Grid => {
  const size = Math.max(1, Math.max(width, height) / LONG_EDGE);
  const columns = Math.max(1, Math.round(width / size));
  const rows = Math.max(1, Math.round(height / size));
  const cells = new Float32Array(columns * rows);
  const edge = (n: number, count: number, length: number): number =>
    Math.min(length, Math.round((n * length) / count));
  for (let row = 0; row < rows; row += 1) {
    const [top, bottom] = [edge(row, rows, height), edge(row + 1, rows, height)];
    for (let column = 0; column < columns; column += 1) {
      const [left, right] = [edge(column, columns, width), edge(column + 1, columns, width)];
      let sum = 0;
      for (let y = top; y < bottom; y += 1)
        for (let x = left; x < right; x += 1) sum += data[y * stride + x] as number;
      cells[row * columns + column] = sum / Math.max(1, (bottom - top) * (right - left));
    }
  }
  return { cells, columns, rows };
};
