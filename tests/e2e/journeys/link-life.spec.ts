import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { expect, test } from '../support/app.ts';
import { ask } from './steps/ask.ts';
import { markedClip } from './steps/marked-clip.ts';
import { COACH, signIn } from './steps/people.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.use({ viewport: { width: 390, height: 844 } });
test.beforeEach(() => test.setTimeout(PREPARED_WITHIN + 120_000));

const FILM = 'Your lift, standing on the right leg';

/** A link to one rep of the demo, between two of its frames. */
async function aLink(request: APIRequestContext, passPhrase: string | null = null) {
  const { clip, rep } = await markedClip(request);
  const middle = Math.round((rep.startFrame + rep.endFrame) / 2);
  const [fromFrame, toFrame] = [middle - 20, middle + 30];
  const { frames } = await ask(request, routes.clip, { params: { id: clip.id } });
  if (frames === null) throw new Error('the demo clip has no frame times');
  const seconds = (frame: number) =>
    ((frames.ticks[frame] ?? NaN) * frames.timeBase.num) / frames.timeBase.den;
  const { url, replay } = await ask(request, routes.makeReplay, {
    body: { visitId: clip.visitId, side: 'right', repId: rep.id, fromFrame, toFrame, passPhrase },
  });
  return { url, replay, from: seconds(fromFrame), to: seconds(toFrame + 1) };
}

test('a link plays its own span again and again, and asks for nothing else', async ({
  app,
  page,
  browser,
}) => {
  await signIn(page, app, COACH);
  const { url, from, to } = await aLink(page.request);
  const phone = await browser.newContext();
  const athlete = await phone.newPage();
  const asked = new Set<string>();
  athlete.on('request', (request) => {
    const { pathname } = new URL(request.url());
    if (pathname.startsWith('/api/')) asked.add(pathname);
  });
  await athlete.goto(url);
  const film = athlete.getByLabel(FILM);
  await athlete.getByRole('button', { name: 'Own speed' }).click();
  const clock = () => film.evaluate((element: HTMLVideoElement) => element.currentTime);
  let last = 0;
  let rounds = 0;
  await expect
    .poll(async () => {
      const now = await clock();
      expect(now).toBeLessThan(to + 0.15);
      if (now < last) {
        rounds += 1;
        expect(now).toBeGreaterThanOrEqual(from - 0.01);
      }
      last = now;
      return rounds;
    })
    .toBeGreaterThan(1);
  const token = new URL(url).pathname.slice('/r/'.length);
  expect([...asked].filter((path) => !path.startsWith(`/api/r/${token}`))).toEqual([]);
  await phone.close();
});

test('stands still where motion is to be reduced', async ({ app, page, browser }) => {
  await signIn(page, app, COACH);
  const { url } = await aLink(page.request);
  const phone = await browser.newContext({ reducedMotion: 'reduce' });
  const athlete = await phone.newPage();
  await athlete.goto(url);
  await expect(athlete.getByRole('button', { name: 'Play in a loop' })).toBeVisible();
  expect(
    await athlete.getByLabel(FILM).evaluate((element: HTMLVideoElement) => element.paused),
  ).toBe(true);
  await phone.close();
});

test('a pass phrase is asked for before anything is shown', async ({
  app,
  page,
  browser,
  allowConsole,
}) => {
  // the browser writes a line for each answer that says no
  allowConsole(/401/);
  await signIn(page, app, COACH);
  const { url } = await aLink(page.request, 'heron reed');
  const phone = await browser.newContext();
  const athlete = await phone.newPage();
  await athlete.goto(url);
  await expect(
    athlete.getByRole('heading', { level: 1, name: 'Your replay asks for a pass phrase' }),
  ).toBeVisible();
  expect(
    (await phone.request.get(new URL(url).pathname.replace('/r/', '/api/r/') + '/poster')).status(),
  ).toBe(401);
  await athlete.getByLabel('Pass phrase').fill('heron');
  await athlete.getByRole('button', { name: 'Open the replay' }).click();
  await expect(athlete.getByText(/This is not the pass phrase/)).toBeVisible();
  await athlete.getByLabel('Pass phrase').fill('heron reed');
  await athlete.keyboard.press('Enter');
  await expect(
    athlete.getByRole('heading', { level: 1, name: 'Your right hip turns out early' }),
  ).toBeVisible();
  await phone.close();
});

test('an open page stops playing when its link is ended', async ({
  app,
  page,
  browser,
  allowConsole,
}) => {
  allowConsole(/404/);
  await signIn(page, app, COACH);
  const { url, replay } = await aLink(page.request);
  const phone = await browser.newContext();
  const athlete = await phone.newPage();
  await athlete.goto(url);
  await expect(athlete.getByLabel(FILM)).toBeVisible();
  await ask(page.request, routes.revokeReplay, { params: { id: replay.id } });
  await expect(
    athlete.getByRole('heading', { level: 1, name: 'This link has ended' }),
  ).toBeVisible();
  await expect(athlete.getByLabel(FILM)).toHaveCount(0);
  await phone.close();
});

test('a link that was ended is a page that says what to do, with 404', async ({
  app,
  page,
  browser,
  allowConsole,
}) => {
  allowConsole(/404/);
  await signIn(page, app, COACH);
  const { url, replay } = await aLink(page.request);
  await ask(page.request, routes.revokeReplay, { params: { id: replay.id } });
  const phone = await browser.newContext();
  const athlete = await phone.newPage();
  const answer = await athlete.goto(url);
  expect(answer?.status()).toBe(404);
  await expect(
    athlete.getByRole('heading', { level: 1, name: 'This link no longer opens anything' }),
  ).toBeVisible();
  await phone.close();
});
