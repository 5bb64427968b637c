import { EncodedPacketSink, FilePathSource, Input, MP4 } from 'mediabunny';
import { stat } from 'node:fs/promises';
import type { CopyPaths } from './copy-paths.ts';
import { tableOf } from './frame-table.ts';
import { MediaFailure } from './failures.ts';
import type { CopyPlan } from './plan-copies.ts';
import type { ProbedClip } from './probe.ts';
import { MediaRefusal } from './refusals.ts';
import type { FfmpegOutcome } from './run-ffmpeg.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { FrameTable } from './types.ts';

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
): Promise<FrameTable> {
  const failed = outcome.exitCode !== 0 && outcome.exitCode !== mostlyUndecodable;
  const copy = failed ? null : await readCopy(paths.bench);
  if (!copy) throw undecodable(clip, outcome);
  const { width, height } = copy;
  if (width !== copies.bench.width || height !== copies.bench.height)
    throw new MediaFailure('tool-failed', `the bench copy came out as ${width} × ${height}`);
  return copy.frames;
}

/**
 * Size and frame table of a copy; null where there is no picture in it. Read by the library that the browser reads it with, without
 * decoding: to start ffprobe once more costs a short clip a tenth of its preparation.
 */
export async function readCopy(path: string) {
  const input = new Input({ source: new FilePathSource(path), formats: [MP4] });
  try {
    const track = (await input.canRead()) ? await input.getPrimaryVideoTrack() : null;
    if (!track) return null;
    const perSecond = await track.getTimeResolution();
    const packets = new EncodedPacketSink(track).packets(undefined, undefined, {
      metadataOnly: true,
    });
    const ticks: number[] = [];
    for await (const { timestamp } of packets) ticks.push(Math.round(timestamp * perSecond));
    if (ticks.length === 0) return null;
    const frames = tableOf(
      ticks.sort((a, b) => a - b),
      { num: 1, den: perSecond },
    );
    return { width: await track.getCodedWidth(), height: await track.getCodedHeight(), frames };
  } finally {
    input.dispose();
  }
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
