import { expect, test } from '@playwright/test';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { frameTable } from '#server/media/probe.ts';
import { type FilmedFile, filmFile } from '../../fixtures/tracking/film.ts';
import { DARK_STICKER, makeScene } from '../../fixtures/tracking/scene.ts';
import { type RangeServer, startRangeServer } from '../../fixtures/video/range-server.ts';
import { runTool } from '../../fixtures/video/run-tool.ts';
import type { OpenRequest } from './page.ts';
import type { PlainRequest } from './tracking-page.ts';

test.use({ trace: 'off' });

const local = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const scene = makeScene({
  cloth: 'plain',
  sticker: DARK_STICKER,
  fps: 30,
  exposures: 2,
  seconds: 1,
});
const last = scene.frames - 1;

let folder: string;
let server: RangeServer;
let film: FilmedFile;
let clip: OpenRequest;
let complaints: string[];

test.beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'tracking-'));
  server = await startRangeServer(local('tracking-page.ts'), folder, {
    workers: { '/tracking.worker.ts': local('../../../src/tracking/worker/tracking.worker.ts') },
    policed: true,
  });
  film = await filmFile(scene, folder, 'clip');
  const { timeBase, ticks } = await frameTable(film.path);
  const { width, height } = scene;
  clip = { url: '/clips/clip.mp4', timeBase, ticks, width, height };
});
test.afterAll(async () => {
  await server.close();
  await rm(folder, { recursive: true, force: true });
});
test.beforeEach(async ({ page }) => {
  complaints = [];
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(String(error)));
  await page.goto(server.origin);
});
test.afterEach(() => expect(complaints).toEqual([]));

const truth = (frame: number, id: string) => {
  const place = film.truths[frame]?.truth[id];
  if (!place) throw new RangeError(`no ${id} on frame ${frame}`);
  return place;
};
const IDS = ['pelvis-support', 'thigh-support', 'knee-lifted'];
const asked = (frames: readonly number[], scale = 1): PlainRequest => ({
  ...{ from: 0, to: last },
  points: IDS.map((id) => ({
    id,
    keyframes: frames.map((frame) => {
      const { u, v } = truth(frame, id);
      return { frame, u: u * scale, v: v * scale };
    }),
  })),
});

test('marks follow through a clip under the app’s content policy', async ({ page }) => {
  expect(await page.evaluate((c) => window.tracking.open(c), clip)).toBe('decoder');
  const { result, progress, told } = await page.evaluate(
    (r) => window.tracking.follow(r),
    asked([10]),
  );
  if (typeof result === 'string') throw new Error(result);
  expect(result.refused).toEqual([]);
  for (const { id, places } of result.tracks) {
    expect(places.map(({ frame }) => frame)).toEqual(film.truths.map((_, n) => n));
    for (const { frame, point, state } of places) {
      const { u, v } = truth(frame, id);
      expect(state, `${id} on ${frame}`).toBe('sure');
      expect(Math.hypot((point?.u ?? NaN) - u, (point?.v ?? NaN) - v)).toBeLessThan(1);
    }
    expect(told[id]).toHaveLength(places.length);
  }
  expect(progress.at(-1)).toMatchObject({ done: scene.frames + 1, total: scene.frames + 1 });
});

test('all is said in pixels of the source, however small the copy', async ({ page }) => {
  await page.evaluate((c) => window.tracking.open(c, 2), clip);
  const { result } = await page.evaluate((r) => window.tracking.follow(r), asked([0, last], 2));
  if (typeof result === 'string') throw new Error(result);
  const middle = result.tracks[0]?.places[15]?.point;
  const { u, v } = truth(15, 'pelvis-support');
  expect(Math.hypot((middle?.u ?? NaN) - 2 * u, (middle?.v ?? NaN) - 2 * v)).toBeLessThan(1);
});

test('a touch snaps to a dot, and is refused where there is nothing', async ({ page }) => {
  await page.evaluate((c) => window.tracking.open(c), clip);
  const { u, v } = truth(4, 'thigh-support');
  const touch = await page.evaluate(([x, y]) => window.tracking.look(4, x, y), [
    u + 6,
    v - 5,
  ] as const);
  if (typeof touch === 'string') throw new Error(touch);
  expect(touch.refusal).toBeNull();
  expect(touch.dot?.tone).toBe('dark');
  expect(Math.abs((touch.dot?.radius ?? NaN) - 7)).toBeLessThan(1);
  expect(
    Math.hypot((touch.dot?.centre.u ?? NaN) - u, (touch.dot?.centre.v ?? NaN) - v),
  ).toBeLessThan(0.5);
  expect(await page.evaluate(() => window.tracking.look(4, 2, 2))).toMatchObject({
    refusal: 'at-the-border',
  });
  expect(await page.evaluate(() => window.tracking.look(4, -30, 2))).toMatchObject({
    dot: null,
    refusal: 'outside',
  });
  expect(await page.evaluate(() => window.tracking.look(4000, 2, 2))).toBe('no-such-frame');
});

test('it ends at once when it is no longer wanted, and follows again', async ({ page }) => {
  await page.evaluate((c) => window.tracking.open(c), clip);
  const { result } = await page.evaluate((r) => window.tracking.follow(r, 3), asked([10]));
  expect(result).toBe('AbortError');
  const again = await page.evaluate((r) => window.tracking.follow(r), asked([10]));
  expect(typeof again.result).toBe('object');
});

test('it waits while somebody steps through the clip', async ({ page }) => {
  await page.evaluate((c) => window.tracking.open(c), clip);
  const { ms, held } = await page.evaluate((r) => window.tracking.giveWay(r, 8), asked([10]));
  expect(held).toBeGreaterThan(0);
  expect(ms).toBeGreaterThan(1000);
});

test.describe('what cannot be followed says why', () => {
  test('a request that contradicts itself', async ({ page }) => {
    await page.evaluate((c) => window.tracking.open(c), clip);
    const { result } = await page.evaluate((r) => window.tracking.follow(r), {
      ...asked([10]),
      to: 4000,
    });
    expect(result).toBe('bad-request');
  });

  test('a tracker that was closed meanwhile', async ({ page }) => {
    await page.evaluate((c) => window.tracking.open(c), clip);
    expect(await page.evaluate((r) => window.tracking.closeWhile(r), asked([10]))).toBe('closed');
  });

  test('a table of another clip', async ({ page }) => {
    const other = { ...clip, ticks: clip.ticks.slice(1) };
    expect(await page.evaluate((c) => window.tracking.open(c), other)).toBe('mismatch');
  });

  test('a browser without a decoder and no sheets', async ({ page }) => {
    const bare = { ...clip, begin: 'sheets' as const };
    expect(await page.evaluate((c) => window.tracking.open(c), bare)).toBe('no-exact-pictures');
  });
});

test('without a decoder it follows on sheets of tiles', async ({ page }) => {
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-i', film.path, '-vf', 'tile=3x4', '-q:v', '3'],
    ...['-start_number', '0', join(folder, 'sheet-%d.jpg')],
  ]);
  const sheets = { prefix: '/clips/sheet-', framesPerSheet: 12, columns: 3 };
  const opened = await page.evaluate((c) => window.tracking.open(c), {
    ...{ ...clip, sheets },
    begin: 'sheets' as const,
  });
  expect(opened).toBe('sheets');
  const { result } = await page.evaluate((r) => window.tracking.follow(r), asked([10]));
  if (typeof result === 'string') throw new Error(result);
  for (const { id, places } of result.tracks)
    for (const { frame, point } of places) {
      const { u, v } = truth(frame, id);
      expect(
        Math.hypot((point?.u ?? NaN) - u, (point?.v ?? NaN) - v),
        `${id} ${frame}`,
      ).toBeLessThan(1);
    }
});
