import { blocksOf, type BlockRun, missingRuns, nearestMissing } from './byte-blocks.ts';
import { VideoError } from './errors.ts';
import { FarthestCache } from './farthest-cache.ts';
import { browserTransport, fetchRange, type Transport } from './fetch-range.ts';
import type { LoadProgress } from './types.ts';

/** A 1920 px intra frame is 0.1 to 0.5 MB: header and first picture arrive in one or two blocks. */
const BLOCK_BYTES = 512 * 1024;
/** Blocks per request while nobody waits: 2 MB, so that a wanted block is never far behind. */
const BACKGROUND_BLOCKS = 4;
/** Above the largest copy the server prepares (some 150 MB), so that normally all of it stays. */
const HELD_BYTES = 192 * 1024 * 1024;

interface Block {
  readonly bytes: number;
  readonly data: Uint8Array;
}

/**
 * The prepared copy's bytes, fetched by ranges: what a reader waits for at once, the rest in the
 * background from where the reader is, once `fill` was called.
 */
export class CopyBytes {
  readonly #url: string;
  readonly #transport: Transport;
  readonly #blocks = new FarthestCache<Block>(HELD_BYTES);
  readonly #onTheWay = new Map<number, Promise<void>>();
  readonly #arrived = new Set<number>();
  readonly #stopper = new AbortController();
  readonly #listeners = new Set<(progress: LoadProgress) => void>();
  #totalBytes: number | null = null;
  #loadedBytes = 0;
  #version: string | null = null;
  #centre = 0;
  #filling = false;

  constructor(url: string, transport: Transport = browserTransport) {
    this.#url = url;
    this.#transport = transport;
  }

  get progress(): LoadProgress {
    return {
      share: this.#totalBytes ? this.#loadedBytes / this.#totalBytes : 0,
      loadedBytes: this.#loadedBytes,
      totalBytes: this.#totalBytes,
    };
  }

  onProgress(listener: (progress: LoadProgress) => void): () => void {
    this.#listeners.add(listener);
    listener(this.progress);
    return () => this.#listeners.delete(listener);
  }

  /** Size of the whole copy; the first call loads its first block. */
  async size(): Promise<number> {
    if (this.#totalBytes === null) await this.#load({ first: 0, last: 0 }, false);
    return this.#totalBytes ?? 0;
  }

  /** Bytes from `start` to `end` (exclusive), both within the copy. */
  async read(start: number, end: number): Promise<Uint8Array> {
    const run = blocksOf(start, end, BLOCK_BYTES);
    this.#centre = run.first;
    this.#blocks.movePlayhead(run.first);
    for (;;) {
      const waits = missingRuns(run, (b) => !this.#blocks.has(b) && !this.#onTheWay.has(b)).map(
        (missing) => this.#load(missing, false),
      );
      for (let b = run.first; b <= run.last; b += 1) {
        const coming = this.#onTheWay.get(b);
        if (coming) waits.push(coming);
      }
      if (waits.length === 0) return this.#join(start, end, run);
      await Promise.all(waits);
    }
  }

  /** Loads the rest while nobody waits; a lost connection ends it until it is called again. */
  async fill(): Promise<void> {
    if (this.#filling) return;
    this.#filling = true;
    try {
      const count = Math.ceil((await this.size()) / BLOCK_BYTES);
      const missing = (b: number): boolean => !this.#arrived.has(b) && !this.#onTheWay.has(b);
      while (this.#blocks.bytes < HELD_BYTES) {
        const run = nearestMissing(this.#centre, count, BACKGROUND_BLOCKS, missing);
        if (!run) return;
        await this.#load(run, true);
      }
    } catch {
      // whoever needs a block that is missing asks for it again and hears the reason
    } finally {
      this.#filling = false;
    }
  }

  close(): void {
    this.#stopper.abort(new VideoError('closed'));
    this.#listeners.clear();
    this.#blocks.clear();
  }

  #load(run: BlockRun, background: boolean): Promise<void> {
    const loading = this.#fetchRun(run, background).finally(() => {
      for (let b = run.first; b <= run.last; b += 1) this.#onTheWay.delete(b);
    });
    for (let b = run.first; b <= run.last; b += 1) this.#onTheWay.set(b, loading);
    return loading;
  }

  async #fetchRun(run: BlockRun, background: boolean): Promise<void> {
    const { signal } = this.#stopper;
    signal.throwIfAborted();
    const range = { start: run.first * BLOCK_BYTES, end: (run.last + 1) * BLOCK_BYTES, background };
    const answer = await fetchRange(this.#url, range, signal, this.#transport);
    this.#version ??= answer.version;
    this.#totalBytes ??= answer.totalBytes;
    if (answer.totalBytes !== this.#totalBytes || answer.version !== this.#version)
      throw new VideoError('changed', 'size or tag differs between parts');
    for (let at = 0; at < answer.bytes.length; at += BLOCK_BYTES)
      this.#keep((answer.start + at) / BLOCK_BYTES, answer.bytes.subarray(at, at + BLOCK_BYTES));
    if (!this.#blocks.has(run.first)) throw new VideoError('network', 'an empty part');
    for (const listener of this.#listeners) listener(this.progress);
  }

  #keep(block: number, data: Uint8Array): void {
    this.#blocks.put(block, { bytes: data.length, data });
    if (this.#arrived.has(block)) return;
    this.#arrived.add(block);
    this.#loadedBytes += data.length;
  }

  #join(start: number, end: number, run: BlockRun): Uint8Array {
    const joined = new Uint8Array(end - start);
    for (let b = run.first; b <= run.last; b += 1) {
      const offset = b * BLOCK_BYTES;
      const data = this.#blocks.get(b)?.data ?? new Uint8Array();
      const from = Math.max(0, start - offset);
      joined.set(data.subarray(from, Math.max(from, end - offset)), offset + from - start);
    }
    return joined;
  }
}
