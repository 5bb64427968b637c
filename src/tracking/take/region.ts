import type { Grid } from './grid.ts';

/** Cells of one moving body, with the rows and columns they reach over, all inclusive. */
export interface Region {
  readonly cells: Uint8Array;
  readonly count: number;
  readonly top: number;
  readonly bottom: number;
  readonly left: number;
  readonly right: number;
}

/** Cells so far apart still belong together: an arm or a neck hardly moves at its edges. */
const BRIDGED = 2;

const grown = (cells: Uint8Array, columns: number, rows: number): Uint8Array => {
  const out = new Uint8Array(cells.length);
  for (let row = 0; row < rows; row += 1)
    for (let column = 0; column < columns; column += 1) {
      if (cells[row * columns + column] === 0) continue;
      const last = Math.min(columns - 1, column + BRIDGED);
      for (let y = Math.max(0, row - BRIDGED); y <= Math.min(rows - 1, row + BRIDGED); y += 1)
        out.fill(1, y * columns + Math.max(0, column - BRIDGED), y * columns + last + 1);
    }
  return out;
};

/** Cells that hang together with `start`, which are taken out of `open`. */
const pieceFrom = (open: Uint8Array, start: number, columns: number): number[] => {
  const piece = [start];
  open[start] = 0;
  for (let n = 0; n < piece.length; n += 1) {
    const cell = piece[n] as number;
    const column = cell % columns;
    const around = [cell - columns, cell + columns];
    if (column > 0) around.push(cell - 1);
    if (column < columns - 1) around.push(cell + 1);
    for (const next of around)
      if (open[next] === 1) {
        open[next] = 0;
        piece.push(next);
      }
  }
  return piece;
};

/** The largest piece of what moved; null where nothing did. */
export const largestRegion = (moved: Uint8Array, { columns, rows }: Grid): Region | null => {
  const open = grown(moved, columns, rows);
  let largest: number[] = [];
  for (let cell = 0; cell < open.length; cell += 1) {
    if (open[cell] === 0) continue;
    const piece = pieceFrom(open, cell, columns).filter((one) => moved[one] === 1);
    if (piece.length > largest.length) largest = piece;
  }
  if (largest.length === 0) return null;
  const cells = new Uint8Array(moved.length);
  let [top, bottom, left, right] = [rows, -1, columns, -1];
  for (const cell of largest) {
    cells[cell] = 1;
    const [row, column] = [Math.floor(cell / columns), cell % columns];
    [top, bottom] = [Math.min(top, row), Math.max(bottom, row)];
    [left, right] = [Math.min(left, column), Math.max(right, column)];
  }
  return { cells, count: largest.length, top, bottom, left, right };
};
