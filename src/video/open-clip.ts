import { CopyBytes } from './copy-bytes.ts';
import { DecodedSource } from './decoded-source.ts';
import { hasDecoder } from './decoder-config.ts';
import { abortReason, VideoError } from './errors.ts';
import { checkFrameTable } from './frame-times.ts';
import { SheetSource } from './sheet-source.ts';
import type { ClipSource, FrameSource, FrameSourceKind } from './types.ts';
import { VideoElementSource } from './video-element-source.ts';

export interface OpenOptions {
  readonly signal?: AbortSignal;
  /** The way to begin with; default: the decoder, then sheets, then the browser's own video. */
  readonly begin?: FrameSourceKind;
  /** Memory for decoded pictures; default by the device. */
  readonly cacheBytes?: number;
}

const MB = 1024 * 1024;

/** 66 pictures of 1080p are 205 MB. Chromium tells a device's memory in GB, 8 at most. */
const defaultCacheBytes = (): number => {
  const memory = 'deviceMemory' in navigator ? Number(navigator.deviceMemory) : 4;
  if (memory <= 2) return 64 * MB;
  return memory <= 4 ? 128 * MB : 256 * MB;
};

const openDecoder = async (
  clip: ClipSource,
  cacheBytes: number,
  signal: AbortSignal | undefined,
): Promise<FrameSource> => {
  const bytes = new CopyBytes(clip.url);
  const stop = (): void => bytes.close();
  signal?.addEventListener('abort', stop, { once: true });
  try {
    return await DecodedSource.open(clip, bytes, cacheBytes);
  } catch (error) {
    bytes.close();
    throw signal?.aborted ? abortReason(signal) : error;
  } finally {
    signal?.removeEventListener('abort', stop);
  }
};

/** Another way of showing the clip may help against these; against the rest it would not. */
const worthFallingBack = (error: unknown): boolean =>
  error instanceof VideoError && (error.code === 'unsupported' || error.code === 'stalled');

/**
 * Opens the prepared copy of a clip for exact frames, by the best way this browser has; `kind` of
 * the answer tells which. Its first frame has been decoded by then, after 2 MB or less.
 * Rejects with `VideoError`, or with the signal's reason.
 */
export const openClip = async (
  clip: ClipSource,
  options: OpenOptions = {},
): Promise<FrameSource> => {
  const { signal, begin = 'decoder', cacheBytes = defaultCacheBytes() } = options;
  checkFrameTable(clip.frameTable);
  if (signal?.aborted) throw abortReason(signal);
  if (begin === 'decoder' && hasDecoder()) {
    try {
      return await openDecoder(clip, cacheBytes, signal);
    } catch (error) {
      if (!worthFallingBack(error)) throw error;
    }
  }
  if (begin !== 'video-element' && clip.sheets)
    return new SheetSource(clip, clip.sheets, cacheBytes);
  return VideoElementSource.open(clip, cacheBytes, signal);
};
