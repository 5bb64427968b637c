import { VideoError } from './errors.ts';

/** True where the browser has a decoder that pages may drive; it wants https or this machine. */
export const hasDecoder = (): boolean => 'VideoDecoder' in globalThis;

/**
 * The first configuration the browser says it can decode. Software first: its answer time is short
 * and even, while hardware queues several frames before it gives the first, and stepping and
 * jumping are one frame at a time. `optimizeForLatency` gives a picture per packet without a flush,
 * and the next request can carry on; the copies' pictures are cut in slices, which are decoded in
 * parallel (a jump of up to five frames takes 27 ms; 36 where the frames are, at 1920 px).
 * Rejects with `VideoError` 'unsupported'.
 */
export const chooseConfig = async (config: VideoDecoderConfig): Promise<VideoDecoderConfig> => {
  if (!hasDecoder()) throw new VideoError('unsupported', 'no VideoDecoder');
  for (const hardwareAcceleration of ['prefer-software', 'no-preference'] as const) {
    const asked = { ...config, hardwareAcceleration, optimizeForLatency: true };
    const answer = await VideoDecoder.isConfigSupported(asked).catch(() => null);
    if (answer?.supported) return asked;
  }
  throw new VideoError('unsupported', `no decoder for ${config.codec}`);
};
