import type { FrameIndex } from '#shared/timing/units.ts';
import type { Picture } from './types.ts';

/** Where on a bitmap the frame lies, pixels. */
export interface TilePlace {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** A frame that the browser already holds as a bitmap, whole or as a tile of a larger one. */
export class BitmapPicture implements Picture {
  readonly index: FrameIndex;
  readonly width: number;
  readonly height: number;
  readonly bytes: number;
  readonly verified: boolean;
  readonly #bitmap: ImageBitmap;
  readonly #tile: TilePlace;

  constructor(index: FrameIndex, bitmap: ImageBitmap, tile: TilePlace, verified: boolean) {
    this.index = index;
    this.width = tile.width;
    this.height = tile.height;
    this.bytes = tile.width * tile.height * 4;
    this.verified = verified;
    this.#bitmap = bitmap;
    this.#tile = tile;
  }

  paint(context: CanvasRenderingContext2D, current: () => boolean): Promise<boolean> {
    if (!current()) return Promise.resolve(false);
    const { x, y, width, height } = this.#tile;
    context.drawImage(this.#bitmap, x, y, width, height, 0, 0, width, height);
    return Promise.resolve(true);
  }
}
