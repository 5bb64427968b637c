import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { TruthFile } from '#tests/fixtures/clips/truth.ts';
import type { ClipPlan } from '../clips.ts';
import { PICTURE } from '../model/camera.ts';
import { makeTake } from '../model/take.ts';
import { clipTruth } from '../model/truth.ts';
import { paintFrames } from './director.ts';
import { Encoder } from './encoder.ts';
import { checkTimes } from './probe.ts';
import { encodeArguments } from './recipes.ts';
import { turnUpright } from './rotation.ts';
import { momentOfLift, writePicture } from './still.ts';

export type Runs = TruthFile['frames']['hidden'];

/** Adds a frame to the runs of frames of each landmark named. Frames come in order. */
export const extendRuns = (runs: Runs, frame: number, ids: readonly string[]): void => {
  for (const id of ids) {
    const own = (runs[id] ??= []);
    const last = own.at(-1);
    if (last !== undefined && last[1] === frame - 1) last[1] = frame;
    else own.push([frame, frame]);
  }
};

export const writeTruth = (clip: ClipPlan, folder: string, hidden: Runs = {}): void =>
  writeFileSync(
    join(folder, `${clip.name}.json`),
    `${JSON.stringify(clipTruth(makeTake(clip), hidden))}\n`,
  );

/** Paints, encodes and checks one clip, and writes its truth beside it. */
export const filmClip = async (
  clip: ClipPlan,
  workerFile: string,
  folder: string,
  report: (done: number, of: number) => void,
): Promise<void> => {
  const { timesMs } = makeTake(clip);
  const file = join(folder, clip.file);
  const encoder = new Encoder(encodeArguments(clip, file, (timesMs.at(-1) ?? 0) / 1000));
  const hidden: Runs = {};
  const { posterLift } = clip;
  const posterMs = posterLift === null ? Infinity : momentOfLift(clip, posterLift) * 1000;
  const posterFrame = timesMs.findIndex((ms) => ms >= posterMs);
  await paintFrames(clip, workerFile, timesMs, async (painted) => {
    extendRuns(hidden, painted.frame, painted.hidden);
    if (painted.frame === posterFrame)
      await writePicture(painted.picture, join(folder, `${clip.name}.jpg`));
    await encoder.write(painted.picture);
    report(painted.frame + 1, timesMs.length);
  });
  await encoder.finish();
  if (clip.container === 'phone-hevc')
    writeFileSync(file, turnUpright(readFileSync(file), PICTURE.width));
  await checkTimes(file, timesMs);
  writeTruth(clip, folder, hidden);
};
