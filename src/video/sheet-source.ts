import type { FrameIndex } from '#shared/timing/units.ts';
import { BitmapPicture } from './bitmap-picture.ts';
import { abortReason, VideoError } from './errors.ts';
import { FarthestCache } from './farthest-cache.ts';
import { browserTransport, fetchBlob, type Transport } from './fetch-range.ts';
import { checkIndex } from './frame-times.ts';
import { sheetCount, tileOf } from './sheet-layout.ts';
import type {
  ClipSource,
  FrameRequest,
  FrameSource,
  LoadProgress,
  Picture,
  SheetLayout,
} from './types.ts';

interface Sheet {
  readonly bytes: number;
  readonly bitmap: ImageBitmap;
}

/** Frames from sheets of JPEG tiles: exact by construction, one request for some 30 frames. */
export class SheetSource implements FrameSource {
  readonly kind = 'sheets';
  readonly frameCount: number;
  readonly width: number;
  readonly height: number;
  readonly frameTable: ClipSource['frameTable'];
  readonly #layout: SheetLayout;
  readonly #transport: Transport;
  readonly #cache: FarthestCache<Sheet>;
  readonly #onTheWay = new Map<number, Promise<Sheet>>();
  readonly #seen = new Set<number>();
  readonly #stopper = new AbortController();
  readonly #listeners = new Set<(progress: LoadProgress) => void>();
  #loadedBytes = 0;

  constructor(
    clip: ClipSource,
    layout: SheetLayout,
    cacheBytes: number,
    transport: Transport = browserTransport,
  ) {
    this.frameCount = clip.frameTable.length;
    this.frameTable = clip.frameTable;
    this.width = layout.tileWidth;
    this.height = layout.tileHeight;
    this.#layout = layout;
    this.#transport = transport;
    this.#cache = new FarthestCache(cacheBytes);
  }

  holds(index: FrameIndex): boolean {
    return this.#cache.has(tileOf(this.#layout, index).sheet);
  }

  onProgress(listener: (progress: LoadProgress) => void): () => void {
    this.#listeners.add(listener);
    listener(this.#progress());
    return () => this.#listeners.delete(listener);
  }

  async frame(index: FrameIndex, { signal, intent }: FrameRequest = {}): Promise<Picture> {
    checkIndex(this.frameTable, index);
    if (signal?.aborted) throw abortReason(signal);
    const { sheet, tile } = tileOf(this.#layout, index);
    this.#cache.movePlayhead(sheet);
    const { bitmap } = await this.#sheet(sheet);
    if (signal?.aborted) throw abortReason(signal);
    if (intent === 'step') this.#prefetch(sheet + 1);
    return new BitmapPicture(index, bitmap, tile, true);
  }

  close(): void {
    this.#stopper.abort(new VideoError('closed'));
    this.#listeners.clear();
    this.#cache.clear();
  }

  #prefetch(sheet: number): void {
    if (sheet < sheetCount(this.#layout, this.frameCount))
      this.#sheet(sheet).catch(() => undefined); // heard when the sheet is wanted
  }

  #sheet(n: number): Promise<Sheet> {
    const held = this.#cache.get(n);
    if (held) return Promise.resolve(held);
    const coming = this.#onTheWay.get(n) ?? this.#load(n).finally(() => this.#onTheWay.delete(n));
    this.#onTheWay.set(n, coming);
    return coming;
  }

  async #load(n: number): Promise<Sheet> {
    const { signal } = this.#stopper;
    signal.throwIfAborted();
    const blob = await fetchBlob(this.#layout.sheetUrl(n), signal, this.#transport);
    const bitmap = await createImageBitmap(blob).catch((error: unknown) => {
      throw new VideoError('damaged', `sheet ${n}`, error);
    });
    const sheet = { bitmap, bytes: bitmap.width * bitmap.height * 4 };
    this.#cache.put(n, sheet);
    if (!this.#seen.has(n)) this.#loadedBytes += blob.size;
    this.#seen.add(n);
    for (const listener of this.#listeners) listener(this.#progress());
    return sheet;
  }

  #progress(): LoadProgress {
    const share = this.#seen.size / sheetCount(this.#layout, this.frameCount);
    return { share, loadedBytes: this.#loadedBytes, totalBytes: null };
  }
}
