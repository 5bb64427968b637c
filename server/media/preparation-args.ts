import { inputArgs, type FfmpegJob, type PictureSource } from './ffmpeg-job.ts';
import { colourTags, type PictureTraits, toPixels } from './picture-filters.ts';
import type { CopyPlan } from './plan-copies.ts';
import { secondsOf } from './rational.ts';
import type { Rational } from './types.ts';

/** Whole ticks of the original's clock: the first one wanted, and the first one no longer wanted. */
export interface TickSpan {
  readonly from: number;
  readonly to: number;
}

export interface PreparationPlan {
  readonly source: PictureSource;
  readonly traits: PictureTraits;
  readonly timeBase: Rational;
  readonly copies: CopyPlan;
  /** null prepares the whole clip */
  readonly span: TickSpan | null;
  readonly threads: number;
  readonly paths: { bench: string; replay: string; poster: string; strip: string };
}

/** All copies from one decode: the picture is scaled and tone mapped once, then split. */
export function preparationJob(plan: PreparationPlan): FfmpegJob {
  const { source, copies, paths, span } = plan;
  return {
    input: { path: source.path, args: inputArgs(source.demuxer, plan.threads, seek(plan)) },
    graph: [
      chain(`[0:${source.streamIndex}]`, [
        ...(span ? [`trim=start_pts=${span.from}:end_pts=${span.to}`] : []),
        'setpts=PTS-STARTPTS',
        ...toPixels(plan.traits, copies.bench, 'yuv420p'),
        'split=4[bench][r][p][s]',
      ]),
      chain('[r]', [scale(copies.replay), 'setsar=1[replay]']),
      // the first frame stands in where the clip ends before the middle one
      chain('[p]', [pick([0, copies.poster.frame]), scale(copies.poster), 'setsar=1[poster]']),
      chain('[s]', [
        pick(copies.strip.frames),
        scale(copies.strip.tile),
        `tile=${copies.strip.frames.length}x1[strip]`,
      ]),
    ].join(';'),
    outputs: [
      { path: paths.bench, args: ['-map', '[bench]', ...video(plan), ...bench(copies.bench.gop)] },
      { path: paths.replay, args: ['-map', '[replay]', ...video(plan), ...replay(copies)] },
      { path: paths.poster, args: ['-map', '[poster]', ...picture(3)] },
      { path: paths.strip, args: ['-map', '[strip]', ...picture(4)] },
    ],
  };
}

/**
 * Starts at the key frame before the span and keeps the original's clock, so that `trim` can compare
 * whole ticks; the seconds only need to lie before the span.
 */
function seek({ span, timeBase }: PreparationPlan): string[] {
  if (!span) return [];
  const from = Math.max(0, secondsOf({ ticks: span.from, timeBase }) - 0.01);
  return ['-copyts', '-noaccurate_seek', '-seek_timestamp', '1', '-ss', from.toFixed(6)];
}

/**
 * `passthrough` keeps every frame with its own time; the encoder counts in the original's ticks, or
 * times would be rounded to the frame rate (up to 12 ms off). The time base is spelled out because
 * ffmpeg 5.1 cannot find the source's behind a filter graph (`-1`).
 */
const video = ({ timeBase, threads, traits }: PreparationPlan): string[] => [
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

/** Without B-frames a decoder gives one picture per packet; a short distance of key frames makes a jump cheap. */
const bench = (gop: 1 | 5): string[] =>
  gop === 1
    ? ['-preset', 'superfast', '-crf', '23', '-g', '1']
    : ['-preset', 'veryfast', '-crf', '20', '-g', '5', '-keyint_min', '5', '-sc_threshold', '0'];

const replay = ({ replay: { gop } }: CopyPlan): string[] => [
  '-preset',
  'veryfast',
  '-crf',
  '24',
  '-g',
  `${gop}`,
];

/** One JPEG; a later picture replaces an earlier one. Quality by ffmpeg's scale, 2 best to 31. */
const picture = (quality: number): string[] => [
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

const chain = (from: string, filters: readonly string[]) => `${from}${filters.join(',')}`;
const scale = ({ width, height }: { width: number; height: number }) => `scale=${width}:${height}`;
const pick = (frames: readonly number[]) =>
  `select='${[...new Set(frames)].map((n) => `eq(n,${n})`).join('+')}'`;
