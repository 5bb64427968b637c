import { expect, test } from '@playwright/test';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { turnUpright } from '../../../docker-free-scripts/demo-clips/film/rotation.ts';
import { frameTable } from '#server/media/probe.ts';
import { type RangeServer, startRangeServer } from '../../fixtures/video/range-server.ts';
import { runTool } from '../../fixtures/video/run-tool.ts';

test.use({ trace: 'off' });

const local = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const film = local('../../fixtures/clips/right-still.mp4');

let folder: string;
let server: RangeServer;

test.beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'takes-'));
  server = await startRangeServer(local('take-page.tsx'), folder, {
    workers: { '/take.worker.ts': local('../../../src/tracking/worker/take.worker.ts') },
  });
});
test.afterAll(async () => {
  await server.close();
  await rm(folder, { recursive: true, force: true });
});
test.beforeEach(({ page }) => page.goto(server.origin));

test('a film on this device: what its pictures say, while the page goes on', async ({ page }) => {
  await page.getByLabel('Film').setInputFiles(film);
  const said = page.getByRole('status');
  await expect(said).toContainText('Looking at the pictures');
  await expect(said).toContainText(
    /^The take will do: head, feet and floor in the picture, still for 1\.[67].s, up in 2\.\d.s or slower/,
    { timeout: 25_000 },
  );
});

test('feet cut off, and turned by its matrix as a phone films: film again', async ({ page }) => {
  const cut = join(folder, 'cut.mp4');
  // stored lying: what the matrix says must be done before anything is judged
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-t', '6.2', '-i', film, '-c:v', 'libx264'],
    ...['-vf', 'crop=864:1536:108:0,transpose=2', '-preset', 'ultrafast', cut],
  ]);
  await writeFile(cut, turnUpright(await readFile(cut), 864));
  await page.getByLabel('Film').setInputFiles(cut);
  const said = page.getByRole('status');
  await expect(said).toContainText('Film again, while the athlete is still here:', {
    timeout: 25_000,
  });
  await expect(page.getByRole('listitem').first()).toContainText('The feet are cut off: step back');
});

test('a prepared copy says the same', async ({ page }) => {
  const copy = join(folder, 'copy.mp4');
  await runTool('ffmpeg', [
    ...['-nostdin', '-y', '-v', 'error', '-t', '6.2', '-i', film, '-c:v', 'libx264', '-g', '1'],
    ...['-preset', 'superfast', '-crf', '23', '-movflags', '+faststart', copy],
  ]);
  const { timeBase, ticks } = await frameTable(copy);
  await page.evaluate((table) => window.takes.lookAtCopy('/clips/copy.mp4', table), {
    timeBase,
    ticks,
  });
  await expect(page.getByRole('status')).toContainText(
    /^The take will do: head, feet and floor in the picture/,
  );
});

test('a file that is no film is said to be unreadable; one taken away is no longer looked at', async ({
  page,
}) => {
  await page.getByLabel('Film').setInputFiles({
    ...{ name: 'a.mp4', mimeType: 'video/mp4', buffer: Buffer.from('left knee '.repeat(99)) },
  });
  await expect(page.getByRole('status')).toContainText('its pictures cannot be read');
  const away = await page.evaluate(() => window.takes.takenAway(new File(['x'], 'x.mp4')));
  expect(away).not.toBe('told all the same');
});
