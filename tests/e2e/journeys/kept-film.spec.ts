import { readFile, writeFile } from 'node:fs/promises';
import type { Locator } from '@playwright/test';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { drawnOn } from '#shared/replay/drawn-on.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { cropFor } from '#src/features/replay/player/crop.ts';
import { momentsOf } from '#src/features/replay/player/moments.ts';
import { ffmpeg, ffprobe } from '#tests/fixtures/media/make-clips.ts';
import { expect, test } from '../support/app.ts';
import { drawnApart, type Pixels } from '../support/drawn-apart.ts';
import { ask } from './steps/ask.ts';
import { markedClip } from './steps/marked-clip.ts';
import { COACH, signIn } from './steps/people.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.beforeEach(() => test.setTimeout(PREPARED_WITHIN + 180_000));

/** One frame of a film, `width × height` from its upper left corner. */
const frameOf = async (
  path: string,
  frame: number,
  { width, height }: { readonly width: number; readonly height: number },
  how: string,
): Promise<Pixels> => {
  const raw = test.info().outputPath(`frame-${frame}.rgb`);
  await ffmpeg(
    ...['-i', path, '-vf', `select='eq(n,${frame})',${how}`, '-frames:v', '1'],
    ...['-f', 'rawvideo', '-pix_fmt', 'rgb24', raw],
  );
  const data = await readFile(raw);
  expect(data.length).toBe(width * height * 3);
  return { width, height, channels: 3, data };
};

/** What a page has drawn over its film, colours multiplied by how much of them there is. */
const drawnBy = async (canvas: Locator): Promise<Pixels> => {
  const { width, height, values } = await canvas.evaluate((element: HTMLCanvasElement) => {
    const context = element.getContext('2d');
    if (!context) throw new Error('The canvas is not painted on.');
    const { width, height } = element;
    return { width, height, values: [...context.getImageData(0, 0, width, height).data] };
  });
  const data = Uint8Array.from(values, (value, n) =>
    n % 4 === 3 ? value : Math.round((value * (values[n - (n % 4) + 3] ?? 0)) / 255),
  );
  return { width, height, channels: 4, data };
};

test('the coach has a film made, the athlete takes it home, and it is drawn as on the page', async ({
  app,
  page,
  browser,
  allowConsole,
}) => {
  // reading a canvas back four times
  allowConsole(/willReadFrequently/);
  await signIn(page, app, COACH);
  const { clip, rep, athleteId } = await markedClip(page.request);
  const { url, replay } = await ask(page.request, routes.makeReplay, {
    body: { visitId: clip.visitId, side: 'right', repId: rep.id },
  });
  await page.goto(`/athletes/${athleteId}`);
  const link = page.getByRole('region', { name: 'Links' }).getByRole('listitem').first();
  await link.getByRole('button', { name: 'Make a film to keep' }).click();
  await expect(link.getByText('The film to keep is being made.')).toBeVisible();
  await expect(link.getByRole('button', { name: 'Save the film' })).toBeVisible({
    timeout: 120_000,
  });

  const phone = await browser.newContext({ deviceScaleFactor: 2, reducedMotion: 'reduce' });
  const athlete = await phone.newPage();
  const opened = await phone.request.get(new URL(url).pathname.replace('/r/', '/api/r/'));
  const told = (await opened.json()) as PublicReplay;
  const crop = cropFor(told.overlay, told.width, told.height);
  // as wide as makes lines and marks as thick on the page as they are in the film
  const width = Math.round((crop.width * 900) / told.height);
  await athlete.setViewportSize({ width, height: 2000 });
  await athlete.goto(url);
  const download = athlete.waitForEvent('download');
  await athlete.getByRole('link', { name: /^Save the film/ }).click();
  const film = test.info().outputPath('film.mp4');
  const saved = await download;
  expect(saved.suggestedFilename()).toMatch(/^[\d-]+-replay\.mp4$/);
  await saved.saveAs(film);
  const video = await page.request.get(`/api/clips/${clip.id}/video`);
  const clear = test.info().outputPath('clear.mp4');
  await writeFile(clear, await video.body());

  const [wide = NaN] = `${await ffprobe('-show_entries', 'stream=width', '-of', 'csv=p=0', film)}`
    .split(',')
    .map(Number);
  const size = { width: wide, height: 2 * Math.round((wide * told.height) / told.width / 2) };
  const times = told.frames.ticks.map((tick) =>
    milliseconds((tick * told.frames.timeBase.num * 1000) / told.frames.timeBase.den),
  );
  const stops = momentsOf(told);
  expect(stops.map(({ name }) => name)).toEqual(['Quiet', '60°', '90°', 'Top']);
  const found: { moment: string; apart: number; likeness: number }[] = [];
  for (const { frame, name } of stops) {
    await athlete.getByRole('button', { name: new RegExp(`^${name}`) }).click();
    await expect(athlete.getByRole('button', { name: new RegExp(`^${name}`) })).toHaveAttribute(
      'aria-pressed',
      'true',
    );
    const drawing = await drawnBy(athlete.locator('video + canvas'));
    const filmed = await frameOf(
      film,
      frame - told.fromFrame,
      size,
      `crop=${size.width}:${size.height}:0:0`,
    );
    const plain = await frameOf(clear, frame, size, `scale=${size.width}:${size.height}`);
    const scale = size.width / told.width;
    const onPage = drawing.width / crop.width;
    for (const shape of drawnOn(told, times, frame, null).primitives) {
      if (!('landmark' in shape)) continue;
      const { u, v } = shape.at;
      if (u < crop.u || v < crop.v || u > crop.u + crop.width || v > crop.v + crop.height) continue;
      found.push({
        moment: `${name} ${shape.landmark}`,
        ...drawnApart(
          filmed,
          plain,
          drawing,
          (x, y) => [(x / scale - crop.u) * onPage, (y / scale - crop.v) * onPage],
          { x: u * scale, y: v * scale },
        ),
      });
    }
  }
  expect(found.length).toBeGreaterThan(4 * 6);
  await test.info().attach('apart', { body: JSON.stringify(found, null, 1) });
  // the same drawing, and no more than a pixel apart
  expect(found.filter(({ likeness }) => likeness < 0.8)).toEqual([]);
  expect(found.filter(({ apart }) => apart > 1)).toEqual([]);

  await page.reload();
  await expect(link.getByText(/taken once/)).toBeVisible();
  await ask(page.request, routes.revokeReplay, { params: { id: replay.id } });
  await phone.close();
});
