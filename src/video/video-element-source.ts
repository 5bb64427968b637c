import type { FrameIndex } from '#shared/timing/units.ts';
import { BitmapPicture } from './bitmap-picture.ts';
import { abortReason, VideoError } from './errors.ts';
import { seekExactly } from './exact-seek.ts';
import { FarthestCache } from './farthest-cache.ts';
import { checkIndex } from './frame-times.ts';
import type { ClipSource, FrameRequest, FrameSource, LoadProgress, Picture } from './types.ts';

const readyVideo = async (url: string, signal?: AbortSignal): Promise<HTMLVideoElement> => {
  const video = document.createElement('video');
  video.muted = true;
  video.playsInline = true;
  video.preload = 'auto';
  try {
    await new Promise<void>((resolve, reject) => {
      video.addEventListener('loadeddata', () => resolve(), { once: true });
      video.addEventListener('error', () => reject(faultOf(video)), { once: true });
      signal?.addEventListener('abort', () => reject(abortReason(signal)), { once: true });
      video.src = url;
    });
    // a codec that is not decoded 'loads' without an error where there is sound, with no picture
    if (video.videoWidth === 0) throw new VideoError('unsupported', 'a video without a picture');
    return video;
  } catch (error) {
    letGo(video);
    throw error;
  }
};

const faultOf = (video: HTMLVideoElement): VideoError => {
  const code = video.error?.code;
  if (code === MediaError.MEDIA_ERR_NETWORK) return new VideoError('network', 'video element');
  if (code === MediaError.MEDIA_ERR_DECODE) return new VideoError('damaged', 'video element');
  return new VideoError('unsupported', video.error?.message ?? '');
};

/** Stops the download and frees the decoder; leaving it to the garbage collector may take minutes. */
const letGo = (video: HTMLVideoElement): void => {
  video.removeAttribute('src');
  video.load();
};

const bufferedShare = (video: HTMLVideoElement): number => {
  let seconds = 0;
  for (let k = 0; k < video.buffered.length; k += 1)
    seconds += video.buffered.end(k) - video.buffered.start(k);
  return video.duration > 0 ? Math.min(1, seconds / video.duration) : 0;
};

/** Last resort: the browser's own video, one seek at a time, each checked. */
export class VideoElementSource implements FrameSource {
  readonly kind = 'video-element';
  readonly frameCount: number;
  readonly width: number;
  readonly height: number;
  readonly frameTable: ClipSource['frameTable'];
  readonly #video: HTMLVideoElement;
  readonly #cache: FarthestCache<Picture>;
  readonly #listeners = new Set<(progress: LoadProgress) => void>();
  /** The newest seek: each begins when the one before has settled. */
  #queue: Promise<unknown> = Promise.resolve();
  #share = 0;
  #closed = false;

  private constructor(clip: ClipSource, video: HTMLVideoElement, cacheBytes: number) {
    this.frameCount = clip.frameTable.length;
    this.frameTable = clip.frameTable;
    this.width = clip.width;
    this.height = clip.height;
    this.#video = video;
    this.#cache = new FarthestCache(cacheBytes);
    video.addEventListener('progress', () => this.#tell());
  }

  /** Rejects with `VideoError`: unsupported, network, damaged; or the signal's reason. */
  static async open(
    clip: ClipSource,
    cacheBytes: number,
    signal?: AbortSignal,
  ): Promise<VideoElementSource> {
    return new VideoElementSource(clip, await readyVideo(clip.url, signal), cacheBytes);
  }

  holds(index: FrameIndex): boolean {
    return this.#cache.has(index);
  }

  onProgress(listener: (progress: LoadProgress) => void): () => void {
    this.#listeners.add(listener);
    this.#tell();
    return () => this.#listeners.delete(listener);
  }

  async frame(index: FrameIndex, { signal }: FrameRequest = {}): Promise<Picture> {
    checkIndex(this.frameTable, index);
    this.#cache.movePlayhead(index);
    const held = this.#cache.get(index);
    if (held) return held;
    const seeking = this.#queue.then(() => this.#seek(index, signal));
    this.#queue = seeking.catch(() => undefined);
    return seeking;
  }

  close(): void {
    this.#closed = true;
    this.#listeners.clear();
    this.#cache.clear();
    letGo(this.#video);
  }

  async #seek(index: FrameIndex, signal?: AbortSignal): Promise<Picture> {
    if (signal?.aborted) throw abortReason(signal);
    if (this.#closed) throw new VideoError('closed');
    const verified = await seekExactly(this.#video, this.frameTable, index);
    const bitmap = await createImageBitmap(this.#video);
    if (this.#closed) throw new VideoError('closed');
    const { width, height } = bitmap;
    const picture = new BitmapPicture(index, bitmap, { x: 0, y: 0, width, height }, verified);
    this.#cache.put(index, picture);
    return picture;
  }

  #tell(): void {
    this.#share = Math.max(this.#share, bufferedShare(this.#video));
    const progress = { share: this.#share, loadedBytes: null, totalBytes: null };
    for (const listener of this.#listeners) listener(progress);
  }
}
