import type { FrameIndex } from '#shared/timing/units.ts';
import type { DemuxedCopy } from './demux-copy.ts';
import { VideoError } from './errors.ts';
import { planDecode } from './keyframes.ts';

/** A frame that takes longer means a decoder that hangs: it is made anew. */
const WATCHDOG_MS = 1500;
/** Some decoders hold a picture back until more packets or a flush come: flush after this. */
const FLUSH_AFTER_MS = 250;
/** After so many frames in a row that came only by a flush, flush at once. */
const FLUSHES_TO_LEARN = 3;

interface Wait<T> {
  readonly index: FrameIndex;
  flushed: boolean;
  readonly arrived: (kept: T) => void;
  readonly failed: (error: unknown) => void;
}

/** Keeps what is needed of a frame and closes it. */
export type KeepFrame<T> = (index: FrameIndex, frame: VideoFrame) => Promise<T>;

/**
 * One `VideoDecoder`, kept for the life of the clip and made anew when it hangs or fails.
 * Call `decode` one at a time. Every frame that comes out, wanted or on the way to it, goes to
 * `keep`, which closes it; frames that come out of a decoder given up are closed here.
 */
export class FrameDecoder<T> {
  readonly #copy: DemuxedCopy;
  readonly #config: VideoDecoderConfig;
  readonly #keep: KeepFrame<T>;
  readonly #keeping = new Set<FrameIndex>();
  #decoder: VideoDecoder | null = null;
  /** The last packet handed over without a gap; null: the next one must be a key frame. */
  #fed: FrameIndex | null = null;
  #wait: Wait<T> | null = null;
  #flushesNeeded = 0;
  #remakes = 0;
  #closed = false;

  constructor(copy: DemuxedCopy, config: VideoDecoderConfig, keep: KeepFrame<T>) {
    this.#copy = copy;
    this.#config = config;
    this.#keep = keep;
  }

  /** How often the decoder had to be made anew. */
  get remakes(): number {
    return this.#remakes;
  }

  /**
   * What `keep` made of this frame.
   * Rejects with `VideoError`: damaged, stalled, closed, or what loading its bytes gave.
   */
  async decode(index: FrameIndex): Promise<T> {
    const chunks = await this.#load(index);
    try {
      return await this.#run(index, chunks);
    } catch {
      this.#discard();
      if (this.#closed) throw new VideoError('closed');
    }
    // a new decoder begins at a key frame: the failure may have come from an older packet
    this.#remakes += 1;
    const again = await this.#load(index);
    try {
      return await this.#run(index, again);
    } catch (error) {
      this.#discard();
      if (this.#closed) throw new VideoError('closed');
      if (error instanceof VideoError) throw error;
      throw new VideoError('damaged', `frame ${index}`, error);
    }
  }

  close(): void {
    this.#closed = true;
    this.#discard();
    this.#wait?.failed(new VideoError('closed'));
  }

  async #load(index: FrameIndex): Promise<EncodedVideoChunk[]> {
    const { from, to } = planDecode(this.#copy.keys, index, this.#fed);
    const places = Array.from({ length: to - from + 1 }, (_, k) => (from + k) as FrameIndex);
    const chunks = await Promise.all(places.map((place) => this.#copy.chunk(place)));
    if (this.#closed) throw new VideoError('closed');
    return chunks;
  }

  async #run(index: FrameIndex, chunks: readonly EncodedVideoChunk[]): Promise<T> {
    const decoder = (this.#decoder ??= this.#make());
    const arrival = new Promise<T>((arrived, failed) => {
      this.#wait = { index, flushed: false, arrived, failed };
    });
    const hangs = (): void => this.#wait?.failed(new VideoError('stalled', `frame ${index}`));
    const watchdog = setTimeout(hangs, WATCHDOG_MS);
    const flushAfter = this.#flushesNeeded >= FLUSHES_TO_LEARN ? 0 : FLUSH_AFTER_MS;
    const nudge = setTimeout(() => void this.#flush(decoder), flushAfter);
    try {
      for (const chunk of chunks) decoder.decode(chunk);
      this.#fed = index;
      return await arrival;
    } finally {
      clearTimeout(watchdog);
      clearTimeout(nudge);
      this.#wait = null;
    }
  }

  /** Brings out what the decoder holds back; afterwards its next packet must be a key frame. */
  async #flush(decoder: VideoDecoder): Promise<void> {
    const wait = this.#wait;
    if (!wait || this.#keeping.has(wait.index)) return;
    this.#fed = null;
    wait.flushed = true;
    try {
      await decoder.flush();
      if (this.#keeping.has(wait.index)) return;
      wait.failed(new VideoError('damaged', `frame ${wait.index} did not come out`));
    } catch (error) {
      wait.failed(error);
    }
  }

  #make(): VideoDecoder {
    this.#fed = null;
    const decoder: VideoDecoder = new VideoDecoder({
      output: (frame) => void this.#output(decoder, frame),
      error: (error) => {
        if (this.#decoder === decoder) this.#wait?.failed(error);
      },
    });
    decoder.configure(this.#config);
    return decoder;
  }

  async #output(from: VideoDecoder, frame: VideoFrame): Promise<void> {
    const index = frame.timestamp as FrameIndex;
    if (this.#closed || this.#decoder !== from) return frame.close();
    this.#keeping.add(index);
    try {
      const kept = await this.#keep(index, frame);
      const wait = this.#waitFor(index);
      if (!wait) return;
      this.#flushesNeeded = wait.flushed ? this.#flushesNeeded + 1 : 0;
      wait.arrived(kept);
    } catch (error) {
      this.#waitFor(index)?.failed(error);
    } finally {
      this.#keeping.delete(index);
    }
  }

  #waitFor(index: FrameIndex): Wait<T> | null {
    return this.#wait?.index === index ? this.#wait : null;
  }

  #discard(): void {
    const decoder = this.#decoder;
    this.#decoder = null;
    this.#fed = null;
    if (decoder && decoder.state !== 'closed') decoder.close();
  }
}
