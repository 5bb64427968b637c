import type { FrameIndex } from '#shared/timing/units.ts';
import type { TilePlace } from './bitmap-picture.ts';
import type { SheetLayout } from './types.ts';

/** On which sheet a frame lies, and where. */
export const tileOf = (
  layout: SheetLayout,
  index: FrameIndex,
): { readonly sheet: number; readonly tile: TilePlace } => {
  const { framesPerSheet, columns, tileWidth: width, tileHeight: height } = layout;
  const sheet = Math.floor(index / framesPerSheet);
  const within = index - sheet * framesPerSheet;
  const x = (within % columns) * width;
  const y = Math.floor(within / columns) * height;
  return { sheet, tile: { x, y, width, height } };
};

export const sheetCount = (layout: SheetLayout, frameCount: number): number =>
  Math.ceil(frameCount / layout.framesPerSheet);
