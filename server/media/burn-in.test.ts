import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import { fillsOf } from '#shared/overlay/fills/fill-context.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { letters } from '#server/pdf/letters.ts';
import { ffmpeg, ffprobe } from '#tests/fixtures/media/make-clips.ts';
import { burnIn } from './burn-in.ts';
import { stretched } from './burn-in-args.ts';
import { readCopy } from './read-copies.ts';
import type { FrameTable } from './types.ts';

vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const SOURCE = { width: 640, height: 960 };
const SIZE = { width: 320, height: 480 };
const BAND = 60;
const [FROM, TO] = [5, 44];
let folder: string;
let copy: string;
let frames: FrameTable;

/** Places that no two frames share, anywhere between the pixels. */
const markAt = (frame: number): FramePoint =>
  framePoint(100.3 + 9.37 * frame, 180.6 + 61.3 * (frame % 11));
/** Passes the first without touching it. */
const otherAt = (frame: number): FramePoint =>
  framePoint(SOURCE.width - markAt(frame).u, markAt(frame).v + 90);
const drawnAt = (frame: number): Primitive[] => [
  {
    kind: 'ring',
    at: markAt(frame),
    radius: null,
    landmark: 'kneecap',
    role: 'support',
    state: 'placed',
  },
  {
    kind: 'diamond',
    at: otherAt(frame),
    landmark: 'lifted-knee',
    role: 'lifted',
    state: 'placed',
  },
];

/** Brightness of every pixel of every frame. */
const decoded = async (path: string): Promise<Buffer[]> => {
  const { stdout } = await promisify(execFile)(
    'ffmpeg',
    [
      ...['-nostdin', '-v', 'error', '-threads', '1', '-i', path, '-fps_mode', 'passthrough'],
      ...['-f', 'rawvideo', '-pix_fmt', 'gray', '-'],
    ],
    { encoding: 'buffer', maxBuffer: 512 * 1024 ** 2 },
  );
  const size = SIZE.width * (SIZE.height + BAND);
  return Array.from({ length: stdout.length / size }, (_, n) =>
    stdout.subarray(n * size, (n + 1) * size),
  );
};

/** Half the side of the square in which a mark is looked for, px of the film. */
const REACH = 15;
const GREY = 128;

/** How far the middle of what is drawn about a place lies from it, px of the film; 0.5, 0.5 is the middle of a pixel. */
const away = (picture: Buffer | undefined, { u, v }: FramePoint): number => {
  const [x, y] = [(u * SIZE.width) / SOURCE.width, (v * SIZE.height) / SOURCE.height];
  let [sum, across, down] = [0, 0, 0];
  for (let row = Math.floor(y - REACH); row <= y + REACH; row += 1)
    for (let column = Math.floor(x - REACH); column <= x + REACH; column += 1) {
      const weight = Math.abs((picture?.[row * SIZE.width + column] ?? GREY) - GREY);
      if (weight < 12) continue;
      sum += weight;
      across += weight * (column + 0.5 - x);
      down += weight * (row + 0.5 - y);
    }
  return sum < 2000 ? Infinity : Math.hypot(across / sum, down / sum);
};

let made: { path: string; bytes: number };

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'burn-in-'));
  copy = join(folder, 'copy.mp4');
  // 240 frames a second, every seventh away: no two neighbours can be mistaken for each other
  await ffmpeg(
    ...['-f', 'lavfi', '-i', `color=c=0x808080:s=${SOURCE.width}x${SOURCE.height}:r=240:d=0.25`],
    ...['-vf', "select='not(eq(mod(n,7),3))'", '-fps_mode', 'passthrough'],
    ...['-c:v', 'libx264', '-bf', '0', '-pix_fmt', 'yuv420p', copy],
  );
  const read = await readCopy(copy);
  if (!read) throw new Error('The clip of this test could not be read.');
  frames = read.frames;
  const face = await letters();
  const scale = SIZE.width / SOURCE.width;
  const work = join(folder, 'it’s a: work');
  await mkdir(work);
  made = await burnIn({
    copy,
    frames,
    from: FROM,
    to: TO,
    size: SIZE,
    band: BAND,
    ground: '#121715',
    perSecond: 240,
    folder: work,
    drawn: Array.from({ length: TO - FROM + 1 }, (_, n) => FROM + n).map((frame) => ({
      from: frame,
      to: frame,
      fills: fillsOf(face.strong, (context) =>
        paintOverlay(context, drawnAt(frame), {
          viewport: { scale, x: 0, y: 0 },
          bounds: SIZE,
          unit: 1,
        }),
      ),
    })),
  });
});
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('a film with drawings in its picture', () => {
  it('shows each frame’s marks on that frame, well within a pixel', async () => {
    const pictures = await decoded(made.path);
    expect(pictures).toHaveLength(TO - FROM + 1);
    const found = pictures.flatMap((picture, n) => [
      away(picture, markAt(FROM + n)),
      away(picture, otherAt(FROM + n)),
    ]);
    expect(Math.max(...found)).toBeLessThan(0.7);
    // a mark of the frame before or after would be seen as such
    for (const neighbour of [-1, 1])
      expect(away(pictures[9], markAt(FROM + 9 + neighbour))).toBeGreaterThan(4);
  });

  it('keeps the times of its frames to the tick, and starts at 0', async () => {
    const film = await readCopy(made.path);
    const start = frames.ticks[FROM] ?? NaN;
    const seconds = (ticks: readonly number[], { num, den }: FrameTable['timeBase'], zero = 0) =>
      ticks.map((tick) => ((tick - zero) * num) / den);
    expect(film && seconds(film.frames.ticks, film.frames.timeBase)).toEqual(
      seconds(frames.ticks.slice(FROM, TO + 1), frames.timeBase, start),
    );
  });

  it('holds nothing but a picture', async () => {
    const stdout = await ffprobe(
      ...[
        '-v',
        'error',
        '-show_entries',
        'stream=codec_type:format_tags',
        '-of',
        'json',
        made.path,
      ],
    );
    const { streams, format } = JSON.parse(`${stdout}`) as {
      streams: object[];
      format: { tags: Record<string, string> };
    };
    expect(streams).toEqual([{ codec_type: 'video' }]);
    expect(Object.keys(format.tags).sort()).toEqual([
      'compatible_brands',
      'encoder',
      'major_brand',
      'minor_version',
    ]);
  });

  it('is not made where the copy lacks a frame', async () => {
    const more = { ...frames, ticks: [...frames.ticks, (frames.ticks.at(-1) ?? 0) + 64] };
    const empty = join(folder, 'empty');
    await mkdir(empty);
    await expect(
      burnIn({
        ...{ copy, frames: more, from: FROM, to: more.ticks.length - 1, size: SIZE, band: BAND },
        ...{ ground: '#121715', perSecond: 240, folder: empty, drawn: [] },
      }),
    ).rejects.toMatchObject({ code: 'tool-failed' });
  });
});

describe('when a drawing is on show', () => {
  const table = { timeBase: { num: 1, den: 1000 }, ticks: [0, 10, 14, 30], us: [] };
  it.each([
    [
      { from: 0, to: 0 },
      { from: 0, to: 0.5 },
    ],
    [
      { from: 1, to: 2 },
      { from: 0.5, to: 2.2 },
    ],
    [
      { from: 2, to: 3 },
      { from: 1.2, to: 103 },
    ],
  ])('%j: %j', (shown, expected) => {
    const clock = stretched(table, { from: 0, to: 3 }, shown);
    expect(clock.from).toBeCloseTo(expected.from, 9);
    expect(clock.to).toBeCloseTo(expected.to, 9);
  });
});
