import type { APIRequestContext } from '@playwright/test';
import { expect, test } from '../support/app.ts';
import { handle, openBench, press, saved, slider } from './bench-page.ts';
import {
  addRep,
  COACH,
  type MadeClip,
  makeClip,
  placeMark,
  sessionOf,
  storedMark,
  OWNER,
} from './made.ts';

test.describe.configure({ mode: 'serial' });

let coach: APIRequestContext;
let owner: APIRequestContext;
let made: MadeClip;
let repId: string;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  owner = await sessionOf(app, OWNER);
  made = await makeClip(coach, 'Waiting');
  repId = (await addRep(coach, made.clipId)).id;
});
test.afterAll(async () => {
  await coach.dispose();
  await owner.dispose();
});
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

const SEND = '**/api/reps/*/marks';

test('without a connection marks wait on the device, survive a reload, and are sent later', async ({
  page,
  allowConsole,
}) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED|ERR_FAILED/);
  await openBench(page, made.clipId, '?frame=1');
  await page.route(SEND, (route) => route.abort('internetdisconnected'));
  await press(page, 500, 900);
  await press(page, 800, 900);
  await expect(page.getByText('2 marks waiting, no connection').first()).toBeVisible();
  expect(await storedMark(coach, repId, 1, 'asis-support')).toBeNull();

  await page.reload();
  await expect(page.getByText('2 marks waiting, no connection').first()).toBeVisible();
  await expect(handle(page, 'asis-support')).toBeAttached();
  await expect(handle(page, 'asis-lifted')).toBeAttached();

  await page.unroute(SEND);
  await page.evaluate(() => window.dispatchEvent(new Event('online')));
  await expect(saved(page)).toBeVisible();
  expect(await storedMark(coach, repId, 1, 'asis-support')).toMatchObject({ revision: 1 });
  expect(await storedMark(coach, repId, 1, 'asis-lifted')).toMatchObject({ revision: 1 });
});

test('an answer lost on the way places nothing twice', async ({ page, allowConsole }) => {
  allowConsole(/ERR_FAILED|ERR_CONNECTION/);
  await openBench(page, made.clipId, '?frame=3');
  // the server does it, and its answer never arrives
  await page.route(SEND, async (route) => {
    await route.fetch();
    await route.abort('failed');
  });
  await press(page, 500, 900);
  await expect(page.getByText(/1 mark waiting/).first()).toBeVisible();
  await page.unroute(SEND);
  await page.evaluate(() => window.dispatchEvent(new Event('online')));
  await expect(saved(page)).toBeVisible();
  expect(await storedMark(coach, repId, 3, 'asis-support')).toMatchObject({ revision: 1 });
});

test('what somebody else marks appears by itself', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=4');
  await expect(handle(page, 'asis-support')).not.toBeAttached();
  const mark = { frame: 4, landmark: 'asis-support', u: 510, v: 910, baseRevision: 0 };
  expect(await placeMark(owner, repId, mark)).toBe('applied');
  await expect(handle(page, 'asis-support')).toBeAttached();
});

test('two people set one mark: both are shown until one decides', async ({
  page,
  allowConsole,
}) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED|ERR_FAILED/);
  await openBench(page, made.clipId, '?frame=6');
  for (const [keep, expected] of [
    ['Keep mine', 'mine'],
    ['Keep theirs', 'theirs'],
  ] as const) {
    const stored = await storedMark(coach, repId, 6, 'asis-support');
    await page.route(SEND, (route) => route.abort('internetdisconnected'));
    // the first time it is asked for; later the mark is chosen and placed again
    if (stored) {
      await handle(page, 'asis-support').focus();
      await page.keyboard.press('Shift+ArrowRight');
    } else await press(page, 500, 900);
    await expect(page.getByText(/1 mark waiting/).first()).toBeVisible();
    const theirs = {
      frame: 6,
      landmark: 'asis-support',
      u: expected === 'mine' ? 560 : 600,
      v: 900,
      baseRevision: stored?.revision ?? 0,
    };
    expect(await placeMark(owner, repId, theirs)).toBe('applied');
    await page.unroute(SEND);
    await page.evaluate(() => window.dispatchEvent(new Event('online')));

    const inset = page.getByRole('region', { name: 'Two people set the same mark' });
    await expect(inset).toBeVisible();
    await expect(inset.getByText(/px of the phone’s picture apart/)).toBeVisible();
    await expect(page.getByText('1 mark to settle').first()).toBeVisible();
    // nothing was written over meanwhile
    expect((await storedMark(coach, repId, 6, 'asis-support'))?.u).toBe(theirs.u);

    await inset.getByRole('button', { name: keep }).click();
    await expect(inset).not.toBeVisible();
    await expect(saved(page)).toBeVisible();
    const after = await storedMark(coach, repId, 6, 'asis-support');
    if (expected === 'mine') expect(after?.u).not.toBe(theirs.u);
    else expect(after?.u).toBe(theirs.u);
  }
});

test('two tabs of one person send each mark once and show the same', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=8');
  const other = await page.context().newPage();
  await openBench(other, made.clipId, '?frame=8');
  await press(page, 500, 900);
  await expect(handle(other, 'asis-support')).toBeAttached();
  await expect(saved(page)).toBeVisible();
  await expect(saved(other)).toBeVisible();
  expect(await storedMark(coach, repId, 8, 'asis-support')).toMatchObject({ revision: 1 });
  await slider(other).focus();
  await other.close();
});
