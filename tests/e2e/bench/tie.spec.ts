import { type APIRequestContext, type Page } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { madeFront, madeSide } from '#shared/evaluate/made-pair.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, openBench } from './bench-page.ts';
import { COACH, makeClip, sendClip, sessionOf } from './made.ts';
import { giveGeometry, markAs, MOTION, STEP } from './made-marks.ts';

test.describe.configure({ mode: 'serial' });

/** The side camera began two frames earlier. */
const LATER = 2;

let coach: APIRequestContext;
let visitId: string;
let front: { clipId: string; repId: string };
let side: { clipId: string; repId: string };

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  const made = await makeClip(coach, 'Tie');
  visitId = made.visitId;
  const sideClip = await sendClip(coach, visitId, 'side.mp4', 'lifted-side');
  for (const id of [made.clipId, sideClip]) await giveGeometry(coach, id);
  const filming = { stepMs: STEP, scatterPx: 0.5 };
  const frontRep = madeFront(MOTION, { ...filming, startMs: 0, seed: 3 });
  const sideRep = madeSide(MOTION, { ...filming, startMs: LATER * STEP, seed: 4 });
  front = { clipId: made.clipId, repId: await markAs(coach, made.clipId, frontRep) };
  // standing on the right, filmed from the athlete's left: the toes point to the picture's left
  const mirrored = {
    ...sideRep,
    frames: sideRep.frames.map((frame) => ({
      ...frame,
      marks: Object.fromEntries(
        Object.entries(frame.marks).map(([id, mark]) => [
          id,
          mark.hidden
            ? mark
            : { ...mark, point: { ...mark.point, u: sideRep.camera.width - mark.point.u } },
        ]),
      ),
    })),
  };
  side = { clipId: sideClip, repId: await markAs(coach, sideClip, mirrored) };
});
test.afterAll(() => coach.dispose());
test.beforeEach(async ({ page }) => {
  const { cookies } = await coach.storageState();
  await page.context().addCookies(cookies);
});

const openReps = async (page: Page, clipId: string, frame = 0) => {
  await openBench(page, clipId, `?frame=${frame}`);
  await desk(page, /^Reps/).click();
};
const TIED = 'Lift is taken from rep 1 of side.mp4, filmed at the same time; turn from this clip.';

test('a front rep is tied to a side rep by the moments that both show', async ({ page }) => {
  await openReps(page, front.clipId);
  await page.getByRole('button', { name: 'rep 1 of side.mp4' }).click();
  await expect(page.getByText(TIED)).toBeVisible();
  await page.reload();
  await desk(page, /^Reps/).click();
  await expect(page.getByText(TIED)).toBeVisible();
});

test('a clap ties them too, and one that lies elsewhere is refused with its reason', async ({
  page,
}) => {
  await openReps(page, side.clipId, 3 + LATER);
  await page.getByRole('button', { name: 'Clap on the frame on show' }).click();
  await expect(page.getByText(`A clap on frame ${3 + LATER}.`)).toBeVisible();
  await openReps(page, front.clipId, 3);
  await page.getByRole('button', { name: 'Clap on the frame on show' }).click();
  await expect(page.getByText('A clap on frame 3.')).toBeVisible();
  await expect(page.getByText(TIED)).toBeVisible();

  await openReps(page, front.clipId, 36);
  await page.getByRole('button', { name: 'Clap on the frame on show' }).click();
  await expect(
    page.getByText(/^Not tied to rep 1 of side\.mp4: .*Lift is taken from this clip\.$/),
  ).toContainText(
    /these are different reps, or the clap is not the same|so these are different reps/,
  );
  await page.getByRole('button', { name: 'No clap' }).click();
  await expect(page.getByText(TIED)).toBeVisible();
});

test('the reading takes the lift from the side clip, and says so', async ({ page }) => {
  const params = { id: visitId, side: 'right' as const };
  await ask(coach, routes.recordCall, { params, body: { seen: 'early', confidence: 'sure' } });
  const { reading } = await ask(coach, routes.sideReading, { params });
  const rep = reading?.result.reps.find(({ id }) => id === front.repId);
  expect(rep?.liftFrom).toBe(side.repId);
  await page.goto(`/visits/${visitId}/sides/right`);
  await expect(
    page.getByText('lift from rep 1 of side.mp4, filmed at the same time'),
  ).toBeVisible();
  await expect(page.getByRole('region', { name: 'Lift over time' })).toBeVisible();
});
