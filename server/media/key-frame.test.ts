import { execFile } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { ffmpeg } from '#tests/fixtures/media/make-clips.ts';
import { keyFrame } from './key-frame.ts';

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

const SOURCE = { width: 320, height: 240 };
const PART = { left: 40, top: 20, width: 200, height: 180 };
const HEAD = { left: 100.5, top: 30, width: 60, height: 50 };
let folder: string;
let copy: string;

const decoded = async (...args: string[]): Promise<Buffer> => {
  const { stdout } = await promisify(execFile)(
    'ffmpeg',
    ['-nostdin', '-v', 'error', ...args, '-f', 'rawvideo', '-pix_fmt', 'gray', '-'],
    { encoding: 'buffer', maxBuffer: 64 * 1024 ** 2 },
  );
  return stdout;
};
/** Mean difference of two pictures of the part, inside of the head's box or away from it. */
const apart = (a: Buffer, b: Buffer, inHead: boolean): number => {
  let [sum, count] = [0, 0];
  for (let row = 0; row < PART.height; row += 1)
    for (let column = 0; column < PART.width; column += 1) {
      const [u, v] = [PART.left + column - HEAD.left, PART.top + row - HEAD.top];
      const margin = inHead ? -4 : 6;
      const inside =
        u > -margin && u < HEAD.width + margin && v > -margin && v < HEAD.height + margin;
      if (inside !== inHead) continue;
      const at = row * PART.width + column;
      sum += Math.abs((a[at] ?? 0) - (b[at] ?? 0));
      count += 1;
    }
  return sum / count;
};

const request = (frame: number, more: object = {}) => ({
  ...{ benchCopy: copy, frame, source: SOURCE, size: SOURCE, head: HEAD, part: PART },
  path: join(folder, `${frame}.jpg`),
  ...more,
});

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'key-frame-'));
  copy = join(folder, 'copy.mp4');
  // fine detail everywhere, and no two frames alike
  await ffmpeg(
    ...['-f', 'lavfi', '-i'],
    `testsrc2=s=320x240:r=30,trim=end_frame=20,noise=alls=70:all_seed=3:allf=t`,
    ...['-c:v', 'libx264', '-crf', '10', '-g', '1', '-pix_fmt', 'yuv420p', copy],
  );
});
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('a key frame', () => {
  it('is exactly the frame that was asked for, with a head that cannot be made out', async () => {
    for (const frame of [0, 7, 19]) {
      expect(await keyFrame(request(frame))).toEqual(PART);
      const still = await decoded('-i', join(folder, `${frame}.jpg`));
      expect(still).toHaveLength(PART.width * PART.height);
      const clear = (of: number) =>
        decoded('-i', copy, '-vf', `select='eq(n,${of})',crop=200:180:40:20`, '-frames:v', '1');
      const own = await clear(frame);
      const neighbour = await clear(frame === 19 ? 18 : frame + 1);
      expect(apart(still, own, false)).toBeLessThan(8);
      expect(apart(still, neighbour, false)).toBeGreaterThan(16);
      expect(apart(still, own, true)).toBeGreaterThan(16);
    }
  });

  it('is not made where the box of the head lies beside the picture, or there is no such frame', async () => {
    const away = { left: 400, top: 0, width: 20, height: 20 };
    await expect(keyFrame(request(3, { head: away }))).rejects.toThrow(RangeError);
    await expect(keyFrame(request(20))).rejects.toMatchObject({ code: 'tool-failed' });
  });
});
