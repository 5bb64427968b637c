import type { FrameIndex } from '#shared/timing/units.ts';
import { CopyBytes } from '#src/video/copy-bytes.ts';
import { chooseConfig } from '#src/video/decoder-config.ts';
import { type DemuxedCopy, demuxCopy } from '#src/video/demux-copy.ts';
import { FarthestCache } from '#src/video/farthest-cache.ts';
import { FrameDecoder } from '#src/video/frame-decoder.ts';
import type { Plane } from '../core/plane.ts';
import { copyLuma } from './copy-luma.ts';
import type { SentClip } from './messages.ts';
import type { PictureSource } from './picture-source.ts';

interface Held {
  readonly bytes: number;
  readonly plane: Promise<Plane>;
}

/** A group of pictures and a few more; 1080p takes 3 MB each. */
const HELD_BYTES = 64 * 1024 * 1024;

/**
 * The prepared copy through a decoder of its own: the page's decoder, its cache and what it has
 * ready stay as they are while marks are followed. The bytes come out of the browser's cache where
 * the page has loaded them before.
 */
export class DecodedPictures implements PictureSource {
  readonly #bytes: CopyBytes;
  readonly #copy: DemuxedCopy;
  readonly #decoder: FrameDecoder<Held>;
  readonly #held = new FarthestCache<Held>(HELD_BYTES);
  /** The decoding that was begun ahead; it settles, never rejects. */
  #ahead: Promise<unknown> = Promise.resolve();

  private constructor(
    bytes: CopyBytes,
    copy: DemuxedCopy,
    decoder: (keep: DecodedPictures) => FrameDecoder<Held>,
  ) {
    this.#bytes = bytes;
    this.#copy = copy;
    this.#decoder = decoder(this);
  }

  /** Rejects with `VideoError`. */
  static async open({ url, frameTable }: SentClip): Promise<DecodedPictures> {
    const bytes = new CopyBytes(url);
    try {
      const copy = await demuxCopy(bytes, frameTable);
      const config = await chooseConfig(copy.config);
      return new DecodedPictures(
        bytes,
        copy,
        (pictures) =>
          new FrameDecoder<Held>(copy, config, (index, frame) => pictures.#keep(index, frame)),
      );
    } catch (error) {
      bytes.close();
      throw error;
    }
  }

  async picture(frame: FrameIndex, next: FrameIndex | null): Promise<Plane> {
    await this.#ahead;
    this.#held.movePlayhead(frame);
    const { plane } = this.#held.get(frame) ?? (await this.#decode(frame));
    const picture = await plane;
    if (next !== null && !this.#held.has(next))
      // whoever asks for it hears what went wrong
      this.#ahead = this.#decode(next).catch(() => undefined);
    return picture;
  }

  close(): void {
    this.#decoder.close();
    this.#copy.close();
    this.#bytes.close();
    this.#held.clear();
  }

  async #decode(frame: FrameIndex): Promise<Held> {
    await this.#decoder.idle();
    return this.#held.get(frame) ?? this.#decoder.decode(frame, 'group');
  }

  #keep(index: FrameIndex, frame: VideoFrame): Held {
    const known = this.#held.get(index);
    if (known) {
      frame.close();
      return known;
    }
    const plane = copyLuma(frame).finally(() => frame.close());
    // heard by whoever waits for this picture, and nobody may
    plane.catch(() => undefined);
    const held = { bytes: frame.allocationSize(), plane };
    this.#held.put(index, held);
    return held;
  }
}
