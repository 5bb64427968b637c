import { resolve } from 'node:path';
import { prepareLimits, readLimits } from './confinement.ts';
import { type CopyPaths, copyPathsIn } from './copy-paths.ts';
import { MediaFailure } from './failures.ts';
import { typicalRate } from './measure-rate.ts';
import { turnedSize } from './picture-filters.ts';
import { type CopyPlan, planCopies, planPictures } from './plan-copies.ts';
import { picturesJob, preparationJob } from './preparation-args.ts';
import { type ProbedClip, probe } from './probe.ts';
import { progressMeter } from './progress.ts';
import { readFrames, describeCopies } from './read-copies.ts';
import { type FfmpegOutcome, runFfmpeg } from './run-ffmpeg.ts';
import { settle } from './settle.ts';
import type { PreparedClip, PrepareRequest } from './types.ts';
import { type ValidClip, validate } from './validate.ts';
import { openWorkspace } from './workspace.ts';

/**
 * Checks a clip and makes its copies. `outDir` appears whole at the end or not at all; killed at any
 * instant it leaves a folder `outDir.part-…` that the next run sweeps, so it can always be run again.
 *
 * @throws MediaRefusal for a clip that is not taken, MediaFailure for a fault of the machine or a
 * cancelled run
 */
export async function prepareClip(request: PrepareRequest): Promise<PreparedClip> {
  const { signal } = request;
  const meter = progressMeter(request.onProgress);
  meter.checking(0);
  const workspace = await openWorkspace(request.outDir);
  try {
    const clip = await probe(resolve(request.original), request);
    const valid = validate(clip, request);
    meter.checking(1);
    const copies = planCopies(
      clip.facts.upright,
      valid.expected.length,
      typicalRate(clip.facts.frameRate),
    );
    meter.copyingBegins();
    const temporary = copyPathsIn(workspace.path);
    const outcome = await copy(clip, valid, copies, temporary, request, (frames) =>
      meter.copied(frames, valid.expected.length),
    );
    meter.finishing();
    const frames = await readFrames(clip, temporary, copies, outcome);
    const { corruptFrames } = outcome;
    const accept = request.acceptRemains ?? false;
    const match = settle(clip, valid, { frames, corruptFrames }, accept);
    const complete = frames.ticks.length === valid.expected.length;
    const kept = complete
      ? copies
      : { ...copies, ...planPictures(clip.facts.upright, frames.ticks.length) };
    if (!complete) await runFfmpeg(picturesJob(kept, temporary), { limits: readLimits, signal });
    const prepared: PreparedClip = {
      facts: clip.facts,
      ...(await describeCopies(temporary, copyPathsIn(resolve(request.outDir)), kept)),
      frames,
      origin: {
        ticks: valid.expected[match.first] ?? clip.facts.startOffset.ticks,
        timeBase: clip.picture.timeBase,
      },
      part: request.part ?? null,
      lostFrames: match.first + match.lost.length,
    };
    signal?.throwIfAborted();
    await workspace.publish();
    meter.done();
    return prepared;
  } catch (error) {
    throw signal?.aborted ? new MediaFailure('cancelled') : error;
  } finally {
    await workspace.discard();
  }
}

const copy = (
  clip: ProbedClip,
  valid: ValidClip,
  copies: CopyPlan,
  paths: CopyPaths,
  { threads = 1, signal }: PrepareRequest,
  onFrame: (frames: number) => void,
): Promise<FfmpegOutcome> =>
  runFfmpeg(
    preparationJob({
      source: {
        path: clip.file.path,
        demuxer: clip.file.demuxer,
        streamIndex: clip.picture.index,
      },
      traits: {
        turned: turnedSize(clip.picture),
        dynamicRange: clip.picture.dynamicRange,
        fullRange: clip.picture.fullRange,
      },
      timeBase: clip.picture.timeBase,
      copies,
      span: valid.span,
      threads,
      paths,
    }),
    { limits: prepareLimits, onFrame, signal },
  );
