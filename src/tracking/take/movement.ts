import { changeBetween, movementFrom, usualOf } from './compare.ts';
import type { Grid } from './grid.ts';
import { largestRegion, type Region } from './region.ts';
import { cannotTell, type TakePicture, type Unanswered } from './types.ts';

/** Who moves in a take, where and when. */
export interface Movement {
  readonly grids: readonly Grid[];
  /** From each picture to the next: one fewer than pictures. */
  readonly changes: readonly Float32Array[];
  /** Grey values from which on a cell counts as moved. */
  readonly from: number;
  readonly body: Region;
  /** The share of the body's cells that moved since the picture before; 0 for the first. */
  readonly activity: readonly number[];
}

/** Fewer pictures hold no still stance and no lift. */
const FEWEST = 8;
/** The share of the picture's rim that may change from picture to picture while the phone stands. */
const STEADY_RIM = 0.03;
/** The rim: this share of the columns on each side. */
const RIM = 0.1;
/** Something that changed in one picture alone is a flicker. */
const LEAST_PICTURES = 2;

const cellsMoved = (change: Float32Array, from: number): Uint8Array =>
  Uint8Array.from(change, (grey) => (Math.abs(grey) > from ? 1 : 0));

const shareOf = (cells: Uint8Array, counts: (cell: number) => boolean): number => {
  let [all, on] = [0, 0];
  for (let cell = 0; cell < cells.length; cell += 1) {
    if (!counts(cell)) continue;
    all += 1;
    on += cells[cell] as number;
  }
  return all === 0 ? 0 : on / all;
};

const rimMoves = (moved: readonly Uint8Array[], { columns }: Grid): boolean => {
  const width = Math.max(1, Math.round(RIM * columns));
  const onRim = (cell: number): boolean => {
    const column = cell % columns;
    return column < width || column >= columns - width;
  };
  const shares = moved.map((cells) => shareOf(cells, onRim)).sort((a, b) => a - b);
  return (shares[shares.length >> 1] ?? 0) > STEADY_RIM;
};

export const movementOf = (
  pictures: readonly TakePicture[],
): Movement | { readonly told: 'cannot-tell'; readonly why: Unanswered } => {
  if (pictures.length < FEWEST) return cannotTell('too-few-pictures');
  const grids = pictures.map(({ grid }) => grid);
  const [first] = grids;
  if (!first) return cannotTell('too-few-pictures');
  const changes = grids
    .slice(1)
    .map(({ cells }, n) => changeBetween((grids[n] as Grid).cells, cells));
  const from = movementFrom(changes);
  const moved = changes.map((change) => cellsMoved(change, from));
  if (rimMoves(moved, first)) return cannotTell('camera-moved');
  const usual = usualOf(grids);
  const often = new Uint16Array(first.cells.length);
  for (const { cells } of grids)
    for (const [cell, on] of cellsMoved(changeBetween(usual, cells), from).entries())
      often[cell] = (often[cell] as number) + on;
  const body = largestRegion(
    Uint8Array.from(often, (times) => (times >= LEAST_PICTURES ? 1 : 0)),
    first,
  );
  if (!body) return cannotTell('no-lift');
  const inBody = (cell: number): boolean => body.cells[cell] === 1;
  return {
    ...{ grids, changes, from, body },
    activity: [0, ...moved.map((cells) => shareOf(cells, inBody))],
  };
};
