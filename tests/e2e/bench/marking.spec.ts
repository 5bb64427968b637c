import type { APIRequestContext } from '@playwright/test';
import { expect, test } from '../support/app.ts';
import {
  cross,
  handle,
  onScreen,
  openBench,
  press,
  saved,
  showsFrame,
  slider,
} from './bench-page.ts';
import { addRep, COACH, FRAMES, type MadeClip, makeClip, sessionOf, storedMark } from './made.ts';

test.describe.configure({ mode: 'serial' });

let coach: APIRequestContext;
let made: MadeClip;
let repId: string;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, 'Marking');
  repId = (await addRep(coach, made.clipId)).id;
});
test.afterAll(() => coach.dispose());
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

test('the clip is a slider over its frames, and the address keeps the frame', async ({ page }) => {
  await openBench(page, made.clipId);
  // nothing was pressed yet, and nothing has taken the focus: the first arrow is the clip's
  await expect(page.locator('body')).toBeFocused();
  await page.keyboard.press('ArrowRight');
  await showsFrame(page, 1);
  await expect(slider(page)).toBeFocused();
  await page.keyboard.press('PageUp');
  await showsFrame(page, 11);
  await page.keyboard.press('End');
  await showsFrame(page, FRAMES - 1);
  await page.keyboard.press('PageDown');
  await showsFrame(page, FRAMES - 11);
  await page.keyboard.press('Home');
  await showsFrame(page, 0);
  await page.keyboard.press('ArrowLeft');
  await showsFrame(page, 0);
  await page.keyboard.press('ArrowRight');
  await expect(page).toHaveURL(/\?frame=1&rep=1$/);
  await page.reload();
  await showsFrame(page, 1);
});

test('a press places what is asked for, the next is asked for, and undo takes it back', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=2');
  await page.getByRole('button', { name: /landmarks$/ }).click();
  await page.getByLabel('Belt and thigh pointers').check();
  await expect(
    page.getByRole('heading', { name: /^Next: front corner.*support side/ }),
  ).toBeVisible();
  await press(page, 600, 1000);
  await expect(handle(page, 'asis-support')).toBeAttached();
  await expect(
    page.getByRole('heading', { name: /^Next: front corner.*lifted side/ }),
  ).toBeVisible();
  await expect(saved(page)).toBeVisible();
  const stored = await storedMark(coach, repId, 2, 'asis-support');
  expect(Math.abs((stored?.u ?? 0) - 600)).toBeLessThan(4);
  expect(Math.abs((stored?.v ?? 0) - 1000)).toBeLessThan(4);
  expect(stored?.pictureLongEdge).toBe(1920);

  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(handle(page, 'asis-support')).not.toBeAttached();
  await expect(saved(page)).toBeVisible();
  expect(await storedMark(coach, repId, 2, 'asis-support')).toBeNull();

  await slider(page).focus();
  await page.keyboard.press('Control+Shift+z');
  await expect(handle(page, 'asis-support')).toBeAttached();
  await expect(saved(page)).toBeVisible();
  expect((await storedMark(coach, repId, 2, 'asis-support'))?.u).toBe(stored?.u);
});

test('a drag is one step, and Escape puts the mark back', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=2');
  const before = await storedMark(coach, repId, 2, 'asis-support');
  const from = await onScreen(page, before?.u ?? 0, before?.v ?? 0);

  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x + 30, from.y + 10, { steps: 5 });
  await page.keyboard.press('Escape');
  await page.mouse.up();
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  expect(await storedMark(coach, repId, 2, 'asis-support')).toEqual(before);

  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x + 30, from.y + 10, { steps: 5 });
  await page.mouse.up();
  await expect(page.getByRole('button', { name: 'Undo' })).toBeEnabled();
  await expect(saved(page)).toBeVisible();
  await expect
    .poll(async () => (await storedMark(coach, repId, 2, 'asis-support'))?.revision)
    .toBe((before?.revision ?? 0) + 1);
  const after = await storedMark(coach, repId, 2, 'asis-support');
  expect(after?.u).toBeGreaterThan((before?.u ?? 0) + 60);
});

test('a press on a mark places what is asked for, since landmarks can cover each other', async ({
  page,
}) => {
  // with a level thigh the lifted knee stands before the hip bone
  await openBench(page, made.clipId, '?frame=2');
  const support = await storedMark(coach, repId, 2, 'asis-support');
  await expect(
    page.getByRole('heading', { name: /^Next: front corner.*lifted side/ }),
  ).toBeVisible();
  await press(page, support?.u ?? 0, support?.v ?? 0);
  await expect(handle(page, 'asis-lifted')).toBeAttached();
  await expect(saved(page)).toBeVisible();
  const lifted = await storedMark(coach, repId, 2, 'asis-lifted');
  expect(
    Math.hypot((lifted?.u ?? NaN) - (support?.u ?? NaN), (lifted?.v ?? NaN) - (support?.v ?? NaN)),
  ).toBeLessThan(4);
  expect(await storedMark(coach, repId, 2, 'asis-support')).toEqual(support);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(handle(page, 'asis-lifted')).not.toBeAttached();
  await expect(saved(page)).toBeVisible();
});

test('Tab reaches a mark, arrows nudge it by a tenth, one and ten pixels, in one step each', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=2');
  const before = await storedMark(coach, repId, 2, 'asis-support');
  await slider(page).focus();
  await page.keyboard.press('Tab');
  await expect(handle(page, 'asis-support')).toBeFocused();
  await page.keyboard.press('Alt+ArrowRight');
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('ArrowLeft');
  await expect
    .poll(async () => (await storedMark(coach, repId, 2, 'asis-support'))?.revision)
    .toBe((before?.revision ?? 0) + 3);
  const after = await storedMark(coach, repId, 2, 'asis-support');
  expect(after?.u).toBeCloseTo((before?.u ?? 0) - 0.9, 6);
  expect(after?.v).toBeCloseTo((before?.v ?? 0) + 10, 6);

  // a held arrow is one gesture
  await page.keyboard.down('ArrowUp');
  await page.keyboard.down('ArrowUp');
  await page.keyboard.down('ArrowUp');
  await page.keyboard.up('ArrowUp');
  await expect
    .poll(async () => (await storedMark(coach, repId, 2, 'asis-support'))?.revision)
    .toBe((before?.revision ?? 0) + 4);
  expect((await storedMark(coach, repId, 2, 'asis-support'))?.v).toBeCloseTo(
    (before?.v ?? 0) + 7,
    6,
  );
});

test('Enter places without a pointer at the previous position, or at the cross', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=5');
  const earlier = await storedMark(coach, repId, 2, 'asis-support');
  await slider(page).focus();
  await page.keyboard.press('Enter');
  await expect(handle(page, 'asis-support')).toBeAttached();
  await expect(saved(page)).toBeVisible();
  const placed = await storedMark(coach, repId, 5, 'asis-support');
  expect([placed?.u, placed?.v]).toEqual([earlier?.u, earlier?.v]);

  // what was never placed has no previous position: the cross is moved there, then Enter
  await cross(page).focus();
  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('Enter');
  await expect(handle(page, 'asis-lifted')).toBeAttached();
});

test('what cannot be seen is hidden, and a hidden landmark counts as done', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=5');
  await expect(
    page.getByRole('heading', { name: 'Next: edge of the pelvis, support side' }),
  ).toBeVisible();
  await page.getByRole('button', { name: 'Can’t see it' }).click();
  await expect(
    page.getByRole('heading', { name: 'Next: edge of the pelvis, lifted side' }),
  ).toBeVisible();
  await expect(page.getByText(/1 hidden/)).toBeVisible();
  await expect(saved(page)).toBeVisible();
  expect(await storedMark(coach, repId, 5, 'outline-support')).toMatchObject({
    hidden: true,
    u: null,
  });
});

test('enlarged beyond the copy, the frame is shown at the phone’s own resolution', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=5');
  await expect(page.locator('[data-picture="full"]')).not.toBeAttached();
  for (let n = 0; n < 5; n += 1) await page.getByRole('button', { name: 'Enlarge' }).click();
  const full = page.locator('img[data-picture="full"]');
  await expect(full).toBeAttached();
  await expect
    .poll(() =>
      full.evaluate((image: HTMLImageElement) => [image.naturalWidth, image.naturalHeight]),
    )
    .toEqual([1440, 2560]);
  await page.getByRole('button', { name: 'Whole picture' }).click();
  await expect(full).not.toBeAttached();
});
