import type { FrameIndex } from '#shared/timing/units.ts';
import { VideoError } from './errors.ts';
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

const converted = async (frame: VideoFrame): Promise<Uint8ClampedArray<ArrayBuffer>> => {
  const buffer = takeBuffer(frame.displayWidth * frame.displayHeight * 4);
  try {
    await frame.copyTo(buffer, { format: 'RGBA' });
    return buffer;
  } catch (error) {
    giveBuffer(buffer);
    throw error;
  }
};

/** Pixels in the decoder's own format (1.5 bytes each for 4:2:0), in memory of our own. */
interface OwnPixels {
  readonly data: ArrayBuffer;
  readonly init: VideoFrameBufferInit;
}

const copyPixels = async (frame: VideoFrame): Promise<OwnPixels> => {
  const { format, visibleRect, displayWidth, displayHeight, timestamp } = frame;
  const data = new ArrayBuffer(frame.allocationSize(copyOptions(frame)));
  const layout = await frame.copyTo(data, copyOptions(frame));
  return {
    data,
    init: {
      format: format ?? 'RGBA',
      codedWidth: visibleRect?.width ?? frame.codedWidth,
      codedHeight: visibleRect?.height ?? frame.codedHeight,
      displayWidth,
      displayHeight,
      layout,
      timestamp,
      ...(format === null ? {} : { colorSpace: frame.colorSpace.toJSON() }),
    },
  };
};

/** A frame that lives on a graphics card shows no format: have it converted. */
const copyOptions = ({ format }: VideoFrame): VideoFrameCopyToOptions =>
  format === null ? { format: 'RGBA' } : {};

/** Longest loan of a frame that nobody paints, ms. */
const LOAN_MS = 40;

/**
 * A decoded frame, copied into memory of our own and then closed: a decoder lends its frames from
 * a pool of a few and stops without a word once all are out, so none is kept. Until the copy is
 * made it paints from the frame itself; what is waited for is painted first and copied after,
 * which saves a cold jump 2 to 3 ms at 1920 px.
 */
export class PixelPicture implements Picture {
  readonly index: FrameIndex;
  readonly width: number;
  readonly height: number;
  readonly bytes: number;
  readonly verified = true;
  readonly #method: () => PaintMethod;
  readonly #loan: ReturnType<typeof setTimeout>;
  #borrowed: VideoFrame | null;
  #own: OwnPixels | null = null;
  /** Converted ahead of a paint that is likely to come. */
  #ahead: Uint8ClampedArray<ArrayBuffer> | null = null;
  #givenBack: Promise<void> | null = null;

  /** Owns the frame from here on. */
  constructor(index: FrameIndex, frame: VideoFrame, method: () => PaintMethod) {
    this.index = index;
    this.width = frame.displayWidth;
    this.height = frame.displayHeight;
    this.bytes = frame.allocationSize(copyOptions(frame));
    this.#method = method;
    this.#borrowed = frame;
    this.#loan = setTimeout(() => void this.giveBack(), LOAN_MS);
  }

  /** Copies the frame and gives it back to the decoder. Settles, never rejects, once that is done. */
  giveBack(): Promise<void> {
    clearTimeout(this.#loan);
    this.#givenBack ??= this.#copyAndClose();
    return this.#givenBack;
  }

  async paint(context: CanvasRenderingContext2D, current: () => boolean): Promise<boolean> {
    const ahead = this.#takeAhead();
    if (ahead) return this.#put(ahead, context, current);
    const frame = this.#toFrame();
    try {
      if (this.#converts(frame)) return this.#put(await converted(frame), context, current);
      if (!current()) return false;
      context.drawImage(frame, 0, 0, this.width, this.height);
      return true;
    } finally {
      frame.close();
    }
  }

  /**
   * Converts now what would be converted at the next paint: one step on then costs only putting the
   * pixels. Settles, never rejects; takes 4 bytes a pixel until that paint or `forgetAhead`.
   */
  async convertAhead(): Promise<void> {
    if (this.#ahead) return;
    let frame: VideoFrame | null = null;
    try {
      frame = this.#toFrame();
      if (this.#converts(frame)) this.#ahead = await converted(frame);
    } catch {
      // the paint itself will say what is wrong
      this.#ahead = null;
    } finally {
      frame?.close();
    }
  }

  forgetAhead(): void {
    const ahead = this.#takeAhead();
    if (ahead) giveBuffer(ahead);
  }

  #takeAhead(): Uint8ClampedArray<ArrayBuffer> | null {
    const ahead = this.#ahead;
    this.#ahead = null;
    return ahead;
  }

  #converts({ visibleRect }: VideoFrame): boolean {
    const squarePixels = visibleRect?.width === this.width && visibleRect.height === this.height;
    return this.#method() === 'convert' && squarePixels;
  }

  #put(
    pixels: Uint8ClampedArray<ArrayBuffer>,
    context: CanvasRenderingContext2D,
    current: () => boolean,
  ): boolean {
    const wanted = current();
    if (wanted) context.putImageData(new ImageData(pixels, this.width, this.height), 0, 0);
    giveBuffer(pixels);
    return wanted;
  }

  async #copyAndClose(): Promise<void> {
    const frame = this.#borrowed;
    if (!frame) return;
    this.#own = await copyPixels(frame).catch(() => null);
    this.#borrowed = null;
    frame.close();
  }

  #toFrame(): VideoFrame {
    if (this.#own) return new VideoFrame(this.#own.data, this.#own.init);
    if (this.#borrowed) return this.#borrowed.clone();
    throw new VideoError('damaged', `the pixels of frame ${this.index} could not be copied`);
  }
}
