import type { FrameIndex } from '#shared/timing/units.ts';
import type { CopyBytes } from './copy-bytes.ts';
import { chooseConfig } from './decoder-config.ts';
import { type DemuxedCopy, demuxCopy } from './demux-copy.ts';
import { abortReason, VideoError } from './errors.ts';
import { FarthestCache } from './farthest-cache.ts';
import { FrameDecoder } from './frame-decoder.ts';
import { checkIndex } from './frame-times.ts';
import { measurePaintMethod } from './paint-method.ts';
import { type PaintMethod, PixelPicture } from './pixel-picture.ts';
import { nextToPrefetch, windowWithin } from './prefetch.ts';
import type { ClipSource, FrameRequest, FrameSource, Picture } from './types.ts';

interface Job {
  readonly index: FrameIndex;
  resolve: (picture: Picture) => void;
  reject: (error: unknown) => void;
}

/** A page that nobody sees is not painted: then work goes on after this, ms. */
const UNSEEN_MS = 50;

/** Until what is on the canvas now has been painted on the screen. */
const painted = (): Promise<void> =>
  new Promise((resolve) => {
    const unseen = setTimeout(resolve, UNSEEN_MS);
    requestAnimationFrame(() => {
      clearTimeout(unseen);
      setTimeout(resolve);
    });
  });

/** Exact frames by one decoder: cache, prefetch while stepping, wanted frames before prefetched. */
export class DecodedSource implements FrameSource {
  readonly kind = 'decoder';
  readonly frameCount: number;
  readonly width: number;
  readonly height: number;
  readonly frameTable: ClipSource['frameTable'];
  readonly #bytes: CopyBytes;
  readonly #copy: DemuxedCopy;
  readonly #decoder: FrameDecoder<PixelPicture>;
  readonly #cache: FarthestCache<PixelPicture>;
  readonly #jobs: Job[] = [];
  #method: PaintMethod = 'draw';
  /** The frame after the one shown, its pixels converted already. */
  #ahead: PixelPicture | null = null;
  #playhead: FrameIndex | null = null;
  #direction: 1 | -1 = 1;
  #stepping = false;
  #running = false;
  /** True from a request until its picture had the time to be painted. */
  #awaited = false;
  #closed = false;

  private constructor(
    clip: ClipSource,
    bytes: CopyBytes,
    copy: DemuxedCopy,
    config: VideoDecoderConfig,
    cacheBytes: number,
  ) {
    this.frameCount = clip.frameTable.length;
    this.frameTable = clip.frameTable;
    this.width = clip.width;
    this.height = clip.height;
    this.#bytes = bytes;
    this.#copy = copy;
    this.#cache = new FarthestCache(cacheBytes);
    this.#decoder = new FrameDecoder(copy, config, (index, frame) => this.#keep(index, frame));
  }

  /**
   * Opens the copy and decodes its first frame, which proves that this browser can; the rest of
   * the bytes follows in the background. Owns `bytes` from here on.
   */
  static async open(
    clip: ClipSource,
    bytes: CopyBytes,
    cacheBytes: number,
  ): Promise<DecodedSource> {
    const copy = await demuxCopy(bytes, clip.frameTable);
    const config = await chooseConfig(copy.config);
    const source = new DecodedSource(clip, bytes, copy, config, cacheBytes);
    const first = await source.frame(0 as FrameIndex, { intent: 'scrub' });
    await measurePaintMethod(first, (method) => (source.#method = method));
    void bytes.fill();
    return source;
  }

  get paintMethod(): PaintMethod {
    return this.#method;
  }

  get decoderRemakes(): number {
    return this.#decoder.remakes;
  }

  holds(index: FrameIndex): boolean {
    return this.#cache.has(index);
  }

  onProgress: FrameSource['onProgress'] = (listener) => this.#bytes.onProgress(listener);

  async frame(index: FrameIndex, { signal, intent }: FrameRequest = {}): Promise<Picture> {
    if (this.#closed) throw new VideoError('closed');
    checkIndex(this.frameTable, index);
    if (signal?.aborted) throw abortReason(signal);
    this.#moveTo(index, intent);
    this.#awaited = true;
    const picture = this.#cache.get(index) ?? this.#enqueue(index, signal);
    void this.#run();
    return picture;
  }

  close(): void {
    if (this.#closed) return;
    this.#closed = true;
    this.#decoder.close();
    this.#copy.close();
    this.#bytes.close();
    this.#cache.clear();
    this.#ahead?.forgetAhead();
    for (const job of this.#jobs.splice(0)) job.reject(new VideoError('closed'));
  }

  #moveTo(index: FrameIndex, intent: FrameRequest['intent']): void {
    const moved = this.#playhead === null ? 0 : index - this.#playhead;
    this.#stepping = (intent ?? (Math.abs(moved) === 1 ? 'step' : 'scrub')) === 'step';
    if (moved !== 0) this.#direction = moved > 0 ? 1 : -1;
    this.#playhead = index;
    this.#cache.movePlayhead(index);
  }

  #enqueue(index: FrameIndex, signal: AbortSignal | undefined): Promise<Picture> {
    return new Promise((resolve, reject) => {
      const job = { index, resolve, reject };
      this.#jobs.push(job);
      if (!signal) return;
      const abort = (): void => {
        const at = this.#jobs.indexOf(job);
        if (at >= 0) this.#jobs.splice(at, 1);
        reject(abortReason(signal));
      };
      signal.addEventListener('abort', abort, { once: true });
      const forget = (): void => signal.removeEventListener('abort', abort);
      job.resolve = (picture) => (forget(), resolve(picture));
      job.reject = (error) => (forget(), reject(error as Error));
    });
  }

  async #run(): Promise<void> {
    if (this.#running) return;
    this.#running = true;
    while (!this.#closed) {
      const job = this.#jobs.shift();
      if (job) await this.#serve(job);
      else if (this.#awaited) {
        // work ahead would hold up the very frame that somebody waits for
        this.#awaited = false;
        await painted();
      } else if (!(await this.#convertNext()) && !(await this.#prefetchOne())) break;
    }
    this.#running = false;
  }

  async #serve(job: Job): Promise<void> {
    try {
      await this.#decoder.idle();
      const which = this.#stepping ? 'group' : 'wanted';
      job.resolve(this.#cache.get(job.index) ?? (await this.#decoder.decode(job.index, which)));
    } catch (error) {
      job.reject(error);
    }
  }

  #keep(index: FrameIndex, frame: VideoFrame): PixelPicture {
    const held = this.#cache.get(index);
    if (held) {
      frame.close();
      return held;
    }
    const picture = new PixelPicture(index, frame, () => this.#method);
    this.#cache.put(index, picture);
    // neighbours come in numbers, and nobody waits to paint them
    if (index !== this.#playhead) void picture.giveBack();
    return picture;
  }

  /** Makes the next step quick. False where that is done, or nothing says which step is next. */
  async #convertNext(): Promise<boolean> {
    if (!this.#stepping || this.#playhead === null) return false;
    const next = this.#cache.get(this.#playhead + this.#direction);
    if (!next || next === this.#ahead) return false;
    this.#ahead?.forgetAhead();
    this.#ahead = next;
    await next.convertAhead();
    return true;
  }

  /** False when there is nothing to prefetch; a failure is left to whoever wants that frame. */
  async #prefetchOne(): Promise<boolean> {
    if (!this.#stepping || this.#playhead === null || this.#cache.size === 0) return false;
    await this.#decoder.idle();
    if (this.#jobs.length > 0) return true;
    const next = nextToPrefetch({
      playhead: this.#playhead,
      direction: this.#direction,
      frameCount: this.frameCount,
      window: windowWithin(this.#cache.budgetBytes, this.#cache.bytes / this.#cache.size),
      holds: (index) => this.#cache.has(index),
    });
    if (next === null) return false;
    try {
      const picture = await this.#decoder.decode(next, 'group');
      await picture.giveBack();
    } catch {
      return false;
    }
    // evicted at once: all that is nearer is held, and going on would go on for ever
    return this.#cache.has(next);
  }
}
