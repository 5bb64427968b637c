import { expect, test } from '../support/app.ts';
import { routes } from '#shared/contracts/routes.ts';
import { plusMinus as plusMinusWords, turn } from '#src/ui/figures.ts';
import { ask, send } from './steps/ask.ts';
import {
  frameSlider,
  markFrameByKeyboard,
  markFrameByPointer,
  nameRep,
  openBench,
  pressOnClip,
  setScale,
} from './steps/bench.ts';
import { addMarkedRep, markRest } from './steps/marks-by-api.ts';
import { expectPainTold, givePlan, tickAndTell } from './steps/plan.ts';
import { drawnPixels, expectPlaying } from './steps/replay.ts';
import { handIn, sendBack, signOff } from './steps/review.ts';
import {
  everythingOf,
  expectNothingBehindRoutes,
  expectNothingOnPages,
  tidyUp,
} from './steps/other-practice.ts';
import { COACH, OTHER_COACH, signIn, signInByForm, SUPERVISOR } from './steps/people.ts';
import {
  addAthlete,
  checkSafety,
  openVisit,
  PREPARED_WITHIN,
  recordConsent,
  uploadClip,
  writeFigures,
} from './steps/visit.ts';
import { framesOf, LED, placeOn, placesOf, TRUE_CHANGE } from './steps/right-early.ts';
import { loadedRun } from './steps/run.ts';

// one story in chapters: each goes on where the one before it has stopped
test.describe.configure({ mode: 'serial' });

const made = loadedRun();

const MOMENT = framesOf(0)[26] ?? NaN;
const HIGH = framesOf(0)[30] ?? NaN;
const COMMENT = 'Here the belt pointer swings out while the thigh comes to level.';
const MEASURED = 'So far out already, and the thigh is hardly level.';
const REASON = 'Look at the belt tip of rep 1 once more.';
const MESSAGE = 'Watch the stick on your belt while your knee goes up.';

/** Frames of the first rep that are marked on the page itself: stance, either side of 60° and of 90°, the top. */
const BY_POINTER = [0, 15, 18, 23, 26, 30].map((n) => framesOf(0)[n] ?? NaN);
const BY_KEYBOARD = framesOf(0)[31] ?? NaN;

test('a coach signs in, adds an athlete, records the consent and opens a visit', async ({
  app,
  page,
}) => {
  await signInByForm(page, app, COACH);
  made.athleteId = await addAthlete(page, {
    givenName: 'Wren',
    familyName: made.familyName,
    birthDate: '1998-04-12',
    heightCm: '168',
  });
  await recordConsent(page);
  made.visitId = await openVisit(page);
});

test('safety, figures, and the clip: looked at, sent, prepared', async ({ app, page }) => {
  test.setTimeout(PREPARED_WITHIN + 120_000);
  await signIn(page, app, COACH);
  await page.goto(`/visits/${made.visitId}`);
  await checkSafety(page);
  await writeFigures(page);
  made.clipId = await uploadClip(page);
  expect(made.clipId).not.toBe('');
});

test('the call by eye comes before any figure', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await page.goto(`/visits/${made.visitId}`);
  await page.getByRole('link', { name: 'Call by eye, then mark' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'What did you see?' })).toBeVisible();
  await page.getByRole('radio', { name: 'Turned out early' }).check();
  await page.getByRole('radio', { name: 'Fairly sure' }).check();
  await page.getByLabel('Pelvis hikes').check();
  await page.getByRole('button', { name: 'Save the call' }).click();
  await expect(page.getByText('Turned out early').first()).toBeVisible();
  await expect(page).toHaveURL(`/visits/${made.visitId}/sides/right`);
});

test('on the Bench: scale, a rep, and marks by pointer and by keyboard', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await openBench(page, made.clipId);
  await setScale(page);
  await nameRep(page, 0);
  const places = placesOf(0);
  for (const frame of BY_POINTER) await markFrameByPointer(page, frame, places);
  await markFrameByKeyboard(page, BY_KEYBOARD, places);
  await expect(page.getByText('all saved')).toBeVisible();

  // what is stored is what was pressed on, to a fraction of a pixel
  const { reps } = await ask(page.request, routes.bench, { params: { id: made.clipId } });
  const marks = reps[0]?.marks ?? [];
  expect(marks).toHaveLength(LED.length * (BY_POINTER.length + 1));
  for (const mark of marks) {
    const place = places.find(
      ({ frame, landmark }) => frame === mark.frame && landmark === mark.landmark,
    );
    expect(Math.hypot((mark.u ?? NaN) - (place?.u ?? NaN), (mark.v ?? NaN) - (place?.v ?? NaN)))
      // a pointer stands on whole pixels of the screen, each of which is three of the picture
      .toBeLessThan(2.5);
  }
});

test('the reading equals the truth', async ({ app, page }) => {
  await signIn(page, app, COACH);
  const { reps } = await ask(page.request, routes.bench, { params: { id: made.clipId } });
  const first = reps[0];
  if (first === undefined) throw new Error('the rep that was named is not there');
  await markRest(page.request, first.rep.id, 0, [...BY_POINTER, BY_KEYBOARD]);
  await addMarkedRep(page.request, made.clipId, 1);
  await addMarkedRep(page.request, made.clipId, 2);

  await page.goto(`/visits/${made.visitId}/sides/right`);
  await expect(page.getByRole('heading', { level: 1, name: 'Turns out early' })).toBeVisible({
    timeout: 60_000,
  });
  const { reading } = await ask(page.request, routes.sideReading, {
    params: { id: made.visitId, side: 'right' },
  });
  expect(reading?.code).toBe('early-turn-out');
  const { change, plusMinus } = reading ?? {};
  expect(Math.abs((change ?? NaN) - TRUE_CHANGE)).toBeLessThan(plusMinus ?? NaN);
  expect(plusMinus ?? NaN).toBeLessThan(TRUE_CHANGE);
  const figures = page.getByRole('region', { name: 'Reading' });
  await expect(figures).toContainText(`${turn(change ?? NaN)} ${plusMinusWords(plusMinus ?? NaN)}`);
  await expect(figures).toContainText('Eye and measurement agree.');
  await expect(figures).toContainText(/\d in 100 for turning out early, by three reps/);
});

test('the supervisor comments at a moment, with a ring', async ({ app, page }) => {
  await signIn(page, app, SUPERVISOR);
  await openBench(page, made.clipId, `?frame=${MOMENT}`);
  await expect(frameSlider(page)).toHaveAttribute('aria-valuenow', String(MOMENT));
  await page.getByRole('button', { name: 'Comments' }).click();
  await page.getByLabel(`Comment at frame ${MOMENT}`).fill(COMMENT);
  await page.getByRole('button', { name: 'Ring' }).click();
  const { u, v } = placeOn(placesOf(0), MOMENT, 'belt-tip');
  await pressOnClip(page, { u, v });
  await pressOnClip(page, { u: u + 90, v });
  await page.getByLabel('Show it to the athlete on a replay').check();
  await page.getByRole('button', { name: 'Comment', exact: true }).click();
  await expect(page.getByText(COMMENT, { exact: true })).toBeVisible();
  await expect(page.getByText(/with a ring, shown to the athlete$/)).toBeVisible();
});

test('the supervisor comments with an angle, which is a measure of that frame with its ±', async ({
  app,
  page,
}) => {
  await signIn(page, app, SUPERVISOR);
  await openBench(page, made.clipId, `?frame=${HIGH}`);
  await page.getByRole('button', { name: 'Comments' }).click();
  await page.getByLabel(`Comment at frame ${HIGH}`).fill(MEASURED);
  const measure = page.getByLabel('With a measure of this frame');
  const offered = await measure.getByRole('option').allTextContents();
  const turned = offered.find((each) => each.startsWith('Turn of the support hip: ')) ?? '';
  expect(turned).toMatch(/: [+−]?\d+\.\d° ±\s\d+\.\d$/);
  // what is not marked cannot be chosen
  expect(offered.join()).not.toContain('Turn-out of the support foot');
  await measure.selectOption({ label: turned });
  await page.getByLabel('Show it to the athlete on a replay').check();
  await page.getByRole('button', { name: 'Comment', exact: true }).click();
  await expect(page.getByText(MEASURED, { exact: true })).toBeVisible();
  await expect(page.getByRole('listitem').getByText(turned)).toBeVisible();
});

test('the coach finds the comment on the strip, answers and resolves it', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await openBench(page, made.clipId);
  await page.getByRole('button', { name: `at frame ${MOMENT}: ${COMMENT}` }).click();
  await expect(frameSlider(page)).toHaveAttribute('aria-valuenow', String(MOMENT));
  const thread = page.getByRole('listitem').filter({ hasText: COMMENT });
  await thread.getByRole('button', { name: 'Answer' }).click();
  await page.getByLabel('Answer').fill('Seen. The rest of the rep shows the same.');
  await page.getByRole('button', { name: 'Send' }).click();
  await expect(page.getByText('Seen. The rest of the rep shows the same.')).toBeVisible();
  await thread.getByRole('button', { name: 'Resolve' }).click();
  await expect(page.getByRole('button', { name: 'Open again' })).toBeVisible();
});

test('the side is handed in, sent back with a stroke and a reason, mended and signed off', async ({
  app,
  page,
}) => {
  await signIn(page, app, COACH);
  await handIn(page, made);

  await signIn(page, app, SUPERVISOR);
  const { u, v } = placeOn(placesOf(0), MOMENT, 'belt-tip');
  await sendBack(page, made, {
    frame: MOMENT,
    words: 'The tip of the belt stick lies a little further out.',
    reason: REASON,
    along: [
      { u, v },
      { u: u + 60, v: v + 20 },
      { u: u + 90, v: v + 60 },
    ],
  });

  await signIn(page, app, COACH);
  await page.goto('/');
  await expect(page.getByText(REASON)).toBeVisible();
  await handIn(page, made);

  await signIn(page, app, SUPERVISOR);
  await signOff(page, made);
});

test('the coach makes the plan from the reading and gives it', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await givePlan(page, made, '2031-05-04');
});

test('the coach makes a replay link, shown once, which comes by e-mail and by a code', async ({
  app,
  page,
}) => {
  await signIn(page, app, COACH);
  await page.goto(`/visits/${made.visitId}/sides/right`);
  const replay = page.getByRole('region', { name: 'Replay for the athlete' });
  await replay.getByLabel(/^A sentence of your own/).fill(MESSAGE);
  await replay.getByRole('button', { name: 'Make a link' }).click();
  const address = replay.getByLabel(/^The link is ready/);
  made.link = await address.inputValue();
  expect(made.link).toMatch(/\/r\/[A-Za-z0-9_-]{43}$/);
  await expect(replay.getByRole('img', { name: 'QR code of the link' })).toBeVisible();
  const wren = `wren.${process.pid}@mail.example`;
  await replay.getByLabel(/^Send it by e-mail to/).fill(wren);
  await replay.getByRole('button', { name: 'Send the link' }).click();
  await expect(replay.getByText(`Sent to ${wren}.`)).toBeVisible();
  const letter = await app.mailbox.newestTo(wren);
  made.letterLink = /https?:\S+\/r\/\S+/.exec(letter.text)?.[0] ?? '';
  expect(made.letterLink).toBe(made.link);
  await page.reload();
  await expect(replay.getByText('not opened yet')).toBeVisible();
  await expect(page.getByText(made.link)).toHaveCount(0);
});

test('the athlete opens the link of the letter on a phone, without an account', async ({
  browser,
}) => {
  const phone = await browser.newContext({
    viewport: { width: 390, height: 844 },
    isMobile: true,
    hasTouch: true,
  });
  const page = await phone.newPage();
  await page.goto(made.letterLink);
  await expect(
    page.getByRole('heading', { level: 1, name: 'Your right hip turns out early' }),
  ).toBeVisible();
  await expect(page.getByText(/Three times of three, the hip you stand on turned/)).toBeVisible();
  await expect(page.getByText(/It is a way of moving, not an injury/)).toBeVisible();
  await expect(page.getByText('seen by your coach, not measured')).toBeVisible();
  await expect(page.getByText(`“${MESSAGE}”`)).toBeVisible();
  await expect(page.getByText(`“${COMMENT}”`)).toBeVisible();
  await expect(page.getByText(`“${MEASURED}”`)).toBeVisible();
  await expect(page.getByText(/^Turn of the support hip: [+−]?\d+\.\d° ±\s\d+\.\d$/)).toBeVisible();
  await expect(page.getByText('Stop if it hurts.')).toBeVisible();

  await expectPlaying(page.getByLabel('Your lift, standing on the right leg'));
  await page.getByRole('button', { name: '90°' }).click();
  await expect.poll(() => drawnPixels(page)).toBeGreaterThan(500);
  await expect(page.getByText(/^standing hip \d+° out ±\s\d+°$/)).toBeVisible();
  // nothing is wider than the phone, and nothing was put on it
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390);
  expect(await phone.cookies()).toEqual([]);
  for (const route of [routes.clip, routes.clipVideo, routes.bench])
    expect((await send(page.request, route, { params: { id: made.clipId } })).status()).toBe(401);
  await tickAndTell(page);
  await phone.close();
});

test('what hurts is the first thing in the coach’s Today, and comes as a letter', async ({
  app,
  page,
}) => {
  await signIn(page, app, COACH);
  await expectPainTold(page, made);
  const letters = () => app.mailbox.all().filter(({ to }) => to.includes(COACH));
  await expect
    .poll(() => letters().map(({ subject }) => subject))
    .toContainEqual(expect.stringMatching(/^An athlete says that something hurts/));
});

test('none of it is there for a coach of another practice', async ({
  app,
  page,
  playwright,
  allowConsole,
}) => {
  const coach = await playwright.request.newContext({ baseURL: app.url });
  await ask(coach, routes.signIn, { body: { email: COACH, password: app.demoPassword } });
  const ids = await everythingOf(coach, made);
  const before = await ask(coach, routes.bench, { params: { id: made.clipId } });

  await signIn(page, app, OTHER_COACH);
  await expectNothingBehindRoutes(page.request, ids, made);
  // the browser writes a line for each answer that says no
  allowConsole(/404|There is nothing here, or nothing that you may see/);
  await expectNothingOnPages(page, made);

  // and nothing of it was touched
  expect(await ask(coach, routes.bench, { params: { id: made.clipId } })).toEqual(before);
  await tidyUp(coach, ids);
  await coach.dispose();
});
