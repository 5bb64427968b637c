import { readFile } from 'node:fs/promises';
import type { APIRequestContext, Page } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { paths } from '#src/ui/paths.ts';
import { safeVisit } from '../bench/made.ts';
import { expect, test } from '../support/app.ts';
import { ask } from './steps/ask.ts';
import { frameSlider, openBench, pressOnClip } from './steps/bench.ts';
import { demoClip } from './steps/demo-clip.ts';
import { carryOn, COACH, sessionOf } from './steps/people.ts';
import { CLIP_FILE } from './steps/right-early.ts';
import { chooseClip, PREPARED_WITHIN } from './steps/visit.ts';

test.describe.configure({ timeout: PREPARED_WITHIN + 120_000 });

let coach: APIRequestContext;
test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
});
test.afterAll(() => coach.dispose());
test.beforeEach(({ page }) => carryOn(page, coach));

/** Places in the picture, far enough from each other; where they are does not matter here. */
const FIRST = { u: 500, v: 900 };
const SECOND = { u: 620, v: 900 };

/** Opens the Bench at a frame of a rep that nobody has marked; `marks` asks the server what it has there. */
async function openUnmarked(page: Page, into: number) {
  const { id: clipId } = await demoClip(coach, 'Brook');
  const look = () => ask(coach, routes.bench, { params: { id: clipId } });
  const found = (await look()).reps.find(({ rep }) => rep.number === 4);
  if (found === undefined) throw new Error('the demo has no such rep');
  const { rep, marks } = found;
  const taken = marks.map((mark) => mark.frame);
  let frame = rep.startFrame + into;
  while (taken.includes(frame)) frame += 1;
  const address = `?rep=${rep.number}&frame=${frame}`;
  await openBench(page, clipId, address);
  await expect(frameSlider(page)).toHaveAttribute('aria-valuenow', String(frame));
  return {
    clipId,
    address,
    marks: async () =>
      (await look()).reps
        .flatMap(({ marks }) => marks)
        .filter((mark) => mark.frame === frame)
        .map(({ landmark }) => landmark),
  };
}

test('marks placed without a connection wait, and go on by themselves', async ({
  page,
  context,
  allowConsole,
}) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED/);
  const { marks } = await openUnmarked(page, 10);
  await context.setOffline(true);
  await expect(page.getByText(/^No connection\./)).toBeVisible();
  await pressOnClip(page, FIRST);
  await expect(page.getByText('1 mark waiting, no connection').first()).toBeVisible();
  await pressOnClip(page, SECOND);
  await expect(page.getByText('2 marks waiting, no connection').first()).toBeVisible();
  expect(await marks()).toEqual([]);

  await context.setOffline(false);
  await expect(page.getByText('all saved')).toBeVisible();
  expect((await marks()).sort()).toEqual(['asis-lifted', 'asis-support']);
});

test('marks that wait outlive the page', async ({ page, context, allowConsole }) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED/);
  const { clipId, address, marks } = await openUnmarked(page, 20);
  await context.setOffline(true);
  await pressOnClip(page, FIRST);
  await expect(page.getByText('1 mark waiting, no connection').first()).toBeVisible();
  await page.close();

  await context.setOffline(false);
  const again = await context.newPage();
  await openBench(again, clipId, address);
  await expect(again.getByText('all saved')).toBeVisible();
  await expect(
    again.getByRole('button', { name: /hip bone, support side, placed/ }),
  ).toBeAttached();
  expect(await marks()).toEqual(['asis-support']);
});

/** A visit in which clips are taken. */
async function openForClips(): Promise<string> {
  const athlete = await ask(coach, routes.addAthlete, {
    body: { givenName: 'Sedge', familyName: `Patchy ${process.pid}`, birthDate: '1999-02-03' },
  });
  const params = { id: athlete.id };
  const validUntil = `${new Date().getFullYear() + 1}-01-31`;
  await ask(coach, routes.recordConsent, {
    params,
    body: { givenBy: 'athlete', purposes: ['assessment'], validUntil },
  });
  return (await safeVisit(coach, athlete.id)).id;
}

/** Lets half of the clip arrive, then cuts the connection, and all others with it. */
async function cutHalfWay(page: Page): Promise<number> {
  const clip = await readFile(CLIP_FILE);
  const half = Math.floor(clip.length / 2);
  let cut = false;
  await page.route('**/api/uploads/*', async (route) => {
    if (cut || route.request().method() !== 'PATCH') return route.continue();
    cut = true;
    const sent = await coach.fetch(route.request().url(), {
      method: 'PATCH',
      headers: {
        'tus-resumable': '1.0.0',
        'upload-offset': '0',
        'content-type': 'application/offset+octet-stream',
      },
      data: clip.subarray(0, half),
    });
    expect(sent.headers()['upload-offset']).toBe(String(half));
    await page.context().setOffline(true);
    await route.abort('connectionreset');
  });
  return half;
}

test('a clip whose connection is cut goes on where it stopped', async ({
  page,
  context,
  allowConsole,
}) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED|ERR_CONNECTION_RESET/);
  const visitId = await openForClips();
  await page.goto(paths.visit(visitId));
  const row = await chooseClip(page, 'The set-up lacks the distance');
  const sentFrom: number[] = [];
  page.on('request', (request) => {
    if (request.method() === 'PATCH') sentFrom.push(Number(request.headers()['upload-offset']));
  });
  const half = await cutHalfWay(page);
  await row.getByRole('button', { name: 'Send right-early.mov' }).click();
  await expect(row).toContainText(/no connection at \d+ %: goes on by itself/);

  await context.setOffline(false);
  await expect(row.getByText(/waits to be prepared|preparing|ready/)).toBeVisible();
  expect(sentFrom).toEqual([0, half]);
  const { clips } = await ask(coach, routes.visit, { params: { id: visitId } });
  expect(clips.map(({ name, state }) => [name, state === 'refused'])).toEqual([
    ['right-early.mov', false],
  ]);
  // nobody waits for it to be prepared
  for (const { id } of clips) await ask(coach, routes.deleteClip, { params: { id } });
});
