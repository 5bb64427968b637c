import type { ClipWithFrames } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { addressOf } from './client.ts';
import type { Size } from '#src/canvas/viewport.ts';
import type { ClipSource, SheetLayout } from '#src/video/types.ts';

/** How the server cuts sheets: six tiles a row, five rows, tiles of 960 px or less, even edges. */
const COLUMNS = 6;
const ROWS = 5;
const TILE_LONG_EDGE = 960;
const SHEET_PIXELS = 16_000_000;

const fitEven = (size: Size, longEdge: number): Size => {
  const factor = Math.min(1, longEdge / Math.max(size.width, size.height));
  const even = (edge: number) => Math.max(2, Math.floor((edge * factor) / 2 + 1e-9) * 2);
  return { width: even(size.width), height: even(size.height) };
};

export const tileSize = (copy: Size): Size => {
  const byEdge = fitEven(copy, TILE_LONG_EDGE);
  const area = SHEET_PIXELS / (COLUMNS * ROWS);
  const factor = Math.sqrt(Math.min(1, area / (byEdge.width * byEdge.height)));
  return fitEven(byEdge, Math.floor(Math.max(byEdge.width, byEdge.height) * factor));
};

const sheetsOf = (clipId: string, copy: Size): SheetLayout => {
  const tile = tileSize(copy);
  return {
    sheetUrl: (n) => addressOf(routes.clipSheet, { params: { id: clipId, index: n } }),
    framesPerSheet: COLUMNS * ROWS,
    columns: COLUMNS,
    tileWidth: tile.width,
    tileHeight: tile.height,
  };
};

export const clipSourceOf = (
  clip: ClipWithFrames,
  copy: Size,
  times: readonly Milliseconds[],
): ClipSource => ({
  url: addressOf(routes.clipVideo, { params: { id: clip.id } }),
  frameTable: times,
  width: copy.width,
  height: copy.height,
  sheets: sheetsOf(clip.id, copy),
});

export const fullFrameUrl = (clipId: string, index: number): string =>
  addressOf(routes.clipFrame, { params: { id: clipId, index } });
export const stripUrl = (clipId: string): string =>
  addressOf(routes.clipStrip, { params: { id: clipId } });

/** Which frame each picture of the strip shows: the middle of each of equal spans, 24 at most. */
export const stripFrames = (frames: number): number[] => {
  const count = Math.min(24, frames);
  return Array.from({ length: count }, (_, n) => Math.floor(((n + 0.5) * frames) / count));
};
