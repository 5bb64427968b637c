import type { APIRequestContext, Page } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { madeFront } from '#shared/evaluate/made-pair.ts';
import { longDay } from '#src/ui/days.ts';
import { COACH, makeClip, safeVisit, sendClip, sessionOf } from '../bench/made.ts';
import { giveGeometry, markAs, MOTION, STEP } from '../bench/made-marks.ts';
import { expect, test } from '../support/app.ts';
import { ask } from './steps/ask.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.describe.configure({ mode: 'serial' });

const dayBefore = (days: number): string =>
  new Date(Date.now() - days * 86_400_000).toISOString().slice(0, 10);
const FIRST = dayBefore(42);
const SECOND = dayBefore(1);

let coach: APIRequestContext;
let athleteId = '';
let today = { visitId: '', clipId: '' };
let firstVisit = '';

/** The call by eye, and marks of a body that turns by so much from 60° to 90° of lift. */
const read = async (
  { visitId, clipId }: typeof today,
  { turn, seed }: { turn: number; seed: number },
) => {
  await giveGeometry(coach, clipId);
  await ask(coach, routes.recordCall, {
    params: { id: visitId, side: 'right' },
    body: { seen: turn > 0 ? 'early' : 'on-time', confidence: 'sure' },
  });
  const motion = { ...MOTION, turnAt: (lift: number) => (Math.max(0, lift - 60) * turn) / 30 };
  const filming = { stepMs: STEP, scatterPx: 0.5, startMs: 0, seed };
  await markAs(coach, clipId, madeFront(motion, filming));
  const { reading } = await ask(coach, routes.sideReading, {
    params: { id: visitId, side: 'right' },
  });
  expect(Math.abs((reading?.change ?? NaN) - turn)).toBeLessThan(reading?.plusMinus ?? NaN);
};

const visitOf = async (day: string): Promise<typeof today> => {
  const { id } = await safeVisit(coach, athleteId, day);
  return { visitId: id, clipId: await sendClip(coach, id, `${day}.mp4`, 'front') };
};

const seen = async (page: Page): Promise<void> => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
};

test.beforeAll(async ({ app }) => {
  test.setTimeout(PREPARED_WITHIN + 120_000);
  coach = await sessionOf(app, COACH);
  today = await makeClip(coach, `Retest ${process.pid}`);
  const { visit } = await ask(coach, routes.visit, { params: { id: today.visitId } });
  athleteId = visit.athlete.id;
  await ask(coach, routes.recordConsent, {
    params: { id: athleteId },
    body: {
      givenBy: 'athlete',
      purposes: ['assessment', 'supervision', 'sharing-by-link'],
      validUntil: `${new Date().getFullYear() + 1}-01-31`,
    },
  });
  const first = await visitOf(FIRST);
  firstVisit = first.visitId;
  await read(first, { turn: 15, seed: 3 });
  await read(await visitOf(SECOND), { turn: 14, seed: 4 });
});
test.afterAll(() => coach.dispose());

test('a retest that differs by less than the error is no change that this test can show', async ({
  page,
}) => {
  await seen(page);
  await page.goto(`/athletes/${athleteId}`);
  await expect(page.getByText('No change that this test can show.')).toBeVisible();
  await expect(page.getByText('Changed by more than the error.')).toHaveCount(0);
});

test('a real change is seen by the coach', async ({ page }) => {
  await read(today, { turn: -12, seed: 5 });
  await seen(page);
  await page.goto(`/athletes/${athleteId}`);
  await expect(page.getByText('Changed by more than the error.').first()).toBeVisible();
  await expect(page.getByText('No change that this test can show.')).toHaveCount(0);
});

test('and by the athlete: both lifts at the same height, side by side on a phone', async ({
  page,
  browser,
}) => {
  await seen(page);
  await page.goto(`/visits/${today.visitId}/sides/right#replay`);
  const section = page.getByRole('region', { name: 'Replay for the athlete' });
  await section.getByLabel(/^Beside an earlier lift/).selectOption({ label: longDay(FIRST) });
  await section.getByRole('button', { name: 'Make a link' }).click();
  const link = await section.getByLabel(/^The link is ready/).inputValue();
  await section.getByRole('button', { name: 'Done' }).click();
  await expect(section.getByText(/^Beside it .*: it is shown\.$/)).toBeVisible();

  const phone = await browser.newContext({
    viewport: { width: 390, height: 844 },
    isMobile: true,
    hasTouch: true,
    reducedMotion: 'reduce',
  });
  const athlete = await phone.newPage();
  await athlete.goto(link);
  await athlete.getByRole('button', { name: /^Beside / }).tap();
  const both = athlete.getByRole('region', { name: 'Before and now' });
  const pictures = both.getByRole('img');
  await expect(pictures).toHaveCount(2);
  for (const n of [0, 1]) await expect(pictures.nth(n)).toHaveAttribute('data-frame', /^\d+$/);
  await both.getByRole('button', { name: /^90°/ }).tap();
  // the hip stood on is out before, in now, at one and the same height of the thigh
  await expect(both.getByText(/^\d+° out ±/)).toHaveCount(1);
  await expect(both.getByText(/^\d+° in ±/)).toHaveCount(1);
  await expect(both.getByText(/^(8|9)\d°, going up$/)).toBeVisible();
  const slider = both.getByRole('slider');
  await slider.focus();
  await athlete.keyboard.press('Home');
  await expect(slider).toHaveValue('0');
  await athlete.keyboard.press('PageUp');
  await expect(slider).toHaveValue('10');
  expect(await athlete.evaluate(() => document.documentElement.scrollWidth)).toBe(390);

  // the earlier clip goes, the link stays
  const { clips } = await ask(coach, routes.visit, { params: { id: firstVisit } });
  await ask(coach, routes.deleteClip, { params: { id: clips[0]?.id ?? '' } });
  await athlete.reload();
  await expect(athlete.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(athlete.getByRole('button', { name: /^Beside / })).toHaveCount(0);
  await phone.close();
});
