import { inputArgs, type FfmpegJob, type PictureSource } from './ffmpeg-job.ts';
import { pictureArgs, replayArgs, videoArgs } from './encode-args.ts';
import { type PictureTraits, toPixels } from './picture-filters.ts';
import type { CopyPlan } from './plan-copies.ts';
import { seekArgs, type TickSpan, trim } from './tick-span.ts';
import type { Rational } from './types.ts';
import type { CopyPaths } from './copy-paths.ts';

export interface PreparationPlan {
  readonly source: PictureSource;
  readonly traits: PictureTraits;
  readonly timeBase: Rational;
  readonly copies: CopyPlan;
  /** null prepares the whole clip */
  readonly span: TickSpan | null;
  readonly threads: number;
  readonly paths: CopyPaths;
}

/** All copies from one decode: each smaller picture is scaled from the next larger one. */
export function preparationJob(plan: PreparationPlan): FfmpegJob {
  const { source, copies, paths, span } = plan;
  return {
    input: {
      path: source.path,
      args: inputArgs(source.demuxer, plan.threads, span ? seekArgs(span, plan.timeBase) : []),
    },
    graph: [
      chain(`[0:${source.streamIndex}]`, [
        ...(span ? [trim(span)] : []),
        'setpts=PTS-STARTPTS',
        ...toPixels(plan.traits, copies.bench, 'yuv420p'),
        'split=2[bench][r]',
      ]),
      chain('[r]', [`${scale(copies.replay)}:${cheap}`, 'setsar=1', 'split=3[replay][p][s]']),
      ...pictureChains(copies),
    ].join(';'),
    outputs: [
      {
        path: paths.bench,
        args: ['-map', '[bench]', ...videoArgs(plan), ...bench(copies.bench.gop)],
      },
      {
        path: paths.replay,
        args: ['-map', '[replay]', ...videoArgs(plan), ...replayArgs(copies.replay.gop)],
      },
      ...pictureOutputs(paths),
    ],
  };
}

/** Poster and strip once more, from the bench copy: where frames were lost, their places have moved. */
export const picturesJob = (
  copies: Pick<CopyPlan, 'poster' | 'strip'>,
  paths: CopyPaths,
): FfmpegJob => ({
  input: { path: paths.bench, args: inputArgs('mov', 1) },
  graph: ['[0:0]split=2[p][s]', ...pictureChains(copies)].join(';'),
  outputs: pictureOutputs(paths),
});

/**
 * The replay copy and what is cut from it is looked at, not measured on: a triangle filter takes a
 * third less time than the usual bicubic one and leaves less grain to encode.
 */
const cheap = 'flags=bilinear';

/**
 * Each picture is written over by the next, from the first frame on: ffmpeg reports no progress
 * before every output has begun. The strip is a row that moves one tile to the left per picked
 * frame; of its states only the first and the last, which holds the wanted ones, are encoded.
 */
const pictureChains = ({ poster, strip }: Pick<CopyPlan, 'poster' | 'strip'>): string[] => [
  chain('[p]', [pick([0, poster.frame]), scale(poster), 'setsar=1', `${apart}[poster]`]),
  chain('[s]', [
    pick([0, ...strip.frames]),
    scale(strip.tile),
    apart,
    ...row(strip.frames.length),
    `${pick([0, new Set([0, ...strip.frames]).size - 1])}[strip]`,
  ]),
];

/** A second apart, or uneven frames would fall on one tick of the picture encoder's clock. */
const apart = 'settb=1/1,setpts=N';

const row = (tiles: number) =>
  tiles === 1 ? [] : [`tile=${tiles}x1:overlap=${tiles - 1}:init_padding=${tiles - 1}`];

const pictureOutputs = (paths: CopyPaths) => [
  { path: paths.poster, args: ['-map', '[poster]', ...pictureArgs(3)] },
  { path: paths.strip, args: ['-map', '[strip]', ...pictureArgs(4)] },
];

/**
 * Without B-frames a decoder gives one picture per packet; a short distance of key frames makes a
 * jump cheap. A picture cut in four can be decoded by several processors at once, where otherwise
 * only pictures in a row are: a jump takes half the time on two, and the copy grows by 0.3 %.
 */
const bench = (gop: 1 | 5): string[] => [
  ...(gop === 1
    ? ['-preset', 'superfast', '-crf', '23', '-g', '1']
    : ['-preset', 'veryfast', '-crf', '20', '-g', '5', '-keyint_min', '5', '-sc_threshold', '0']),
  '-x264-params',
  'sliced-threads=1:slices=4',
];

const chain = (from: string, filters: readonly string[]) => `${from}${filters.join(',')}`;
const scale = ({ width, height }: { width: number; height: number }) => `scale=${width}:${height}`;
const pick = (frames: readonly number[]) =>
  `select='${[...new Set(frames)].map((n) => `eq(n,${n})`).join('+')}'`;
