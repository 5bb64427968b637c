import type { FrameIndex } from '#shared/timing/units.ts';
import { VideoError } from '#src/video/errors.ts';
import { openClip } from '#src/video/open-clip.ts';
import type { ClipSource, FrameSource } from '#src/video/types.ts';
import { TrackingError } from '../errors.ts';
import { lumaOf } from './copy-luma.ts';
import type { SentPicture } from './messages.ts';

/** Grey pictures by the page itself, from sheets of tiles: where no worker can decode. */
export interface PictureFeeder {
  picture(frame: FrameIndex): Promise<SentPicture>;
  close(): void;
}

/** Enough for two sheets. */
const CACHE_BYTES = 160 * 1024 * 1024;

/**
 * Rejects with `TrackingError` 'no-exact-pictures' where there are no sheets: the browser's own
 * video cannot be trusted to show the very frame that a mark is set on.
 */
export const openFeeder = async (
  clip: ClipSource,
  signal: AbortSignal | undefined,
): Promise<PictureFeeder> => {
  if (!clip.sheets) throw new TrackingError('no-exact-pictures', 'no sheets');
  const source: FrameSource = await openClip(clip, {
    begin: 'sheets',
    cacheBytes: CACHE_BYTES,
    ...(signal && { signal }),
  });
  const canvas = document.createElement('canvas');
  canvas.width = source.width;
  canvas.height = source.height;
  // read back at once, so it is kept where that is quick
  const context = canvas.getContext('2d', { alpha: false, willReadFrequently: true });
  if (!context) throw new TrackingError('no-exact-pictures', 'no canvas');
  return {
    async picture(frame) {
      const picture = await source.frame(frame, { intent: 'step' });
      if (!picture.verified) throw new TrackingError('no-exact-pictures', `frame ${frame}`);
      await picture.paint(context, () => true);
      const { width, height } = canvas;
      return { luma: lumaOf(context.getImageData(0, 0, width, height).data), width, height };
    },
    close: () => source.close(),
  };
};

/** What a failure is called in a message. */
export const codeOf = (error: unknown): { code: TrackingError['code']; detail: string } =>
  error instanceof VideoError || error instanceof TrackingError
    ? { code: error.code, detail: error.detail }
    : { code: 'damaged', detail: String(error) };
