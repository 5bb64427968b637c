import { randomUUID } from 'node:crypto';
import { type APIRequestContext, type Page } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import type { RepInput } from '#shared/course/types.ts';
import { madeFront, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { ask } from '../journeys/steps/ask.ts';
import { expect, test } from '../support/app.ts';
import { desk, openBench } from './bench-page.ts';
import { addRep, COACH, FRAMES, makeClip, PICTURE, sendClip, sessionOf } from './made.ts';

test.describe.configure({ mode: 'serial' });

const STEP = 1000 / 30;
const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 300,
  upMs: 500,
  holdMs: 100,
  highest: 106,
  turnAt: (lift) => Math.max(0, lift - 60) / 3,
};
/** The side camera began two frames earlier. */
const LATER = 2;

let coach: APIRequestContext;
let visitId: string;
let front: { clipId: string; repId: string };
let side: { clipId: string; repId: string };

/** Marks a rep as the made body says; its picture is narrower than this clip's. */
const markAs = async (clipId: string, made: RepInput) => {
  const { id } = await addRep(coach, clipId);
  const commands = made.frames
    .filter(({ frame }) => frame < FRAMES)
    .flatMap(({ frame, marks }) =>
      Object.entries(marks).flatMap(([landmark, mark]) =>
        mark.hidden
          ? []
          : [
              {
                id: randomUUID(),
                frame,
                landmark,
                baseRevision: 0,
                set: {
                  to: 'point' as const,
                  u: mark.point.u + (PICTURE.width - made.camera.width) / 2,
                  v: mark.point.v,
                  source: 'hand' as const,
                  looked: true,
                  confidence: null,
                  pictureLongEdge: PICTURE.height,
                },
              },
            ],
      ),
    );
  for (let from = 0; from < commands.length; from += 200)
    await ask(coach, routes.saveMarks, {
      params: { id },
      body: { commands: commands.slice(from, from + 200) },
    });
  return id;
};

const giveGeometry = async (clipId: string) => {
  const { version, geometry } = await ask(coach, routes.clip, { params: { id: clipId } });
  const { mmPerPx, distanceMm, lensHeightMm, beltPointerMm } = madeFront(MOTION, {
    startMs: 0,
    stepMs: STEP,
    scatterPx: 0,
    seed: 1,
  }).camera;
  await ask(coach, routes.editClip, {
    params: { id: clipId },
    body: {
      version,
      geometry: {
        ...geometry,
        scale: { from: 'typed', mmPerPx: mmPerPx ?? NaN },
        distanceMm,
        lensHeightMm,
        beltPointerMm,
        thighPointerMm: 115,
      },
    },
  });
};

test.beforeAll(async ({ app }) => {
  coach = await sessionOf(app, COACH);
  const made = await makeClip(coach, 'Tie');
  visitId = made.visitId;
  const sideClip = await sendClip(coach, visitId, 'side.mp4', 'lifted-side');
  for (const id of [made.clipId, sideClip]) await giveGeometry(id);
  const filming = { stepMs: STEP, scatterPx: 0.5 };
  const frontRep = madeFront(MOTION, { ...filming, startMs: 0, seed: 3 });
  const sideRep = madeSide(MOTION, { ...filming, startMs: LATER * STEP, seed: 4 });
  front = { clipId: made.clipId, repId: await markAs(made.clipId, frontRep) };
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
  side = { clipId: sideClip, repId: await markAs(sideClip, mirrored) };
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
