import { expect, test } from '@playwright/test';
import { stat, truncate, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { runTool } from '../../fixtures/video/run-tool.ts';
import { filmSource } from '../../fixtures/video/source-clips.ts';
import { type ClipServer, startClipServer } from './clip-server.ts';

test.use({ trace: 'off' });

let server: ClipServer;
test.beforeAll(async () => {
  server = await startClipServer();
});
test.afterAll(() => server.close());
test.beforeEach(({ page }) => page.goto(server.origin));

test('an upright HEVC film of a phone: its numbers, and that this browser cannot decode it', async ({
  page,
}) => {
  await filmSource('hevc', server.folder);
  const look = await page.evaluate(() => window.harness.look('/clips/hevc.mov', 'IMG_1.MOV'));
  expect(look).toMatchObject({
    ...{ outcome: 'clip', container: 'mov', codec: 'hevc', width: 1280, height: 720 },
    ...{ frames: 90, hdr: false, decodableHere: false, cutShort: false },
    frameRate: { kind: 'constant', gaps: 0 },
  });
  if (look.outcome !== 'clip') throw new Error(look.outcome);
  expect(look.length).toBeCloseTo(1.5, 2);
  expect(look.frameRate?.kind === 'constant' && look.frameRate.fps).toBeCloseTo(60, 2);
});

test('H.264 can be decoded here; a cut file is told by its index', async ({ page }) => {
  const { path, frames } = await filmSource('constant-30', server.folder);
  const cutPath = join(server.folder, 'cut.mp4');
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-i', path, '-c', 'copy', '-movflags', '+faststart'],
    cutPath,
  ]);
  const whole = await page.evaluate(() => window.harness.look('/clips/cut.mp4', 'a.mp4'));
  expect(whole).toMatchObject({ outcome: 'clip', frames, decodableHere: true, cutShort: false });
  // the index stands in front: it still tells of every frame
  const { size } = await stat(cutPath);
  await truncate(cutPath, Math.floor(size / 2));
  const cut = await page.evaluate(() => window.harness.look('/clips/cut.mp4', 'a.mp4'));
  expect(cut).toMatchObject({ outcome: 'clip', frames, cutShort: true });
});

test('a text with the wrong name is no video', async ({ page }) => {
  await writeFile(
    join(server.folder, 'notes.mp4'),
    'left knee, right knee, left knee\n'.repeat(99),
  );
  const look = await page.evaluate(() => window.harness.look('/clips/notes.mp4', 'notes.mp4'));
  expect(look).toEqual({
    outcome: 'not-a-video',
    advice: 'This is not a video that can be read here. Choose an MP4, MOV or WebM file.',
  });
});
