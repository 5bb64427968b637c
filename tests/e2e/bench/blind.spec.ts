import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, openBench, press } from './bench-page.ts';
import { addRep, COACH, type MadeClip, makeClip, PICTURE, placeMark, sessionOf } from './made.ts';

let coach: APIRequestContext;
let made: MadeClip;

/** First marks at places that nothing else of the clip has. */
const FIRST = [
  { frame: 2, landmark: 'asis-support', u: 611.25, v: 1007.75 },
  { frame: 2, landmark: 'asis-lifted', u: 823.25, v: 1003.75 },
  { frame: 9, landmark: 'asis-support', u: 617.25, v: 1011.75 },
  { frame: 9, landmark: 'asis-lifted', u: 827.25, v: 1013.75 },
] as const;
/** How far beside the first mark each second one is pressed, px of the source; a press hits to a few of them. */
const BESIDE = 20;

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  made = await makeClip(coach, 'Blind');
  const { id } = await addRep(coach, made.clipId);
  for (const mark of FIRST)
    expect(await placeMark(coach, id, { ...mark, baseRevision: 0 })).toBe('applied');
});
test.afterAll(() => coach.dispose());

test('a rep is marked again by hand without sight of the first marks, then both are compared', async ({
  page,
}) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
  await openBench(page, made.clipId);
  await desk(page, /^Reps/).click();
  await page.getByRole('button', { name: 'Mark again, blind' }).click();
  await page.getByLabel('Frames that I choose').check();
  const choice = page.getByRole('list', { name: 'Marked frames' });
  for (const frame of ['2', '9']) await choice.getByLabel(frame, { exact: true }).check();

  // from here on nothing that is sent may tell where a first mark is
  const answers: string[] = [];
  page.on('response', (response) => {
    if (response.headers()['content-type']?.includes('json'))
      void response.text().then(
        (text) => answers.push(text),
        () => undefined,
      );
  });
  await page.getByRole('button', { name: 'Start marking' }).click();
  await expect(page).toHaveURL(/\/second-markings\/[0-9a-f-]+/);
  await expect(page.locator('.bench-clip .konvajs-content')).toBeVisible();
  const handles = page.locator('[data-landmark]:not([data-asked])');
  await expect(handles).toHaveCount(0);

  let former = '';
  for (const n of [1, 2]) {
    const step = page.getByRole('button', { name: new RegExp(`^Frame ${n} of 2`) });
    await step.click();
    await expect(step).toHaveAttribute('aria-current', 'step');
    const canvas = page.locator('canvas[data-picture="copy"]');
    // the step is current before its picture is there
    await expect(canvas).not.toHaveAttribute('data-frame', former);
    await expect(canvas).toHaveAttribute('data-frame', /^(2|9)$/);
    former = (await canvas.getAttribute('data-frame')) ?? '';
    const frame = Number(former);
    const here = FIRST.filter((mark) => mark.frame === frame);
    expect(here).toHaveLength(2);
    for (const { landmark, u, v } of here) {
      await press(page, u + BESIDE, v - BESIDE);
      await expect(page.locator(`[data-landmark="${landmark}"]:not([data-asked])`)).toBeAttached();
    }
    await expect(handles).toHaveCount(2);
  }
  const open = answers.join('\n');
  expect(open).toContain('"landmarks"');
  for (const { u, v } of FIRST) for (const at of [u, v]) expect(open).not.toContain(String(at));

  const finish = page.getByRole('button', { name: 'Finish and compare' });
  await expect(finish).toBeEnabled();
  const id = new URL(page.url()).pathname.split('/').at(-1) ?? '';
  const { marks } = await ask(coach, routes.secondMarking, { params: { id } });
  const apart = FIRST.flatMap(({ frame, landmark, u, v }) => {
    const second = marks.find((mark) => mark.frame === frame && mark.landmark === landmark);
    return [(second?.u ?? NaN) - u, (second?.v ?? NaN) - v];
  });
  for (const d of apart) expect(Math.abs(Math.abs(d) - BESIDE)).toBeLessThan(8);
  const typical = Math.sqrt(apart.reduce((sum, d) => sum + d * d, 0) / (2 * apart.length));

  await finish.click();
  await expect(
    page.getByRole('heading', { level: 1, name: 'Two markings compared' }),
  ).toBeVisible();
  const lead = page.getByText(/^Your marks repeat within [\d.]+ px/);
  await expect(lead).toBeVisible();
  const px = Number(/within ([\d.]+) px/.exec((await lead.textContent()) ?? '')?.[1]);
  // an error is told of the phone's own picture; both markings were placed on a smaller one
  const coarser = PICTURE.height / 1920;
  expect(Math.abs(px - typical / coarser)).toBeLessThan(0.051);
  await expect(page.getByText(/^First marks by .*; second marks by /)).toBeVisible();
});
