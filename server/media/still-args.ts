import { inputArgs, type FfmpegJob, type PictureSource } from './ffmpeg-job.ts';
import { sheetColumns, sheetMaxPixels, sheetRows, sheetTileLongEdge } from './limits.ts';
import { fitEven, type PictureTraits, toPixels } from './picture-filters.ts';
import { seekArgs, type TickSpan, trim } from './tick-span.ts';
import type { Rational, Size } from './types.ts';

export type StillFormat = 'jpeg' | 'png';

export interface StillPlan {
  readonly source: PictureSource;
  readonly traits: PictureTraits;
  readonly timeBase: Rational;
  readonly upright: Size;
  /** on the original's clock */
  readonly tick: number;
  readonly format: StillFormat;
  readonly path: string;
  /** false reads from the start: slow, for files whose key frames are not where they say */
  readonly seek: boolean;
}

/** One frame of the original, at its own resolution, upright, by its exact instant. */
export function stillJob(plan: StillPlan): FfmpegJob {
  const span: TickSpan = { from: plan.tick, to: plan.tick + 1 };
  const pixels = toPixels(plan.traits, plan.upright, plan.format === 'png' ? 'rgb24' : 'yuvj420p');
  const position = plan.seek ? seekArgs(span, plan.timeBase) : ['-copyts'];
  return {
    input: { path: plan.source.path, args: inputArgs(plan.source.demuxer, 1, position) },
    graph: `[0:${plan.source.streamIndex}]${[trim(span), ...pixels].join(',')}[still]`,
    outputs: [{ path: plan.path, args: ['-map', '[still]', '-frames:v', '1', ...picture(plan)] }],
  };
}

const picture = ({ format }: Pick<StillPlan, 'format'>): string[] => [
  '-map_metadata',
  '-1',
  '-fps_mode',
  'passthrough',
  ...(format === 'png' ? ['-c:v', 'png'] : ['-c:v', 'mjpeg', '-q:v', '2']),
  '-threads',
  '1',
  '-update',
  '1',
  '-f',
  'image2',
];

/** A sheet shows `sheetColumns × sheetRows` frames, left to right, then down; unused cells are black. */
export function sheetTile(copy: Size): Size {
  const byEdge = fitEven(copy, sheetTileLongEdge);
  const area = sheetMaxPixels / (sheetColumns * sheetRows);
  const factor = Math.sqrt(Math.min(1, area / (byEdge.width * byEdge.height)));
  return fitEven(byEdge, Math.floor(Math.max(byEdge.width, byEdge.height) * factor));
}

export interface SheetPlan {
  readonly benchCopy: string;
  readonly size: Size;
  readonly timeBase: Rational;
  /** ticks of the copy's clock */
  readonly span: TickSpan;
  readonly path: string;
}

/** Thirty frames of the bench copy as one JPEG, for browsers that cannot decode frame by frame. */
export function sheetJob({ benchCopy, size, timeBase, span, path }: SheetPlan): FfmpegJob {
  const tile = sheetTile(size);
  const filters = [
    trim(span),
    `scale=${tile.width}:${tile.height}`,
    `tile=${sheetColumns}x${sheetRows}`,
  ];
  return {
    input: { path: benchCopy, args: inputArgs('mov', 1, seekArgs(span, timeBase)) },
    graph: `[0:0]${filters.join(',')}[sheet]`,
    outputs: [
      {
        path,
        args: ['-map', '[sheet]', '-frames:v', '1', ...picture({ format: 'jpeg' })],
      },
    ],
  };
}
