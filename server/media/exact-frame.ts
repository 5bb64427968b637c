import { stat } from 'node:fs/promises';
import { resolve } from 'node:path';
import { checkFile } from './check-file.ts';
import { readLimits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { sheetColumns, sheetRows } from './limits.ts';
import { turnedSize } from './picture-filters.ts';
import { divide, rational } from './rational.ts';
import { readHeader } from './read-header.ts';
import { runFfmpeg } from './run-ffmpeg.ts';
import { sheetJob, sheetTile, stillJob, type StillFormat } from './still-args.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { FrameTable, Size, Timestamp } from './types.ts';
import { writeWhole } from './workspace.ts';

/** The original's own instant of a prepared frame: exact, whole ticks. */
export function originalTimestamp(origin: Timestamp, frames: FrameTable, index: number): Timestamp {
  const tick = frames.ticks[index];
  if (tick === undefined)
    throw new RangeError(`There is no frame ${index} among ${frames.ticks.length}.`);
  const { num, den } = divide(frames.timeBase, origin.timeBase);
  const moved = rational(BigInt(tick) * BigInt(num), den);
  if (moved.den !== 1) throw new RangeError('The frame table is not a copy of this clock.');
  return { ticks: origin.ticks + moved.num, timeBase: origin.timeBase };
}

export interface ExactFrameRequest {
  readonly original: string;
  /** on the original's clock: `originalTimestamp` */
  readonly at: Timestamp;
  /** where the picture appears, whole; the caller keeps it */
  readonly path: string;
  readonly format?: StillFormat;
  readonly signal?: AbortSignal;
}

/**
 * The frame that stands at this very instant of the original: full resolution, upright, square
 * pixels, ordinary dynamic range.
 * @throws MediaFailure frame-not-found where no frame stands there
 */
export async function exactFrame(request: ExactFrameRequest): Promise<{ path: string } & Size> {
  const { signal, at, format = 'jpeg' } = request;
  const file = await checkFile(resolve(request.original));
  const { picture } = await readHeader(file, signal);
  const step = divide(at.timeBase, picture.timeBase);
  const tick = rational(BigInt(at.ticks) * BigInt(step.num), step.den);
  if (tick.den !== 1) throw new MediaFailure('frame-not-found');
  const plan = {
    source: { path: file.path, demuxer: file.demuxer, streamIndex: picture.index },
    traits: {
      turned: turnedSize(picture),
      dynamicRange: picture.dynamicRange,
      fullRange: picture.fullRange,
    },
    timeBase: picture.timeBase,
    upright: picture.upright,
    tick: tick.num,
    format,
  };
  await writeWhole(request.path, async (path) => {
    for (const seek of [true, false]) {
      const job = stillJob({ ...plan, path, seek });
      await runFfmpeg(job, { limits: readLimits, signal });
      if (await isWritten(path)) return;
    }
    throw new MediaFailure('frame-not-found');
  });
  return { path: resolve(request.path), ...picture.upright };
}

export interface FrameSheetRequest {
  readonly benchCopy: string;
  /** of the bench copy, px */
  readonly size: Size;
  readonly frames: FrameTable;
  /** index of the first frame on the sheet */
  readonly first: number;
  readonly path: string;
  readonly signal?: AbortSignal;
}

export interface FrameSheet {
  readonly path: string;
  readonly first: number;
  /** cells in use, left to right, then down */
  readonly count: number;
  readonly columns: number;
  readonly rows: number;
  readonly tile: Size;
}

/** Up to thirty frames of the bench copy in one picture, for browsers without a frame decoder. */
export async function frameSheet(request: FrameSheetRequest): Promise<FrameSheet> {
  const { frames, first, size, signal } = request;
  const count = Math.min(sheetColumns * sheetRows, frames.ticks.length - first);
  const from = frames.ticks[first];
  const last = frames.ticks[first + count - 1];
  if (from === undefined || last === undefined)
    throw new RangeError(`There is no frame ${first} among ${frames.ticks.length}.`);
  await writeWhole(request.path, async (path) => {
    const span = { from, to: last + 1 };
    const plan = { benchCopy: resolve(request.benchCopy), size, timeBase: frames.timeBase, span };
    const { complaints } = await runFfmpeg(sheetJob({ ...plan, path }), {
      limits: readLimits,
      signal,
    });
    if (!(await isWritten(path))) throw new MediaFailure('tool-failed', withoutPaths(complaints));
  });
  const tile = sheetTile(size);
  return {
    path: resolve(request.path),
    first,
    count,
    columns: sheetColumns,
    rows: sheetRows,
    tile,
  };
}

const isWritten = (path: string): Promise<boolean> =>
  stat(path).then(
    ({ size }) => size > 0,
    () => false,
  );
