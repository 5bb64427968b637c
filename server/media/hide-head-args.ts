import { type Box, boxWithin } from '#shared/geometry/boxes.ts';
import { pictureArgs, replayArgs, videoArgs } from './encode-args.ts';
import { type FfmpegJob, inputArgs } from './ffmpeg-job.ts';
import { inGraph } from './in-graph.ts';
import type { FrameTable, Rational, Size } from './types.ts';

/** A head shows at most so many cells along its larger edge. Chosen, no source. */
const CELLS_PER_HEAD = 5;
const LEAST_CELL = 8;

/** A whole number of pixels on every side, even as 4:2:0 video needs, never smaller than the box. */
export const evenBox = (box: Box, from: Size, to: Size): Box | null => {
  const [across, down] = [to.width / from.width, to.height / from.height];
  const low = (edge: number) => Math.floor(edge / 2) * 2;
  const high = (edge: number) => Math.ceil(edge / 2) * 2;
  const left = low(box.left * across);
  const top = low(box.top * down);
  const width = high((box.left + box.width) * across) - left;
  const height = high((box.top + box.height) * down) - top;
  return boxWithin({ left, top, width, height }, to);
};

/** How many cells the whole picture is cut into, so that the smallest head is a handful. */
export const mosaicOf = (picture: Size, boxes: readonly Box[]): Size => {
  const head = Math.min(...boxes.map(({ width, height }) => Math.max(width, height)));
  const cell = Math.max(LEAST_CELL, Number.isFinite(head) ? head / CELLS_PER_HEAD : Infinity);
  const cells = (edge: number) => Math.max(1, Math.floor(edge / cell));
  return { width: cells(picture.width), height: cells(picture.height) };
};

/**
 * What moves the mask's box from frame to frame. A command is given halfway between two frames, so that no rounding
 * of times gives it to the wrong one.
 * @param boxes one for every frame of the table; null hides the whole picture
 */
export const boxCommands = (frames: FrameTable, boxes: readonly (Box | null)[]): string => {
  const { num, den } = frames.timeBase;
  const at = (ticks: number) => ((ticks * num) / den).toFixed(6);
  return frames.ticks
    .map((tick, index) => {
      const before = frames.ticks[index - 1];
      const next = frames.ticks[index + 1];
      const from = before === undefined ? '0' : at((before + tick) / 2);
      const to = next === undefined ? at(tick + den / num) : at((tick + next) / 2);
      const box = boxes[index] ?? null;
      const place = box
        ? { x: box.left, y: box.top, w: box.width, h: box.height }
        : { x: 0, y: 0, w: 'iw', h: 'ih' };
      const set = Object.entries(place).map(([name, value]) => `[enter] drawbox ${name} ${value}`);
      return `${from}-${to} ${set.join(', ')};\n`;
    })
    .join('');
};

export interface HideHeadPlan {
  readonly benchCopy: string;
  readonly timeBase: Rational;
  /** Key frames a second apart. */
  readonly video: Size & { readonly path: string; readonly gop: number };
  readonly poster: Size & { readonly path: string; readonly frame: number };
  readonly mosaic: Size;
  /** Where `boxCommands` lie. */
  readonly commands: string;
  readonly threads: number;
}

/**
 * The whole picture as a mosaic, let through where a mask is white. All three come from one frame, so that none can
 * be paired with another's; before the first command the mask is white all over.
 */
export function hideHeadJob(plan: HideHeadPlan): FfmpegJob {
  const { benchCopy, timeBase, threads, video, poster, mosaic, commands } = plan;
  const traits = { turned: video, dynamicRange: 'standard', fullRange: false } as const;
  const size = ({ width, height }: Size) => `${width}:${height}`;
  return {
    input: { path: benchCopy, args: inputArgs('mov', threads) },
    graph: [
      `[0:0]scale=${size(video)},format=yuv420p,setsar=1,split=3[clear][m][b]`,
      `[m]scale=${size(mosaic)}:flags=area,scale=${size(video)}:flags=neighbor,setsar=1[mosaic]`,
      `[b]format=gray,lut=y=0,sendcmd=f=${inGraph(commands)},drawbox=x=0:y=0:w=iw:h=ih:color=white:t=fill,lut=y='if(gt(val,64),255,0)'[mask]`,
      '[mosaic][mask]alphamerge[hidden]',
      '[clear][hidden]overlay=format=yuv420,split=2[video][p]',
      `[p]select='eq(n,${poster.frame})',scale=${size(poster)},setsar=1[poster]`,
    ].join(';'),
    outputs: [
      {
        path: video.path,
        args: [
          ...['-map', '[video]', ...videoArgs({ timeBase, threads, traits })],
          ...replayArgs(video.gop),
        ],
      },
      { path: poster.path, args: ['-map', '[poster]', ...pictureArgs(3)] },
    ],
  };
}
