import { stat } from 'node:fs/promises';
import type { Box } from '#shared/geometry/boxes.ts';
import { readLimits } from './confinement.ts';
import { pictureArgs } from './encode-args.ts';
import { MediaFailure } from './failures.ts';
import { type FfmpegJob, inputArgs } from './ffmpeg-job.ts';
import { evenBox, mosaicOf } from './hide-head-args.ts';
import { runFfmpeg } from './run-ffmpeg.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { Size } from './types.ts';

export interface KeyFrameRequest {
  readonly benchCopy: string;
  /** Index of the frame in the copy. */
  readonly frame: number;
  /** Of the upright source frame: boxes are in it. */
  readonly source: Size;
  /** Of the whole picture before it is cut; both even. */
  readonly size: Size;
  /** What hides the head on this frame, source px. */
  readonly head: Box;
  /** What is shown of it, source px. */
  readonly part: Box;
  readonly path: string;
  readonly signal?: AbortSignal;
}

/** A part of the picture, px of it, as what is cut from it and laid on it takes: even on every side. */
const partOf = (box: Box, { source, size }: KeyFrameRequest): Box => {
  const even = evenBox(box, source, size);
  // nothing is shown of which nobody knows where it is
  if (!even) throw new RangeError('A box of a key frame lies beside its picture.');
  return even;
};

const cut = ({ left, top, width, height }: Box) => `crop=${width}:${height}:${left}:${top}`;

/** One frame of the bench copy with a mosaic over the head, cut to what is shown. */
export function keyFrameJob(request: KeyFrameRequest): FfmpegJob {
  const { benchCopy, frame, size, path } = request;
  const head = partOf(request.head, request);
  const mosaic = mosaicOf(size, [head]);
  const to = ({ width, height }: Size) => `${width}:${height}`;
  return {
    input: { path: benchCopy, args: inputArgs('mov', 1) },
    graph: [
      `[0:0]select='eq(n,${frame})',scale=${to(size)},format=yuv420p,setsar=1,split[clear][m]`,
      `[m]scale=${to(mosaic)}:flags=area,scale=${to(size)}:flags=neighbor,setsar=1,${cut(head)}[head]`,
      `[clear][head]overlay=${head.left}:${head.top},${cut(partOf(request.part, request))}[still]`,
    ].join(';'),
    outputs: [{ path, args: ['-map', '[still]', '-frames:v', '1', ...pictureArgs(3)] }],
  };
}

/** @returns the part that was cut, px of the whole picture */
export async function keyFrame(request: KeyFrameRequest): Promise<Box> {
  const { complaints } = await runFfmpeg(keyFrameJob(request), {
    limits: readLimits,
    signal: request.signal,
  });
  const { size } = await stat(request.path).catch(() => ({ size: 0 }));
  if (size === 0) throw new MediaFailure('tool-failed', withoutPaths(complaints));
  return partOf(request.part, request);
}
