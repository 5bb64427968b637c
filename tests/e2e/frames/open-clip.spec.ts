import { expect, test } from '@playwright/test';
import { stat } from 'node:fs/promises';
import { type PreparedTestCopy, prepareCopy } from '../../fixtures/video/prepare-copy.ts';
import { filmSource } from '../../fixtures/video/source-clips.ts';
import { type ClipServer, randomJumps, startClipServer, upTo } from './clip-server.ts';

test.use({ trace: 'off' });

let server: ClipServer;
let copy: PreparedTestCopy;
test.beforeAll(async () => {
  server = await startClipServer();
  copy = await prepareCopy(await filmSource('constant-60', server.folder), 5);
});
test.afterAll(() => server.close());
test.beforeEach(async ({ page }) => {
  server.cut(false);
  server.takeSentBytes();
  await page.goto(server.origin);
});

test('the first picture comes after 2 MB or less, the rest by itself', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  const { bytesAtOpen } = await page.evaluate(() => window.harness.facts());
  expect(bytesAtOpen).toBeGreaterThan(0);
  expect(bytesAtOpen).toBeLessThanOrEqual(2_000_000);
  await page.evaluate(() => window.harness.loaded());
  expect((await page.evaluate(() => window.harness.facts())).share).toBe(1);
  expect(server.takeSentBytes()).toBe((await stat(copy.path)).size);
});

test('every frame that was made is closed again, also those that come late', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  await page.evaluate((n) => window.harness.walk(n, 'step'), upTo(30));
  // closed while the prefetch is decoding
  await page.evaluate(() => window.harness.close());
  await expect
    .poll(() => page.evaluate(() => window.harness.ledger()).then((l) => l.opened - l.closed))
    .toBe(0);
  expect((await page.evaluate(() => window.harness.ledger())).opened).toBeGreaterThan(60);
});

test('a sweep shows only what was asked for and ends on the newest', async ({ page }) => {
  const cold = { ...server.request(copy), cacheBytes: 1 };
  await page.evaluate((r) => window.harness.open(r), cold);
  const sweep = randomJumps(150, 120);
  const { wrong, shown } = await page.evaluate((n) => window.harness.scrub(n), sweep);
  expect(wrong).toEqual([]);
  expect(shown.at(-1)).toBe(sweep.at(-1));
  expect(shown.length).toBeLessThan(sweep.length);
});

test('pictures painted at the same time leave the newest on the canvas', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  expect(await page.evaluate(() => window.harness.race([3, 90, 41, 7, 66]))).toBe(66);
});

test('slow play keeps the order and ends on the last frame', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  const shown = await page.evaluate(() => window.harness.play(10, 40, 0.25));
  expect(shown.at(0)).toBe(10);
  expect(shown.at(-1)).toBe(40);
  expect(shown).toEqual([...new Set(shown)].sort((a, b) => a - b));
});

test('a decoder that hangs is made anew and the frame still comes', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  await page.evaluate(() => window.harness.swallowChunks(1));
  expect(await page.evaluate(() => window.harness.walk([100, 101, 20]))).toEqual([]);
  expect((await page.evaluate(() => window.harness.facts())).remakes).toBe(1);
});

test('an aborted wait ends at once and the next frame is right', async ({ page }) => {
  await page.evaluate((r) => window.harness.open(r), server.request(copy));
  expect(await page.evaluate(() => window.harness.abortsAtOnce(120))).toBe('AbortError');
  expect(await page.evaluate(() => window.harness.walk([121, 120]))).toEqual([]);
});

test.describe('what cannot be shown says why', () => {
  const open = (change: object) => ({ ...server.request(copy), ...change });

  test('a copy that is gone', async ({ page }) => {
    const request = open({ url: '/clips/nothing.mp4' });
    expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('gone');
  });

  test('a table of another clip', async ({ page }) => {
    const request = open({ ticks: copy.ticks.slice(1) });
    expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('mismatch');
  });

  test('a file that is no video', async ({ page }) => {
    const request = open({ url: '/page.js', ticks: [0, 1] });
    expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('damaged');
  });

  test('a frame outside the clip', async ({ page }) => {
    await page.evaluate((r) => window.harness.open(r), open({}));
    expect(await page.evaluate(() => window.harness.codeOf(150))).toBe('no-such-frame');
  });

  test('a clip that was closed', async ({ page }) => {
    await page.evaluate((r) => window.harness.open(r), open({}));
    await page.evaluate(() => window.harness.close());
    expect(await page.evaluate(() => window.harness.codeOf(1))).toContain('Open a clip first');
  });

  test('a lost connection', async ({ page }) => {
    server.cut(true);
    expect(await page.evaluate((r) => window.harness.open(r), open({}))).toBe('network');
    server.cut(false);
    expect(await page.evaluate((r) => window.harness.open(r), open({}))).toBe('decoder');
  });
});
