import { VideoError } from './errors.ts';

/** True where the browser has a decoder that pages may drive; it wants https or this machine. */
export const hasDecoder = (): boolean => 'VideoDecoder' in globalThis;

/** Longer groups of pictures are not decoded as a whole just for one of them. */
const WHOLE_GROUP = 16;

/** How the decoder is fed, by the distance of the copy's key frames. */
export interface DecodeMode {
  readonly config: VideoDecoderConfig;
  /**
   * Flush after every request. For short groups of several frames: the decoder may then work on
   * them in parallel, which takes half the time (48 against 117 ms, measured at 1920 px). Where
   * every frame stands alone, or a group is long, `optimizeForLatency` gives a picture per packet
   * without a flush, and the next request can carry on.
   */
  readonly flushEach: boolean;
}

/**
 * The first configuration the browser says it can decode. Software first: its answer time is short
 * and even, while hardware queues several frames before it gives the first, and stepping and
 * jumping are one frame at a time.
 * Rejects with `VideoError` 'unsupported'.
 */
export const chooseMode = async (
  config: VideoDecoderConfig,
  longestGroup: number,
): Promise<DecodeMode> => {
  if (!hasDecoder()) throw new VideoError('unsupported', 'no VideoDecoder');
  const flushEach = longestGroup > 1 && longestGroup <= WHOLE_GROUP;
  for (const hardwareAcceleration of ['prefer-software', 'no-preference'] as const) {
    const asked = { ...config, hardwareAcceleration, optimizeForLatency: !flushEach };
    const answer = await VideoDecoder.isConfigSupported(asked).catch(() => null);
    if (answer?.supported) return { config: asked, flushEach };
  }
  throw new VideoError('unsupported', `no decoder for ${config.codec}`);
};
