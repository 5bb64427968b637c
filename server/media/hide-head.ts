import { stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Box } from '#shared/geometry/boxes.ts';
import { prepareLimits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { boxCommands, evenBox, hideHeadJob, mosaicOf } from './hide-head-args.ts';
import { posterLongEdge } from './limits.ts';
import { matchFrames } from './match-frames.ts';
import { fitEven } from './picture-filters.ts';
import { readCopy } from './read-copies.ts';
import { runFfmpeg } from './run-ffmpeg.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { FrameTable, Size } from './types.ts';

export interface HideHeadRequest {
  readonly benchCopy: string;
  /** Of the upright source frame: boxes are in it. */
  readonly source: Size;
  /** Of the copy that is made. */
  readonly size: Size;
  /** Typical frames a second. */
  readonly perSecond: number;
  /** Of the bench copy. */
  readonly frames: FrameTable;
  /** The frames that are shown, both inclusive; all others are hidden whole. */
  readonly from: number;
  readonly to: number;
  /** One for every frame that is shown. */
  readonly heads: readonly { readonly frame: number; readonly box: Box }[];
  /** An empty folder that the caller keeps or removes. */
  readonly folder: string;
  readonly threads?: number;
  readonly signal?: AbortSignal;
}

export interface HiddenCopy {
  readonly video: string;
  readonly poster: string;
}

/**
 * A replay copy on which the head is a handful of coloured cells, frame by frame with the bench copy's own times.
 * The clear pixels are gone: nothing that is served can be uncovered.
 * @throws RangeError where a shown frame has no box, MediaFailure
 */
export async function hideHead(request: HideHeadRequest): Promise<HiddenCopy> {
  const { source, size, frames, from, to, folder, signal, threads = 1 } = request;
  const boxes = new Array<Box | null>(frames.ticks.length).fill(null);
  for (const { frame, box } of request.heads)
    if (frame >= from && frame <= to) boxes[frame] = evenBox(box, source, size);
  for (let frame = from; frame <= to; frame += 1)
    if (!boxes[frame]) throw new RangeError(`Frame ${frame} has no box.`);
  const commands = join(folder, 'boxes.txt');
  await writeFile(commands, boxCommands(frames, boxes));
  const made = { video: join(folder, 'video.mp4'), poster: join(folder, 'poster.jpg') };
  const outcome = await runFfmpeg(
    hideHeadJob({
      benchCopy: request.benchCopy,
      timeBase: frames.timeBase,
      video: { ...size, path: made.video, gop: Math.max(1, Math.round(request.perSecond)) },
      poster: {
        ...fitEven(size, posterLongEdge),
        path: made.poster,
        frame: Math.floor((from + to) / 2),
      },
      mosaic: mosaicOf(
        size,
        boxes.filter((box) => box !== null),
      ),
      commands,
      threads,
    }),
    { limits: prepareLimits, signal },
  );
  const copy = outcome.exitCode === 0 ? await readCopy(made.video) : null;
  const match = copy && matchFrames(frames.ticks, frames.timeBase, copy.frames);
  const { size: pictureBytes } = await stat(made.poster).catch(() => ({ size: 0 }));
  // a copy with a frame more, less or elsewhere would have been covered at the wrong places
  if (!match || match.first !== 0 || match.lost.length > 0 || pictureBytes === 0)
    throw new MediaFailure('tool-failed', withoutPaths(outcome.complaints));
  return made;
}
