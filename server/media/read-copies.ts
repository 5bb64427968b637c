import { stat } from 'node:fs/promises';
import type { CopyPaths } from './copy-paths.ts';
import { copyArgs } from './ffprobe-args.ts';
import { tableOf } from './frame-table.ts';
import { MediaFailure } from './failures.ts';
import type { CopyPlan } from './plan-copies.ts';
import type { ProbedClip } from './probe.ts';
import { parseRational } from './rational.ts';
import { MediaRefusal } from './refusals.ts';
import type { FfmpegOutcome } from './run-ffmpeg.ts';
import { runFfprobe } from './run-ffprobe.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { FrameTable, Rational } from './types.ts';

/** ffmpeg's own code for 'more than two thirds of the frames could not be decoded'. */
const mostlyUndecodable = 69;

/**
 * The frame table read back from the bench copy: what will be shown, not what was meant.
 * @throws MediaRefusal, MediaFailure where there is no usable copy
 */
export async function readFrames(
  clip: ProbedClip,
  paths: CopyPaths,
  copies: CopyPlan,
  outcome: FfmpegOutcome,
  signal: AbortSignal | undefined,
): Promise<FrameTable> {
  const failed = outcome.exitCode !== 0 && outcome.exitCode !== mostlyUndecodable;
  const copy = failed ? null : await readCopy(paths.bench, signal);
  if (!copy) throw undecodable(clip, outcome);
  const { width, height } = copy;
  if (width !== copies.bench.width || height !== copies.bench.height)
    throw new MediaFailure('tool-failed', `the bench copy came out as ${width} × ${height}`);
  return copy.frames;
}

/** Null where there is no picture in it. */
async function readCopy(path: string, signal: AbortSignal | undefined) {
  const ticks: number[] = [];
  let stream: { width: number; height: number; timeBase: Rational } | null = null;
  await runFfprobe(
    copyArgs(path),
    (line) => {
      const [kind, first, second, third] = line.split(',');
      if (kind === 'packet' && !second?.includes('D')) ticks.push(Number(first));
      const timeBase = kind === 'stream' ? parseRational(third) : null;
      if (timeBase) stream = { width: Number(first), height: Number(second), timeBase };
    },
    signal,
  );
  return readTable(ticks, stream);
}

function readTable(
  ticks: number[],
  stream: { width: number; height: number; timeBase: Rational } | null,
) {
  if (!stream || ticks.length === 0 || !ticks.every(Number.isSafeInteger)) return null;
  ticks.sort((a, b) => a - b);
  return { width: stream.width, height: stream.height, frames: tableOf(ticks, stream.timeBase) };
}

/** The clip's fault where the decoder says so, else the machine's. */
function undecodable(clip: ProbedClip, outcome: FfmpegOutcome): Error {
  const decoder = outcome.complaints.some((line) =>
    /Error while decoding|Invalid data found|corrupt/.test(line),
  );
  if (!decoder)
    return new MediaFailure(
      'tool-failed',
      `exit ${outcome.exitCode ?? outcome.signal}: ${withoutPaths(outcome.complaints)}`,
    );
  return clip.file.cut
    ? new MediaRefusal('only-header', {})
    : new MediaRefusal('damaged', { fromSeconds: 0, lostFrames: null, haveSeconds: 0 });
}

/** Sizes of the finished files, under their final names. A missing file throws. */
export async function describeCopies(
  from: CopyPaths,
  to: CopyPaths,
  { bench, replay, poster, strip }: CopyPlan,
) {
  const bytes = async (path: string) => (await stat(path)).size;
  await Promise.all([bytes(from.poster), bytes(from.strip)]);
  const { width, height } = replay;
  return {
    bench: { path: to.bench, bytes: await bytes(from.bench), ...bench },
    replay: { path: to.replay, bytes: await bytes(from.replay), width, height },
    poster: { path: to.poster, width: poster.width, height: poster.height },
    strip: { path: to.strip, ...strip },
  };
}
