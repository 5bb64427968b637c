import { stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Fill } from '#shared/overlay/fills/fill-context.ts';
import { fillScript } from '#shared/overlay/fills/fill-script.ts';
import { burnInJob, stretched } from './burn-in-args.ts';
import { prepareLimits } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { matchFrames } from './match-frames.ts';
import { readCopy } from './read-copies.ts';
import { runFfmpeg } from './run-ffmpeg.ts';
import { withoutPaths } from './tool-outcome.ts';
import type { FrameTable, Size } from './types.ts';

export interface BurnInRequest {
  /** A copy that has every frame of the table, at its time. */
  readonly copy: string;
  readonly frames: FrameTable;
  /** The frames that are shown, both inclusive. */
  readonly from: number;
  readonly to: number;
  /** Of the picture that is made; both even. */
  readonly size: Size;
  /** Height of the band under it, px; even. */
  readonly band: number;
  /** `#RRGGBB` */
  readonly ground: string;
  /** What is drawn on which frames, both inclusive; later over earlier. */
  readonly drawn: readonly {
    readonly from: number;
    readonly to: number;
    readonly fills: readonly Fill[];
  }[];
  /** Typical frames a second. */
  readonly perSecond: number;
  /** An empty folder that the caller keeps or removes. */
  readonly folder: string;
  readonly threads?: number;
  readonly signal?: AbortSignal;
}

/**
 * A film of a span with drawings in its picture, frame by frame with the copy's own times.
 * @throws MediaFailure
 */
export async function burnIn(request: BurnInRequest): Promise<{ path: string; bytes: number }> {
  const { frames, from, to, size, band, drawn, folder, signal, threads = 1 } = request;
  const script = join(folder, 'drawn.ass');
  const whole = { width: size.width, height: size.height + band };
  const shown = drawn.map((each) => ({
    ...stretched(frames, { from, to }, each),
    fills: each.fills,
  }));
  await writeFile(script, fillScript(whole, shown));
  const path = join(folder, 'film.mp4');
  const outcome = await runFfmpeg(
    burnInJob({
      copy: request.copy,
      timeBase: frames.timeBase,
      ...{ from, to, size, band, script, path, threads },
      ground: request.ground.slice(1),
      gop: Math.max(1, Math.round(request.perSecond)),
    }),
    { limits: prepareLimits, signal },
  );
  const made = outcome.exitCode === 0 ? await readCopy(path) : null;
  const promised = frames.ticks.slice(from, to + 1);
  const match = made && matchFrames(promised, frames.timeBase, made.frames);
  const { size: bytes } = await stat(path).catch(() => ({ size: 0 }));
  // with a frame more, less or elsewhere the drawings would stand on the wrong ones
  if (!match || match.first !== 0 || match.lost.length > 0 || bytes === 0)
    throw new MediaFailure('tool-failed', withoutPaths(outcome.complaints));
  return { path, bytes };
}
