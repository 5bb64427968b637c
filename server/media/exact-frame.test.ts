import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PNG } from 'pngjs';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import {
  type ClipKind,
  ffmpeg,
  makeClip,
  makePhoneClip,
} from '#tests/fixtures/media/make-clips.ts';
import { exactFrame, frameSheet, originalTimestamp } from './exact-frame.ts';
import { prepareClip } from './prepare-clip.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'exact-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

/** Frame n counted from the start of a whole decode: slow, and right whatever the key frames are. */
async function counted(original: string, index: number): Promise<Buffer> {
  const path = join(folder, 'counted.png');
  await ffmpeg(
    ...['-i', original, '-vf', `select='eq(n,${index})',format=rgb24`],
    ...['-frames:v', '1', '-f', 'image2', '-update', '1', path],
  );
  return PNG.sync.read(await readFile(path)).data;
}

const kinds: ClipKind[] = ['b-frames.mp4', 'variable.mp4', 'late-start.mp4', 'fragmented.mp4'];

describe('the exact frame of the original', () => {
  it.each(kinds)(
    '%s: first, last and frames between are frame n, pixel for pixel',
    async (kind) => {
      const original = join(folder, kind);
      await makeClip(kind, original);
      const clip = await prepareClip({ original, outDir: join(folder, `${kind}-copies`) });
      for (const index of [0, 7, 13, clip.frames.ticks.length - 1]) {
        const at = originalTimestamp(clip.origin, clip.frames, index);
        const path = join(folder, 'still.png');
        const still = await exactFrame({ original, at, path, format: 'png' });
        expect(still).toMatchObject({ path, ...clip.facts.upright });
        const { data } = PNG.sync.read(await readFile(path));
        expect(data.equals(await counted(original, index)), `frame ${index}`).toBe(true);
      }
    },
  );

  it('is upright, as a JPEG, and without the place it was filmed at', async () => {
    const original = join(folder, 'phone.mov');
    const { place } = await makePhoneClip(original);
    const clip = await prepareClip({ original, outDir: join(folder, 'phone-copies') });
    const at = originalTimestamp(clip.origin, clip.frames, 11);
    const still = await exactFrame({ original, at, path: join(folder, 'still.jpg') });
    expect(still).toMatchObject({ width: 108, height: 192 });
    const bytes = await readFile(still.path);
    expect(bytes.subarray(0, 2).toString('hex')).toBe('ffd8');
    expect(bytes.includes(place)).toBe(false);
  });

  it('is refused between two frames, and leaves nothing', async () => {
    const original = join(folder, 'constant.mp4');
    await makeClip('constant.mp4', original);
    const clip = await prepareClip({ original, outDir: join(folder, 'constant-copies') });
    const { ticks, timeBase } = originalTimestamp(clip.origin, clip.frames, 3);
    const between = exactFrame({
      original,
      at: { ticks: ticks + 1, timeBase },
      path: join(folder, 'between.jpg'),
    });
    await expect(between).rejects.toMatchObject({ code: 'frame-not-found' });
    expect((await readdir(folder)).filter((name) => name.startsWith('between'))).toEqual([]);
    expect(() => originalTimestamp(clip.origin, clip.frames, 30)).toThrow(RangeError);
  });
});

describe('a sheet of frames', () => {
  it('holds thirty frames in their order, and black cells after the last', async () => {
    const original = join(folder, 'sheet.mp4');
    await makeClip('b-frames.mp4', original);
    const { bench, frames } = await prepareClip({ original, outDir: join(folder, 'sheet-copies') });
    const ask = { benchCopy: bench.path, size: bench, frames };
    const whole = await frameSheet({ ...ask, first: 0, path: join(folder, 'sheet-0.jpg') });
    expect(whole).toMatchObject({ first: 0, count: 30, columns: 6, rows: 5 });
    const rest = await frameSheet({ ...ask, first: 30, path: join(folder, 'sheet-1.jpg') });
    expect(rest.count).toBe(6);

    const likeness = async (sheet: string, cell: number, frame: number) => {
      const { width, height } = whole.tile;
      const [x, y] = [(cell % 6) * width, Math.floor(cell / 6) * height];
      const { stdout } = await ffmpeg(
        ...['-i', sheet, '-i', bench.path, '-filter_complex'],
        `[0:v]crop=${width}:${height}:${x}:${y},format=gray,settb=1/1,setpts=0[a];` +
          `[1:v]select='eq(n,${frame})',format=gray,settb=1/1,setpts=0[b];[a][b]psnr=stats_file=-[o]`,
        ...['-map', '[o]', '-frames:v', '1', '-f', 'null', '-'],
      );
      return Number(/psnr_avg:(\S+)/.exec(stdout)?.[1]);
    };
    for (const frame of [0, 8, 29])
      expect(await likeness(whole.path, frame, frame)).toBeGreaterThan(28);
    expect(await likeness(rest.path, 5, 35)).toBeGreaterThan(28);
    expect(await likeness(whole.path, 8, 9)).toBeLessThan(28);
    await expect(frameSheet({ ...ask, first: 36, path: rest.path })).rejects.toThrow(RangeError);
  });
});
