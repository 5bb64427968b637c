import type { FrameIndex } from '#shared/timing/units.ts';
import type { Picture } from './types.ts';

/** `convert`: the browser converts to RGBA in memory, then puts the pixels. `draw`: drawImage. */
export type PaintMethod = 'convert' | 'draw';

/** RGBA buffers used one at a time per paint; two cover a clip and its magnifier. */
const spare: Uint8ClampedArray<ArrayBuffer>[] = [];
const SPARE_KEPT = 2;

const takeBuffer = (bytes: number): Uint8ClampedArray<ArrayBuffer> => {
  const at = spare.findIndex((buffer) => buffer.length === bytes);
  return spare.splice(at, at < 0 ? 0 : 1)[0] ?? new Uint8ClampedArray(bytes);
};

const giveBuffer = (buffer: Uint8ClampedArray<ArrayBuffer>): void => {
  spare.unshift(buffer);
  spare.length = Math.min(spare.length, SPARE_KEPT);
};

const paintConverted = async (
  frame: VideoFrame,
  context: CanvasRenderingContext2D,
  current: () => boolean,
): Promise<boolean> => {
  const { displayWidth: width, displayHeight: height } = frame;
  const buffer = takeBuffer(width * height * 4);
  try {
    await frame.copyTo(buffer, { format: 'RGBA' });
    if (!current()) return false;
    context.putImageData(new ImageData(buffer, width, height), 0, 0);
    return true;
  } finally {
    giveBuffer(buffer);
  }
};

/** Pixels in the decoder's own format (1.5 bytes each for 4:2:0), in memory of our own. */
class PixelPicture implements Picture {
  readonly index: FrameIndex;
  readonly width: number;
  readonly height: number;
  readonly verified = true;
  readonly #data: ArrayBuffer;
  readonly #init: VideoFrameBufferInit;
  readonly #method: () => PaintMethod;

  constructor(
    index: FrameIndex,
    data: ArrayBuffer,
    init: VideoFrameBufferInit,
    method: () => PaintMethod,
  ) {
    this.index = index;
    this.width = init.displayWidth ?? init.codedWidth;
    this.height = init.displayHeight ?? init.codedHeight;
    this.#data = data;
    this.#init = init;
    this.#method = method;
  }

  get bytes(): number {
    return this.#data.byteLength;
  }

  async paint(context: CanvasRenderingContext2D, current: () => boolean): Promise<boolean> {
    const frame = new VideoFrame(this.#data, this.#init);
    const { codedWidth, codedHeight } = this.#init;
    const squarePixels = codedWidth === this.width && codedHeight === this.height;
    try {
      if (this.#method() === 'convert' && squarePixels)
        return await paintConverted(frame, context, current);
      if (!current()) return false;
      context.drawImage(frame, 0, 0, this.width, this.height);
      return true;
    } finally {
      frame.close();
    }
  }
}

/**
 * Copies a decoded frame into memory of our own and closes it. A decoder lends its frames from a
 * pool of a few and stops without a word once all are out, so none is ever kept.
 */
export const keepPixels = async (
  index: FrameIndex,
  frame: VideoFrame,
  method: () => PaintMethod,
): Promise<Picture> => {
  try {
    const { format, visibleRect, displayWidth, displayHeight } = frame;
    // a frame that lives on a graphics card shows no format: have it converted
    const converted = format === null ? ({ format: 'RGBA' } as const) : {};
    const data = new ArrayBuffer(frame.allocationSize(converted));
    const layout = await frame.copyTo(data, converted);
    const init: VideoFrameBufferInit = {
      format: format ?? 'RGBA',
      codedWidth: visibleRect?.width ?? frame.codedWidth,
      codedHeight: visibleRect?.height ?? frame.codedHeight,
      displayWidth,
      displayHeight,
      layout,
      timestamp: index,
      ...(format === null ? {} : { colorSpace: frame.colorSpace.toJSON() }),
    };
    return new PixelPicture(index, data, init, method);
  } finally {
    frame.close();
  }
};
