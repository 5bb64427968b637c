import type { ClipPlan } from '../clips.ts';
import { PICTURE } from '../model/camera.ts';
import { makeTake } from '../model/take.ts';
import { paintFrames } from './director.ts';
import { Encoder } from './encoder.ts';

/** First moment of the first rise at which the thigh passes `lift`; the quiet stance for 0. Seconds. */
export const momentOfLift = (clip: ClipPlan, lift: number): number => {
  const { reps, stanceAt } = makeTake(clip);
  const rep = reps[0];
  if (rep === undefined || lift <= 0) return 0.5;
  for (let seconds = rep.shift; seconds < rep.lowered; seconds += 1 / 240)
    if (stanceAt(seconds).lift >= lift) return seconds;
  throw new RangeError(`${clip.name} never lifts the thigh to ${lift}°`);
};

/** Writes one painted picture; the file's ending says whether as JPEG or PNG. */
export const writePicture = async (picture: Uint8Array, file: string): Promise<void> => {
  const size = `${PICTURE.width}x${PICTURE.height}`;
  const encoder = new Encoder([
    ...['-y', '-v', 'error', '-f', 'rawvideo', '-pix_fmt', 'rgb24', '-s', size, '-i', 'pipe:0'],
    ...['-frames:v', '1', '-update', '1', '-q:v', '2', '-bitexact', file],
  ]);
  await encoder.write(picture);
  await encoder.finish();
};

/** Paints and writes one picture of a clip. */
export const writeStill = (
  clip: ClipPlan,
  workerFile: string,
  lift: number,
  file: string,
): Promise<void> =>
  paintFrames(clip, workerFile, [momentOfLift(clip, lift) * 1000], ({ picture }) =>
    writePicture(picture, file),
  );
