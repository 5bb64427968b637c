import type { APIRequestContext, CDPSession } from '@playwright/test';
import { expect, test } from '../support/app.ts';
import { handle, openBench } from './bench-page.ts';
import { addRep, COACH, type MadeClip, makeClip, sessionOf } from './made.ts';

test.use({ viewport: { width: 390, height: 844 }, hasTouch: true });

let coach: APIRequestContext;
let made: MadeClip;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, 'Touch');
  await addRep(coach, made.clipId);
});
test.afterAll(() => coach.dispose());
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

type Finger = readonly [x: number, y: number];
const touch = (
  line: CDPSession,
  type: 'touchStart' | 'touchMove' | 'touchEnd',
  fingers: readonly Finger[],
) =>
  line.send('Input.dispatchTouchEvent', {
    type,
    touchPoints: fingers.map(([x, y], id) => ({ x, y, id })),
  });

test('a finger is held, slid and let go to place; the glass shows the exact point', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=2');
  const stage = await page.locator('.bench-clip').boundingBox();
  if (!stage) throw new Error('no stage');
  const line = await page.context().newCDPSession(page);
  await touch(line, 'touchStart', [[stage.x + 120, stage.y + 200]]);
  await touch(line, 'touchMove', [[stage.x + 180, stage.y + 220]]);
  await expect(page.locator('[data-magnifier]')).toBeVisible();
  await expect(handle(page, 'asis-support')).not.toBeAttached();
  await touch(line, 'touchEnd', []);
  await expect(handle(page, 'asis-support')).toBeAttached();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(handle(page, 'asis-support')).not.toBeAttached();
});

test('two fingers enlarge the picture and place nothing', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=3');
  const stage = await page.locator('.bench-clip').boundingBox();
  if (!stage) throw new Error('no stage');
  const { x, y } = stage;
  const picture = page.locator('canvas[data-picture="copy"]');
  const before = (await picture.boundingBox())?.width ?? 0;
  const line = await page.context().newCDPSession(page);
  await touch(line, 'touchStart', [[x + 150, y + 200]]);
  await touch(line, 'touchStart', [
    [x + 150, y + 200],
    [x + 210, y + 200],
  ]);
  await touch(line, 'touchMove', [
    [x + 120, y + 200],
    [x + 240, y + 200],
  ]);
  await touch(line, 'touchEnd', []);
  await expect
    .poll(async () => ((await picture.boundingBox())?.width ?? 0) / before)
    .toBeGreaterThan(1.8);
  await expect(page.locator('[data-landmark]')).toHaveCount(0);
});
