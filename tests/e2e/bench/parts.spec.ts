import AxeBuilder from '@axe-core/playwright';
import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, openBench, press, showsFrame, slider } from './bench-page.ts';
import { addRep, COACH, FRAMES, type MadeClip, makeClip, sessionOf } from './made.ts';

test.describe.configure({ mode: 'serial' });

let coach: APIRequestContext;
let made: MadeClip;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, 'Parts');
});
test.afterAll(() => coach.dispose());
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

const bench = () => ask(coach, routes.bench, { params: { id: made.clipId } });

test('without a rep the Bench says what to do, and a rep is named by its span', async ({
  page,
}) => {
  await openBench(page, made.clipId);
  await expect(page.getByRole('heading', { name: 'No rep yet', exact: true })).toBeVisible();
  // each landmark can be touched once for the marks to follow, or the rep is named by hand
  await expect(page.getByRole('heading', { name: /^Next: front corner/ })).toBeVisible();
  await page.getByRole('button', { name: 'Name the reps by hand' }).click();
  const form = page.getByRole('region', { name: 'New rep' });
  await form.getByRole('button', { name: 'Take frame 0' }).first().click();
  await slider(page).focus();
  await page.keyboard.press('End');
  await form
    .getByRole('button', { name: `Take frame ${FRAMES - 1}` })
    .last()
    .click();
  await form.getByLabel('Left leg').check();
  await form.getByRole('button', { name: 'Add this rep' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('rep 1 of 1');
  const { reps } = await bench();
  expect(reps[0]?.rep).toMatchObject({
    supportSide: 'left',
    startFrame: 0,
    endFrame: FRAMES - 1,
  });
});

test('figures wait for the call by eye', async ({ page }) => {
  await openBench(page, made.clipId);
  await expect(
    page.getByRole('heading', { name: 'First the eye, then the figures' }),
  ).toBeVisible();
  await expect(page.getByRole('table')).not.toBeVisible();
  await expect(page.getByRole('link', { name: 'Record the call by eye' })).toHaveAttribute(
    'href',
    `/visits/${made.visitId}/sides/left/call`,
  );
  await ask(coach, routes.recordCall, {
    params: { id: made.visitId, side: 'left' },
    body: { seen: 'unsure', confidence: 'guess' },
  });
  await page.reload();
  await expect(page.getByText(/Nothing can be measured yet/)).toBeVisible();
});

test('the set-up says what each length makes measurable, and undo brings it back', async ({
  page,
}) => {
  await openBench(page, made.clipId);
  await desk(page, 'Set-up').click();
  await page.getByRole('button', { name: 'Place both ends on the picture' }).click();
  await press(page, 1200, 600);
  await press(page, 1200, 1600);
  await page.getByRole('button', { name: 'Keep this scale' }).click();
  await expect(page.getByText('1.00 mm per pixel')).toBeVisible();
  await page.getByLabel('Lens to athlete').fill('3');
  await page.getByLabel('Lens to athlete').press('Enter');
  await expect(page.getByText('3.00 m')).toBeVisible();
  await page.getByLabel('Belt pointer').fill('140');
  await page.getByLabel('Belt pointer').press('Enter');
  await expect(
    page.getByText(/^Belt pointer: one rep tells a change of turn from none/),
  ).toBeVisible();
  const { clip } = await bench();
  expect(clip.geometry).toMatchObject({ distanceMm: 3000, beltPointerMm: 140 });
  expect(clip.mmPerPx).toBeCloseTo(1, 1);

  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText(/^Bare landmarks:/).last()).toBeVisible();
  await expect.poll(async () => (await bench()).clip.geometry.beltPointerMm).toBeNull();
});

test('a moment is moved on the strip by keyboard, and given back to the marks', async ({
  page,
}) => {
  const { reps } = await bench();
  const rep = reps[0]?.rep;
  if (!rep) throw new Error('no rep');
  await ask(coach, routes.editRep, {
    params: { id: rep.id },
    body: { boundaries: { footOff: 12 }, version: rep.version },
  });
  await openBench(page, made.clipId);
  const footOff = page.getByRole('slider', { name: /^Foot off/ });
  await footOff.focus();
  await page.keyboard.press('ArrowRight');
  await showsFrame(page, 13);
  await expect
    .poll(async () => (await bench()).reps[0]?.rep.boundaries.footOff)
    .toEqual({ frame: 13, by: 'hand' });
  await page.keyboard.press('Delete');
  await expect(footOff).not.toBeAttached();
  await expect
    .poll(async () => (await bench()).reps[0]?.rep.boundaries.footOff?.by ?? 'found')
    .toBe('found');
});

test('a comment with a ring stands on the strip, is answered and resolved', async ({ page }) => {
  await openBench(page, made.clipId, '?frame=7');
  await slider(page).focus();
  await page.keyboard.press('c');
  const words = page.getByRole('textbox', { name: 'Comment at frame 7' });
  await expect(words).toBeFocused();
  await words.fill('Is the heel down?');
  await page.getByRole('button', { name: 'Ring' }).click();
  await press(page, 700, 2000);
  await press(page, 760, 2000);
  await page.getByRole('button', { name: 'Comment', exact: true }).click();
  await expect(page.getByRole('button', { name: /at frame 7: Is the heel down/ })).toBeVisible();
  const [comment] = (await bench()).comments;
  expect(comment?.shape?.kind).toBe('ring');

  await slider(page).focus();
  await page.keyboard.press('Home');
  await page.getByRole('button', { name: 'frame 7', exact: true }).click();
  await showsFrame(page, 7);
  await page.getByRole('button', { name: 'Answer' }).click();
  await page.getByRole('textbox', { name: 'Answer' }).fill('It is.');
  await page.getByRole('button', { name: 'Send' }).click();
  await expect(page.getByText('It is.')).toBeVisible();
  await page.getByRole('button', { name: 'Resolve' }).click();
  await expect(page.getByText('resolved', { exact: true })).toBeVisible();
});

test('a key can be changed and is kept', async ({ page }) => {
  await openBench(page, made.clipId);
  await page.getByRole('button', { name: 'All keys', exact: true }).click();
  await page.getByRole('button', { name: /^Comment at this frame: C/ }).click();
  await page.keyboard.press('k');
  await expect(page.getByRole('button', { name: /^Comment at this frame: K/ })).toBeVisible();
  await page.getByRole('button', { name: 'Done' }).click();
  await page.reload();
  await showsFrame(page, 0);
  await slider(page).focus();
  await page.keyboard.press('k');
  await expect(page.getByRole('textbox', { name: 'Comment at frame 0' })).toBeFocused();
});

test('a rep is left out with a reason, taken in again, and deleted', async ({ page }) => {
  const second = await addRep(coach, made.clipId);
  await openBench(page, made.clipId);
  await desk(page, /^Reps/).click();
  const rows = page.locator('.bench-desk li');
  await rows.nth(1).getByRole('button', { name: 'Leave out' }).click();
  await page.getByLabel('Hopped').check();
  await page.getByRole('button', { name: 'Leave it out' }).click();
  await expect(page.getByText('left out: hopped')).toBeVisible();
  await page.getByRole('button', { name: 'Take in again' }).click();
  await expect(page.getByText('left out: hopped')).not.toBeVisible();
  const number = (await bench()).reps.findIndex((each) => each.rep.id === second.id);
  await rows.nth(number).getByRole('button', { name: 'Delete' }).click();
  await page.getByRole('button', { name: `Delete rep ${number + 1}` }).click();
  await expect(desk(page, 'Reps (1)')).toBeVisible();
});

test('a laptop’s window shows course, every value and the keys without scrolling', async ({
  page,
}) => {
  await openBench(page, made.clipId, '?frame=7');
  await expect(page.getByRole('rowheader', { name: 'Lift of the thigh' })).toBeInViewport();
  await expect(page.getByRole('rowheader', { name: 'Drift of the lifted knee' })).toBeInViewport({
    ratio: 1,
  });
  await expect(page.getByText('places the named landmark')).toBeInViewport({ ratio: 1 });
  for (const part of ['html', '.bench-desk', '.bench-lead'])
    expect(
      await page.locator(part).evaluate((box) => box.scrollHeight - box.clientHeight),
      part,
    ).toBe(0);
});

for (const [width, height] of [
  [1440, 900],
  [1024, 768],
  [390, 844],
  [360, 740],
] as const) {
  test(`nothing is out of reach at ${width} px`, async ({ page }) => {
    await page.setViewportSize({ width, height });
    await page.emulateMedia({ reducedMotion: 'reduce' });
    await openBench(page, made.clipId, '?frame=7');
    for (const name of ['Course, rep 1', /^Reps/, 'Set-up', /^Comments/]) {
      await desk(page, name).click();
      const found = await new AxeBuilder({ page })
        .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
        .analyze();
      expect(found.violations.map(({ id, nodes }) => [id, nodes.map((node) => node.html)])).toEqual(
        [],
      );
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(overflow).toBe(0);
    }
  });
}
