import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, openBench } from './bench-page.ts';
import { addRep, COACH, FRAMES, type MadeClip, makeClip, sessionOf } from './made.ts';

let coach: APIRequestContext;
let made: MadeClip;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, 'Hidden');
});
test.afterAll(() => coach.dispose());

test('a box is drawn by keyboard, followed and looked at; then a link hides the head', async ({
  page,
  browser,
}) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
  const rep = await addRep(coach, made.clipId);
  await openBench(page, made.clipId);
  await desk(page, 'Head').click();
  await page.getByRole('button', { name: 'Put a box on frame 0' }).click();
  const box = page.getByRole('button', { name: /^Box around the head/ });
  await box.focus();
  const before = await box.boundingBox();
  for (let n = 0; n < 5; n += 1) await page.keyboard.press('Shift+ArrowRight');
  const corner = page.getByRole('button', { name: /^Corner of the box/ });
  await corner.focus();
  for (let n = 0; n < 5; n += 1) await page.keyboard.press('Shift+ArrowDown');
  const after = await box.boundingBox();
  expect(after?.x).toBeGreaterThan((before?.x ?? NaN) + 5);
  expect(after?.height).toBeGreaterThan((before?.height ?? NaN) + 5);
  await page.getByRole('button', { name: 'Follow the box through the clip' }).click();
  const looked = page.getByRole('button', { name: 'I have looked: the head is covered' });
  await expect(looked).toBeVisible({ timeout: 120_000 });
  await looked.click();
  await expect(page.getByText(/A replay can hide it now/)).toBeVisible();

  const { head } = await ask(coach, routes.head, { params: { id: made.clipId } });
  expect(head).toMatchObject({ version: 1, fromFrame: 0, toFrame: FRAMES - 1, uncovered: [] });
  const { athlete } = await ask(coach, routes.bench, { params: { id: made.clipId } });
  await ask(coach, routes.recordConsent, {
    params: { id: athlete.id },
    body: {
      givenBy: 'athlete',
      purposes: ['assessment', 'sharing-by-link'],
      validUntil: `${new Date().getFullYear() + 1}-01-31`,
    },
  });
  await ask(coach, routes.recordCall, {
    params: { id: made.visitId, side: 'right' },
    body: { seen: 'unsure', confidence: 'guess' },
  });
  const { url, replay } = await ask(coach, routes.makeReplay, {
    body: { visitId: made.visitId, side: 'right', repId: rep.id, hideHead: true },
  });
  const phone = await browser.newContext({ viewport: { width: 390, height: 844 } });
  const link = await phone.newPage();
  await link.goto(url);
  // the film comes by itself, whether it was ready at once or a while later
  const film = link.getByLabel('Your lift, standing on the right leg');
  await expect(film).toBeVisible({ timeout: 120_000 });
  await expect(link.getByText(/The head is hidden on the film/)).toBeVisible();
  const { items } = await ask(coach, routes.listReplays, { query: { visitId: made.visitId } });
  expect(items.find(({ id }) => id === replay.id)?.head).toBe('hidden');
  await phone.close();
});
