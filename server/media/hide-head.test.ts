import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { ffmpeg, ffprobe } from '#tests/fixtures/media/make-clips.ts';
import type { Box } from '#shared/geometry/boxes.ts';
import { type HiddenCopy, hideHead } from './hide-head.ts';
import { evenBox } from './hide-head-args.ts';
import { prepareClip } from './prepare-clip.ts';
import type { FrameTable, PreparedClip } from './types.ts';

vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const WIDTH = 320;
const HEIGHT = 240;
const FROM = 6;
const TO = 33;
let folder: string;
let clip: PreparedClip;

/** A head that wanders, not twice at the same place. */
const headOn = (frame: number): Box => ({
  left: 20 + 5 * frame,
  top: 30 + 7 * (frame % 9),
  width: 60.5,
  height: 70,
});
const heads = (from: number, to: number) =>
  Array.from({ length: to - from + 1 }, (_, n) => ({ frame: from + n, box: headOn(from + n) }));

const request = (more: object = {}) => ({
  benchCopy: clip.bench.path,
  source: { width: WIDTH, height: HEIGHT },
  size: { width: WIDTH, height: HEIGHT },
  perSecond: 30,
  frames: clip.frames,
  from: FROM,
  to: TO,
  heads: heads(FROM, TO),
  ...more,
});

/** Brightness of every pixel of every decoded frame. */
const decoded = async (path: string): Promise<Buffer[]> => {
  const { stdout } = await promisify(execFile)(
    'ffmpeg',
    [
      ...['-nostdin', '-v', 'error', '-threads', '1', '-i', path, '-fps_mode', 'passthrough'],
      ...['-f', 'rawvideo', '-pix_fmt', 'gray', '-'],
    ],
    { encoding: 'buffer', maxBuffer: 256 * 1024 ** 2 },
  );
  const size = WIDTH * HEIGHT;
  return Array.from({ length: stdout.length / size }, (_, n) =>
    stdout.subarray(n * size, (n + 1) * size),
  );
};

type Where = (u: number, v: number) => boolean;

/** The middle one of what is measured where `inside` holds: a few edges between cells do not move it. */
const median = (inside: Where, value: (at: number) => number): number => {
  const values: number[] = [];
  for (let v = 0; v < HEIGHT; v += 1)
    for (let u = 0; u < WIDTH - 1; u += 1) if (inside(u, v)) values.push(value(v * WIDTH + u));
  expect(values.length).toBeGreaterThan(0);
  return values.sort((a, b) => a - b)[values.length >> 1] ?? NaN;
};
const within =
  ({ left, top, width, height }: Box, margin: number) =>
  (u: number, v: number) =>
    u >= left - margin &&
    u < left + width + margin &&
    v >= top - margin &&
    v < top + height + margin;
const pixel = (picture: Buffer | undefined, at: number): number => picture?.[at] ?? NaN;

/** How much neighbours differ: fine detail. */
const detail = (picture: Buffer | undefined, inside: Where) =>
  median(inside, (at) => Math.abs(pixel(picture, at) - pixel(picture, at + 1)));
const difference = (a: Buffer | undefined, b: Buffer | undefined, inside: Where) =>
  median(inside, (at) => Math.abs(pixel(a, at) - pixel(b, at)));

/**
 * How much of one picture's fine detail the other has, 1 for all and 0 for none. Grain is new on every frame, so
 * what an encoder carries over from the frame before counts for nothing. Steep edges count no more than grain.
 */
const likeness = (a: Buffer | undefined, b: Buffer | undefined, inside: Where): number => {
  const step = (picture: Buffer | undefined, at: number) =>
    Math.max(-30, Math.min(30, pixel(picture, at) - pixel(picture, at + 1)));
  let [ab, aa, bb] = [0, 0, 0];
  for (let v = 0; v < HEIGHT; v += 1)
    for (let u = 0; u < WIDTH - 1; u += 1)
      if (inside(u, v)) {
        const at = v * WIDTH + u;
        ab += step(a, at) * step(b, at);
        aa += step(a, at) ** 2;
        bb += step(b, at) ** 2;
      }
  return bb === 0 ? 0 : ab / Math.sqrt(aa * bb);
};

/** Made once for all that is looked for in it. */
let made: HiddenCopy;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'hide-head-'));
  const original = join(folder, 'original.mp4');
  // grain everywhere, uneven times: some frames stand 33 ms apart, some 7
  await ffmpeg(
    ...['-f', 'lavfi', '-i'],
    `testsrc2=s=${WIDTH}x${HEIGHT}:r=30,trim=end_frame=40,noise=alls=60:all_seed=5:allf=t,settb=1/90000,setpts='3003*N+random(1)*2400'`,
    ...['-fps_mode', 'passthrough', '-enc_time_base', '1:90000'],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-crf', '12', '-pix_fmt', 'yuv420p', original],
  );
  clip = await prepareClip({ original, outDir: join(folder, 'copies') });
  // a name that a filter graph has to be told about
  const out = join(folder, `it's: a [copy], really`);
  await mkdir(out);
  made = await hideHead({ ...request(), folder: out });
});
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('a copy on which the head is hidden', () => {
  it('covers the head on exactly its own frames, and leaves the rest as it was', async () => {
    const clear = await decoded(clip.bench.path);
    const hidden = await decoded(made.video);
    expect(hidden).toHaveLength(40);
    expect(clear).toHaveLength(40);
    for (let frame = FROM; frame <= TO; frame += 1) {
      const box = headOn(frame);
      const [before, after] = [clear[frame], hidden[frame]];
      const inside = within(box, -1);
      expect(detail(before, inside), `frame ${frame} had detail`).toBeGreaterThan(6);
      // what is left are the edges between a handful of cells
      expect(detail(after, inside), `frame ${frame}`).toBeLessThan(2.5);
      expect(likeness(before, after, inside), `frame ${frame}`).toBeLessThan(0.25);
      // a box of the frame before or after would leave these strips clear
      for (const strip of [
        { ...box, left: box.left + 1, width: 5 },
        { ...box, left: box.left + box.width - 6, width: 5 },
        { ...box, top: box.top + 1, height: 5 },
        { ...box, top: box.top + box.height - 6, height: 5 },
      ])
        expect(likeness(before, after, within(strip, 0)), `strip of frame ${frame}`).toBeLessThan(
          0.7,
        );
      const around = (u: number, v: number) => !within(box, 18)(u, v);
      expect(difference(before, after, around), `around frame ${frame}`).toBeLessThan(7);
      expect(detail(after, around)).toBeGreaterThan(3.5);
      // just beyond the box the picture is clear again
      const rim = (u: number, v: number) => within(box, 12)(u, v) && !within(box, 3)(u, v);
      expect(likeness(before, after, rim), `rim of frame ${frame}`).toBeGreaterThan(0.6);
    }
  });

  it('keeps every frame’s own time, and shows nothing of the frames outside of the span', async () => {
    const times = async (path: string) =>
      (await ffprobe('-show_entries', 'packet=pts_time', '-of', 'csv=p=0', path))
        .trim()
        .split('\n')
        .map(Number)
        .sort((a, b) => a - b);
    expect(await times(made.video)).toEqual(await times(clip.bench.path));
    const hidden = await decoded(made.video);
    for (const frame of [0, FROM - 1, TO + 1, 39])
      expect(
        detail(hidden[frame], () => true),
        `frame ${frame}`,
      ).toBeLessThan(2.5);
  });

  it('has a poster from the span, with the head hidden on it', async () => {
    const [picture] = await decoded(made.poster);
    const box = headOn(Math.floor((FROM + TO) / 2));
    expect(detail(picture, within(box, -1))).toBeLessThan(2.5);
    expect(detail(picture, (u, v) => !within(box, 18)(u, v))).toBeGreaterThan(3.5);
  });

  it('is not made where a shown frame has no box', async () => {
    const out = join(folder, 'gap');
    await mkdir(out);
    const gap = heads(FROM, TO).filter(({ frame }) => frame !== 20);
    await expect(hideHead({ ...request({ heads: gap }), folder: out })).rejects.toThrow(
      'Frame 20 has no box.',
    );
  });

  it('is not made for a table that is not the copy’s', async () => {
    const out = join(folder, 'table');
    await mkdir(out);
    const frames: FrameTable = {
      ...clip.frames,
      ticks: clip.frames.ticks.map((tick, n) => tick + (n === 12 ? 1 : 0)),
    };
    await expect(hideHead({ ...request({ frames }), folder: out })).rejects.toMatchObject({
      code: 'tool-failed',
    });
  });
});

describe('a box in the copy', () => {
  it('is whole and even, never smaller than in the source, and ends with the picture', () => {
    const from = { width: 1080, height: 1920 };
    const to = { width: 540, height: 960 };
    expect(evenBox({ left: 101, top: 203, width: 99, height: 101 }, from, to)).toEqual({
      ...{ left: 50, top: 100, width: 50, height: 52 },
    });
    expect(evenBox({ left: 1000, top: 0, width: 80, height: 40 }, from, to)).toEqual({
      ...{ left: 500, top: 0, width: 40, height: 20 },
    });
  });
});
