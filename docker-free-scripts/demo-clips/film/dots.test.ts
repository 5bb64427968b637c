import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { type ClipName, loadTruth } from '#tests/fixtures/clips/truth.ts';

const home = fileURLToPath(new URL('../../../tests/fixtures/clips/', import.meta.url));
/** Decoding waits its turn on a busy machine. */
const PATIENCE_MS = 60_000;
const SIZE = { width: 1080, height: 1920 };

/** One frame of a clip as players show it, grey values. */
const grey = (file: string, frame: number): Buffer =>
  execFileSync(
    'ffmpeg',
    [
      ...['-v', 'error', '-i', `${home}${file}`, '-vf', `select=eq(n\\,${frame})`],
      ...['-frames:v', '1', '-fps_mode', 'passthrough', '-f', 'rawvideo', '-pix_fmt', 'gray', '-'],
    ],
    { maxBuffer: SIZE.width * SIZE.height * 2 },
  );

/** Middle of a sticker's dark centre near a pixel: the mean of what is darker than half, by depth. */
const darkMiddle = (picture: Buffer, [u, v]: readonly [number, number]): [number, number] => {
  let [weight, sumU, sumV] = [0, 0, 0];
  for (let row = Math.floor(v) - 5; row <= Math.floor(v) + 5; row += 1)
    for (let column = Math.floor(u) - 5; column <= Math.floor(u) + 5; column += 1) {
      const dark = Math.max(0, 110 - (picture[row * SIZE.width + column] ?? 255));
      weight += dark;
      sumU += dark * (column + 0.5);
      sumV += dark * (row + 0.5);
    }
  return [sumU / weight, sumV / weight];
};

describe.each([
  ['right-early', [20, 190, 250]],
  ['both-sides', [10, 100, 230]],
  ['bare-still', [10, 100]],
] as const satisfies readonly (readonly [ClipName, readonly number[]])[])(
  'stickers in the decoded pictures of %s',
  { timeout: PATIENCE_MS },
  (name, frames) => {
    const truth = loadTruth(name);

    it.each(frames)('lie on the true pixels of frame %d within a pixel', (index) => {
      const picture = grey(truth.file, index);
      expect(picture).toHaveLength(SIZE.width * SIZE.height);
      const frame = truth.frames[index];
      if (frame === undefined) throw new RangeError(`${name} has no frame ${index}`);
      for (const id of ['kneecap', 'lifted-knee', 'asis-support', 'ankle-support']) {
        const mark = frame.marks[id] ?? [NaN, NaN];
        const [u, v] = darkMiddle(picture, mark);
        expect(Math.hypot(u - mark[0], v - mark[1])).toBeLessThan(1);
      }
    });
  },
);
