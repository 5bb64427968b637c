import { writeFileSync } from 'node:fs';
import { PNG } from 'pngjs';
import type { ClipPlan } from '../clips.ts';
import { PICTURE } from '../model/camera.ts';
import { makeTake } from '../model/take.ts';
import { paintFrames } from './director.ts';

/** First moment of the first rise at which the thigh passes `lift`; the quiet stance for 0. Seconds. */
export const momentOfLift = (clip: ClipPlan, lift: number): number => {
  const { reps, stanceAt } = makeTake(clip);
  const rep = reps[0];
  if (rep === undefined || lift <= 0) return 0.5;
  for (let seconds = rep.shift; seconds < rep.lowered; seconds += 1 / 240)
    if (stanceAt(seconds).lift >= lift) return seconds;
  throw new RangeError(`${clip.name} never lifts the thigh to ${lift}°`);
};

/** One picture of a clip as PNG. */
export const writeStill = async (
  clip: ClipPlan,
  workerFile: string,
  lift: number,
  file: string,
): Promise<void> => {
  await paintFrames(clip, workerFile, [momentOfLift(clip, lift) * 1000], ({ picture }) => {
    const png = new PNG({ ...PICTURE });
    for (let at = 0; at < PICTURE.width * PICTURE.height; at += 1) {
      png.data.set(picture.subarray(3 * at, 3 * at + 3), 4 * at);
      png.data[4 * at + 3] = 255;
    }
    writeFileSync(file, PNG.sync.write(png));
    return Promise.resolve();
  });
};
