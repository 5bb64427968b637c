import { colourTags, type PictureTraits } from './picture-filters.ts';
import type { Rational } from './types.ts';

export interface VideoPlan {
  readonly timeBase: Rational;
  readonly threads: number;
  readonly traits: PictureTraits;
}

/**
 * `passthrough` keeps every frame with its own time; the encoder counts in the original's ticks, or
 * times would be rounded to the frame rate (up to 12 ms off). The time base is spelled out because
 * ffmpeg 5.1 cannot find the source's behind a filter graph (`-1`).
 */
export const videoArgs = ({ timeBase, threads, traits }: VideoPlan): string[] => [
  '-an',
  '-sn',
  '-dn',
  ...clean,
  '-fps_mode',
  'passthrough',
  '-enc_time_base',
  `${timeBase.num}:${timeBase.den}`,
  ...colourTags(traits),
  '-c:v',
  'libx264',
  '-threads',
  `${threads}`,
  '-bf',
  '0',
  '-movflags',
  '+faststart',
  '-f',
  'mp4',
];

/** No place, date, device or chapter name goes into a copy. */
const clean = ['-map_metadata', '-1', '-map_chapters', '-1'];

/**
 * Blocks whole, motion to whole pixels, no search for fades and cuts, of which a take has none: a
 * quarter less time than the preset alone, at about its size and likeness (rendered and noisy clips,
 * 960 px). The simpler of the two entropy codings is less work here and on a phone, for a twelfth
 * more bytes.
 */
export const replayArgs = (gop: number): string[] => [
  '-preset',
  'superfast',
  '-x264-params',
  'partitions=none:8x8dct=0:subme=0:weightp=0:scenecut=0:cabac=0',
  '-crf',
  '24',
  '-g',
  `${gop}`,
];

/** One JPEG; a later picture replaces an earlier one. Quality by ffmpeg's scale, 2 best to 31. */
export const pictureArgs = (quality: number): string[] => [
  ...clean,
  '-fps_mode',
  'passthrough',
  '-c:v',
  'mjpeg',
  '-threads',
  '1',
  '-q:v',
  `${quality}`,
  '-update',
  '1',
  '-f',
  'image2',
];
