import type { Grid } from './grid.ts';

export const middleOf = (values: ArrayLike<number>): number => {
  const sorted = Float32Array.from(values).sort();
  return sorted[sorted.length >> 1] ?? NaN;
};

/** Of all cells every seventh tells the middle as well, and columns of any width are met evenly. */
const ONE_IN = 7;
const sampleOf = (values: Float32Array): Float32Array =>
  Float32Array.from(
    { length: Math.ceil(values.length / ONE_IN) },
    (_, n) => values[n * ONE_IN] as number,
  );

/** Cell by cell from one picture to another, less what changed everywhere: a camera evens out its exposure. */
export const changeBetween = (from: Grid['cells'], to: Grid['cells']): Float32Array => {
  const change = new Float32Array(to.length);
  for (let n = 0; n < change.length; n += 1) change[n] = (to[n] as number) - (from[n] as number);
  const everywhere = middleOf(sampleOf(change));
  for (let n = 0; n < change.length; n += 1) change[n] = (change[n] as number) - everywhere;
  return change;
};

/** Grey values under which a cell's change is taken for compression, however quiet the pictures are. */
const LEAST_CHANGE = 4;
/** Changes beyond so many standard deviations of the noise are movement. */
const BEYOND_NOISE = 6;

/**
 * The change of a cell that counts as movement. The noise comes from the pictures themselves: most of a
 * picture is background, so the middle of all changes is noise, not movement.
 */
export const movementFrom = (changes: readonly Float32Array[]): number => {
  const every = changes.map((change) => middleOf(sampleOf(change).map(Math.abs)));
  return Math.max(LEAST_CHANGE, BEYOND_NOISE * 1.4826 * middleOf(every));
};

/** The usual picture: of each cell the middle value. */
export const usualOf = (grids: readonly Grid[]): Float32Array => {
  const [first] = grids;
  if (!first) throw new RangeError('No picture is no usual picture.');
  const column = new Float32Array(grids.length);
  return first.cells.map((_, cell) => {
    for (const [n, { cells }] of grids.entries()) column[n] = cells[cell] as number;
    return middleOf(column);
  });
};
