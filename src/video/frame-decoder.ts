import type { FrameIndex } from '#shared/timing/units.ts';
import type { DemuxedCopy } from './demux-copy.ts';
import { VideoError } from './errors.ts';
import { planDecode } from './keyframes.ts';

/** A frame, or a flush, that takes longer means a decoder that hangs: it is made anew. */
const WATCHDOG_MS = 1500;
/** Some decoders hold a picture back until more packets or a flush come: flush after this. */
const FLUSH_AFTER_MS = 250;
/** After so many frames in a row that came only by a flush, flush at once. */
const FLUSHES_TO_LEARN = 3;

interface Wait<T> {
  readonly index: FrameIndex;
  readonly arrived: (kept: T) => void;
  readonly failed: (error: unknown) => void;
  nudged: boolean;
}

/** Makes of a frame what is needed, and owns it from then on. */
export type KeepFrame<T> = (index: FrameIndex, frame: VideoFrame) => T;

/** `group`: its neighbours will be wanted too, so those that are decoded on the way are kept. */
export type KeepWhich = 'wanted' | 'group';

/**
 * One `VideoDecoder`, kept for the life of the clip and made anew when it hangs or fails.
 * Call `decode` one at a time. What comes out goes to `keep`, which closes it in the end; frames
 * that nobody wants, or that come late out of a decoder given up, are closed here.
 */
export class FrameDecoder<T> {
  readonly #copy: DemuxedCopy;
  readonly #config: VideoDecoderConfig;
  readonly #keep: KeepFrame<T>;
  #decoder: VideoDecoder | null = null;
  /** The last packet handed over without a gap; null: the next one must be a key frame. */
  #fed: FrameIndex | null = null;
  #wait: Wait<T> | null = null;
  #which: KeepWhich = 'wanted';
  #flushing: Promise<void> = Promise.resolve();
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

  /** Settles, never rejects, when frames of an earlier request no longer come out. */
  idle(): Promise<void> {
    return this.#flushing;
  }

  /**
   * What `keep` made of this frame.
   * Rejects with `VideoError`: damaged, stalled, closed, or what loading its bytes gave.
   */
  async decode(index: FrameIndex, which: KeepWhich): Promise<T> {
    this.#which = which;
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
      this.#wait = { index, arrived, failed, nudged: false };
    });
    const hangs = (): void => this.#wait?.failed(new VideoError('stalled', `frame ${index}`));
    const watchdog = setTimeout(hangs, WATCHDOG_MS);
    const nudge = setTimeout(() => this.#nudge(decoder), FLUSH_AFTER_MS);
    try {
      for (const chunk of chunks) decoder.decode(chunk);
      this.#fed = index;
      if (this.#flushesNeeded >= FLUSHES_TO_LEARN) this.#flush(decoder);
      return await arrival;
    } finally {
      clearTimeout(watchdog);
      clearTimeout(nudge);
      this.#wait = null;
    }
  }

  #nudge(decoder: VideoDecoder): void {
    if (!this.#wait || this.#fed === null) return;
    this.#wait.nudged = true;
    this.#flush(decoder);
  }

  /** Brings out what the decoder holds back; afterwards its next packet must be a key frame. */
  #flush(decoder: VideoDecoder): void {
    const wait = this.#wait;
    this.#fed = null;
    this.#flushing = new Promise((settle) => {
      const hangs = (): void => {
        if (this.#decoder === decoder) this.#discard();
        settle();
      };
      const watchdog = setTimeout(hangs, WATCHDOG_MS);
      decoder
        .flush()
        .then(() => wait?.failed(new VideoError('damaged', `frame ${wait.index} did not come out`)))
        .catch((error: unknown) => wait?.failed(error))
        .finally(() => {
          clearTimeout(watchdog);
          settle();
        });
    });
  }

  #make(): VideoDecoder {
    this.#fed = null;
    const decoder: VideoDecoder = new VideoDecoder({
      output: (frame) => this.#output(decoder, frame),
      error: (error) => {
        if (this.#decoder === decoder) this.#wait?.failed(error);
      },
    });
    decoder.configure(this.#config);
    return decoder;
  }

  #output(from: VideoDecoder, frame: VideoFrame): void {
    const index = frame.timestamp as FrameIndex;
    const wait = this.#wait?.index === index ? this.#wait : null;
    if (this.#decoder !== from || !(wait || this.#which === 'group')) return frame.close();
    try {
      const kept = this.#keep(index, frame);
      if (!wait) return;
      this.#flushesNeeded = wait.nudged ? this.#flushesNeeded + 1 : 0;
      wait.arrived(kept);
    } catch (error) {
      frame.close();
      wait?.failed(error);
    }
  }

  #discard(): void {
    const decoder = this.#decoder;
    this.#decoder = null;
    this.#fed = null;
    if (decoder && decoder.state !== 'closed') decoder.close();
  }
}
