import { expect, test } from '@playwright/test';
import { join } from 'node:path';
import { prepareCopy } from '../../fixtures/video/prepare-copy.ts';
import { runTool } from '../../fixtures/video/run-tool.ts';
import { filmSource, type SourceKind } from '../../fixtures/video/source-clips.ts';
import { type ClipServer, randomJumps, startClipServer, upTo } from './clip-server.ts';

test.use({ trace: 'off' });

let server: ClipServer;
test.beforeAll(async () => {
  server = await startClipServer();
});
test.afterAll(() => server.close());
test.beforeEach(({ page }) => page.goto(server.origin));

for (const kind of ['constant-60', 'variable', 'rotated'] as const satisfies SourceKind[]) {
  test(`the browser's own video shows the right frames of a ${kind} clip`, async ({ page }) => {
    test.setTimeout(180_000);
    const copy = await prepareCopy(await filmSource(kind, server.folder), 1);
    const request = { ...server.request(copy), begin: 'video-element' as const };
    expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('video-element');
    const places = [0, copy.ticks.length - 1, ...randomJumps(copy.ticks.length, 60)];
    expect(await page.evaluate((n) => window.harness.walk(n), places)).toEqual([]);
  });
}

test('sheets of tiles show the right frames', async ({ page }) => {
  const copy = await prepareCopy(await filmSource('hdr', server.folder), 1);
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-i', copy.path, '-vf', 'tile=3x3', '-q:v', '3'],
    ...['-start_number', '0', join(server.folder, 'sheet-%d.jpg')],
  ]);
  const sheets = { prefix: '/clips/sheet-', framesPerSheet: 9, columns: 3 };
  const request = { ...server.request(copy), begin: 'sheets' as const, sheets };
  expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('sheets');
  expect(await page.evaluate((n) => window.harness.walk(n, 'step'), upTo(24))).toEqual([]);
  expect(await page.evaluate((n) => window.harness.walk(n), randomJumps(24, 50))).toEqual([]);
});

test('a codec that this browser lacks says so, by either way', async ({ page }) => {
  const { path } = await filmSource('hevc', server.folder);
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-i', path, '-c:v', 'libx265', '-tag:v', 'hvc1'],
    ...['-preset', 'ultrafast', '-x265-params', 'log-level=error:bframes=0'],
    join(server.folder, 'hevc-only.mp4'),
  ]);
  const request = {
    ...{ url: '/clips/hevc-only.mp4', width: 1280, height: 720 },
    ...{ ticks: upTo(90), timeBase: { num: 1, den: 60 } },
  };
  expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('unsupported');
  const video = { ...request, begin: 'video-element' as const };
  expect(await page.evaluate((r) => window.harness.open(r), video)).toBe('unsupported');
});
