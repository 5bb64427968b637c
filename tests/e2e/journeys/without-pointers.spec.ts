import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { madeFront } from '#shared/evaluate/made-pair.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { COACH, makeClip, sessionOf } from '../bench/made.ts';
import { giveGeometry, markAs, MOTION, STEP } from '../bench/made-marks.ts';
import { expect, test } from '../support/app.ts';
import { ask } from './steps/ask.ts';
import { signIn, SUPERVISOR } from './steps/people.ts';
import { givePlan } from './steps/plan.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.describe.configure({ mode: 'serial' });

let coach: APIRequestContext;
let made = { visitId: '', clipId: '' };
const side = () => `/visits/${made.visitId}/sides/right`;
const SEEN = 'seen by the coach, not measured';

test.beforeAll(async ({ app }) => {
  test.setTimeout(PREPARED_WITHIN + 60_000);
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, `Bare ${process.pid}`);
});
test.afterAll(() => coach.dispose());

test('a coach without pointers calls by eye, marks bare landmarks and gets a reading', async ({
  app,
  page,
}) => {
  await signIn(page, app, COACH);
  await page.goto(`${side()}/call`);
  await page.getByRole('radio', { name: 'Turned out early' }).check();
  await page.getByRole('radio', { name: 'Fairly sure' }).check();
  await page.getByRole('button', { name: 'Save the call' }).click();
  await expect(page.getByText(SEEN).first()).toBeVisible();

  await giveGeometry(coach, made.clipId);
  const { version, geometry } = await ask(coach, routes.clip, { params: { id: made.clipId } });
  await ask(coach, routes.editClip, {
    params: { id: made.clipId },
    body: { version, geometry: { ...geometry, beltPointerMm: null, thighPointerMm: null } },
  });
  const bare = new Set<string>(landmarksOf('bare'));
  for (const seed of [6, 7, 8]) {
    const rep = madeFront(MOTION, { stepMs: STEP, scatterPx: 0.5, startMs: 0, seed });
    const frames = rep.frames.map((frame) => ({
      ...frame,
      marks: Object.fromEntries(Object.entries(frame.marks).filter(([id]) => bare.has(id))),
    }));
    await markAs(coach, made.clipId, { ...rep, frames });
  }
  const { reading } = await ask(coach, routes.sideReading, {
    params: { id: made.visitId, side: 'right' },
  });
  if (!reading) throw new Error('there is no reading');
  expect(reading.result.set).toBe('bare');
  // bare landmarks claim no less than they can tell: 10° early need not be found, and is never its opposite
  expect(['early-turn-out', 'cannot-tell', 'not-measurable']).toContain(reading.code);
  await page.goto(side());
  await expect(page.getByRole('heading', { level: 1, name: reading.label })).toBeVisible();
  await expect(page.getByText(/bare landmarks, without pointers/i).first()).toBeVisible();
  await expect(page.getByText('seen, not measured')).toBeVisible();
});

test('the supervisor signs off, and the plan follows what was seen', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await page.goto(`${side()}#sign-off`);
  const panel = page.getByRole('region', { name: 'Sign-off' });
  await panel.getByRole('button', { name: /^Hand in/ }).click();
  await expect(panel.getByRole('heading', { name: /^Waiting for / })).toBeVisible();
  await signIn(page, app, SUPERVISOR);
  await page.goto('/review');
  await page.goto(`${side()}#sign-off`);
  await panel.getByRole('button', { name: 'Sign off' }).click();
  await expect(panel.getByRole('heading', { name: /^Signed off by / })).toBeVisible();

  await signIn(page, app, COACH);
  await givePlan(page, made, '2031-05-04', SEEN);
  await expect(page.getByText(SEEN).first()).toBeVisible();
});

test('the athlete is told what was seen, not measured, and what to do about it', async ({
  app,
  page,
  browser,
}) => {
  const { visit } = await ask(coach, routes.visit, { params: { id: made.visitId } });
  await ask(coach, routes.recordConsent, {
    params: { id: visit.athlete.id },
    body: {
      givenBy: 'athlete',
      purposes: ['assessment', 'supervision', 'sharing-by-link'],
      validUntil: `${new Date().getFullYear() + 1}-01-31`,
    },
  });
  await signIn(page, app, COACH);
  await page.goto('/');
  await page.goto(`${side()}#replay`);
  const section = page.getByRole('region', { name: 'Replay for the athlete' });
  await section.getByLabel('Show the measured reading').uncheck();
  await section.getByRole('button', { name: 'Make a link' }).click();
  const link = await section.getByLabel(/^The link is ready/).inputValue();

  const phone = await browser.newContext({ viewport: { width: 390, height: 844 } });
  const athlete = await phone.newPage();
  await athlete.goto(link);
  await expect(
    athlete.getByRole('heading', { level: 1, name: 'Your right hip turned out early' }),
  ).toBeVisible();
  await expect(athlete.getByText('seen by your coach, not measured')).toBeVisible();
  await expect(athlete.getByText(/standing hip/)).toHaveCount(0);
  await expect(athlete.getByText(/\d°\s*±/)).toHaveCount(0);
  const plan = athlete.getByRole('region', { name: 'Your plan' });
  await expect(plan.getByRole('heading', { name: 'Supported hinge' })).toBeVisible();
  await expect(plan.getByRole('button', { name: /^today, / }).first()).toBeVisible();
  await phone.close();
});
