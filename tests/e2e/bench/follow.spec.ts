import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { APIRequestContext, Page } from '@playwright/test';
import { framePoint } from '#shared/geometry/points.ts';
import { routes } from '#shared/contracts/routes.ts';
import { landmark, landmarksOf } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { fit, toStage } from '#src/canvas/viewport.ts';
import { loadTruth } from '#tests/fixtures/clips/truth.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, handle, openBench, saved } from './bench-page.ts';
import { COACH, type MadeClip, makeClip, sessionOf } from './made.ts';

test.describe.configure({ mode: 'serial' });

/** Three reps on the left leg with dots and both pointers, which turn in on time. */
const truth = loadTruth('left-expected');
const SIDE = 'left';
const LED = landmarksOf('belt+thigh');
/** Both feet stand still here. */
const QUIET = 40;
const TRUE_CHANGE =
  truth.reps.reduce((sum, rep) => sum + (rep.turnChange60To90 ?? NaN), 0) / truth.reps.length;
/** The first picture of a film of 900 frames. */
const OPENED_WITHIN = 120_000;
/** Following 900 frames on a busy machine. */
const FOLLOWED_WITHIN = 480_000;
/** A hundred small pictures on a busy machine. */
const PAINTED_WITHIN = 120_000;
/** A thousand marks on a busy machine. */
const SAVED_WITHIN = 120_000;

let coach: APIRequestContext;
let made: MadeClip;
/** Presses that place, confirm or change a mark. */
let presses = 0;

test.beforeAll(async ({ app }) => {
  test.setTimeout(600_000);
  coach = await sessionOf(app, COACH);
  const file = fileURLToPath(new URL(`../../fixtures/clips/${truth.file}`, import.meta.url));
  made = await makeClip(coach, 'Following', {
    film: await readFile(file),
    supportSide: SIDE,
  });
  const params = { id: made.clipId };
  const { version, geometry } = await ask(coach, routes.clip, { params });
  const { distanceMm, lensHeightMm, beltPointerMm, thighPointerMm, rodLengthMm } = truth.setUp;
  const [a, b] = [truth.rod.top, truth.rod.bottom].map(([u, v]) => ({ u, v }));
  if (!a || !b) throw new Error('no rod');
  await ask(coach, routes.editClip, {
    params,
    body: {
      version,
      geometry: {
        ...geometry,
        scale: { from: 'rod', a, b, lengthMm: rodLengthMm },
        ...{ distanceMm, lensHeightMm, beltPointerMm, thighPointerMm },
      },
    },
  });
  await ask(coach, routes.recordCall, {
    params: { id: made.visitId, side: SIDE },
    body: { seen: 'unsure', confidence: 'guess' },
  });
});
test.afterAll(() => coach.dispose());
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

const press = async (page: Page, [u, v]: readonly [number, number]): Promise<void> => {
  const stage = await page.locator('.bench-clip').boundingBox();
  if (stage === null) throw new Error('the Bench shows no clip');
  const at = toStage(fit(truth.picture, stage), framePoint(u, v));
  await page.mouse.click(stage.x + at.x, stage.y + at.y);
  presses += 1;
};
const panel = (page: Page) => page.getByRole('region', { name: 'Marks that follow' });

const askedFor = (page: Page, id: LandmarkId) => {
  const { label } = landmark(id);
  const name = label.charAt(0).toLowerCase() + label.slice(1);
  return page.getByRole('heading', { name: `Next: ${name}` });
};

test('what is touched before there is a rep outlives the page', async ({ page }) => {
  await openBench(page, made.clipId, `?frame=${QUIET}`, OPENED_WITHIN);
  const marks = truth.frames[QUIET]?.marks ?? {};
  const [first, second, third] = LED;
  if (!first || !second || !third) throw new Error('fewer than three landmarks');
  for (const id of [first, second]) {
    await expect(askedFor(page, id)).toBeVisible();
    await press(page, marks[id] ?? [NaN, NaN]);
    await expect(handle(page, id)).toBeAttached();
  }
  await expect(page.getByText('2 marks on this device only')).toBeVisible();
  await page.reload();
  await expect(askedFor(page, third)).toBeVisible();
  await expect(handle(page, first)).toBeAttached();
  await expect(handle(page, second)).toBeAttached();
  await expect(page.getByText('2 marks on this device only')).toBeVisible();
});

test('from the opened Bench to a final reading in twelve touches', async ({ page }) => {
  test.setTimeout(600_000);
  presses = 0;
  await openBench(page, made.clipId, `?frame=${QUIET}`, OPENED_WITHIN);
  const marks = truth.frames[QUIET]?.marks ?? {};
  for (const id of LED) {
    await expect(askedFor(page, id)).toBeVisible();
    const [u, v] = marks[id] ?? [NaN, NaN];
    // as a finger does, a little beside the middle
    await press(page, [u + 2, v - 1]);
  }
  const take = panel(page).getByRole('button', { name: 'Take these 3 reps' });
  await expect(take).toBeVisible({ timeout: FOLLOWED_WITHIN });
  await page.screenshot({ path: 'tests/.out/follow-found.png' });
  await take.click();
  presses += 1;
  await expect(page.getByRole('heading', { level: 1 })).toContainText('rep 1 of 3');
  await expect(saved(page)).toBeVisible({ timeout: SAVED_WITHIN });
  await expect(page.getByRole('heading', { name: /unsure/ })).toHaveCount(1);

  const right = page.getByRole('button', { name: /frames are right$/ });
  const tick = page.getByRole('button', { name: 'Tick them all' });
  if (await tick.isVisible()) {
    await tick.click();
    presses += 1;
  }
  // nobody confirms what is not to be seen yet
  await expect(right).toBeEnabled({ timeout: PAINTED_WITHIN });
  await page.screenshot({ path: 'tests/.out/follow-look.png' });
  await right.click();
  presses += 1;
  await expect(page.getByText(/all looked at/).first()).toBeVisible();
  await expect(page.getByText(/^This took: preparing the clip .*, marking /)).toBeVisible();
  await expect(saved(page)).toBeVisible({ timeout: SAVED_WITHIN });
  await page.screenshot({ path: 'tests/.out/follow-done.png' });
  expect(presses).toBeLessThanOrEqual(12);

  await page.goto(`/visits/${made.visitId}/sides/${SIDE}`);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Turns in on time');
  await expect(page.getByText('Provisional.')).toHaveCount(0);
  await page.screenshot({ path: 'tests/.out/follow-reading.png' });
  const params = { id: made.visitId, side: SIDE } as const;
  const { reading } = await ask(coach, routes.sideReading, { params });
  expect(reading?.code).toBe('expected-turn-in');
  expect(reading?.provisional).toBe(false);
  expect(reading?.result.reps.filter(({ used }) => used)).toHaveLength(3);
  const off = Math.abs((reading?.change ?? NaN) - TRUE_CHANGE);
  expect(off).toBeLessThan(reading?.plusMinus ?? 0);
  expect(off).toBeLessThan(3);
});

test('what was confirmed stays confirmed when the Bench is opened again', async ({ page }) => {
  await openBench(page, made.clipId, `?frame=${QUIET}`, OPENED_WITHIN);
  await desk(page, /^Look/).click();
  await expect(page.getByText(/all looked at/).first()).toBeVisible();
});
