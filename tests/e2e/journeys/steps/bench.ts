import { expect, type Locator, type Page } from '@playwright/test';
import { framePoint } from '#shared/geometry/points.ts';
import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { fit, toStage } from '#src/canvas/viewport.ts';
import { LED, type Place, placeOn, truth } from './right-early.ts';

/** The clip as a slider over its frames. */
export const frameSlider = (page: Page): Locator =>
  page.getByRole('slider', { name: 'Frame of the clip' });

/** Opens a clip and waits until its first picture stands. */
export async function openBench(page: Page, clipId: string, search = ''): Promise<void> {
  await page.goto(`/clips/${clipId}${search}`);
  await expect(frameSlider(page)).toBeVisible();
  await expect(page.locator('.bench-clip canvas').first()).toBeVisible();
  await expect(page.getByText(/^Loading the clip/)).toHaveCount(0);
}

/** Steps to a frame by keyboard: tens, then ones. */
export async function goToFrame(page: Page, frame: number): Promise<void> {
  const slider = frameSlider(page);
  await slider.focus();
  const now = Number(await slider.getAttribute('aria-valuenow'));
  const away = Math.abs(frame - now);
  const [tens, ones] = frame > now ? ['PageUp', 'ArrowRight'] : ['PageDown', 'ArrowLeft'];
  for (let n = 0; n < Math.floor(away / 10); n += 1) await page.keyboard.press(tens);
  for (let n = 0; n < away % 10; n += 1) await page.keyboard.press(ones);
  await expect(slider).toHaveAttribute('aria-valuenow', String(frame));
}

/** Where the clip lies on the screen, and how the picture lies on it while the whole of it is shown. */
async function stageOf(page: Page) {
  const stage = await page.locator('.bench-clip').boundingBox();
  if (stage === null) throw new Error('the Bench shows no clip');
  return { stage, viewport: fit(truth.picture, stage) };
}

/** CSS px per px of the picture. */
const scaleOf = async (page: Page): Promise<number> => (await stageOf(page)).viewport.scale;

async function onScreen(page: Page, place: { u: number; v: number }) {
  const { stage, viewport } = await stageOf(page);
  const at = toStage(viewport, framePoint(place.u, place.v));
  return { x: stage.x + at.x, y: stage.y + at.y };
}

export async function pressOnClip(page: Page, place: { u: number; v: number }): Promise<void> {
  const { x, y } = await onScreen(page, place);
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.up();
}

/** The landmark that marking leads to, by the words of the lead column. */
const asked = (page: Page, id: LandmarkId): Locator => {
  const { label } = landmark(id);
  const name = label.charAt(0).toLowerCase() + label.slice(1);
  return page.getByRole('heading', { name: `Next: ${name}` });
};
const done = (page: Page): Locator => page.getByRole('heading', { name: 'This frame is done' });

/** Marks a frame as it is led to: each landmark is asked for, then pressed on. */
export async function markFrameByPointer(
  page: Page,
  frame: number,
  places: readonly Place[],
): Promise<void> {
  await goToFrame(page, frame);
  for (const id of LED) {
    await expect(asked(page, id)).toBeVisible();
    await pressOnClip(page, placeOn(places, frame, id));
  }
  await expect(done(page)).toBeVisible();
}

/** Presses an arrow so often that something moves by `px` of the picture: tens, ones, then tenths. */
async function nudge(page: Page, px: number, [back, on]: [string, string]): Promise<void> {
  const arrow = px < 0 ? back : on;
  const tenths = Math.round(Math.abs(px) * 10);
  const presses = [
    [Math.floor(tenths / 100), `Shift+${arrow}`],
    [Math.floor((tenths % 100) / 10), arrow],
    [tenths % 10, `Alt+${arrow}`],
  ] as const;
  for (const [times, chord] of presses)
    for (let n = 0; n < times; n += 1) await page.keyboard.press(chord);
}

/** Marks a frame without a pointer: Tab to the cross, arrows to the place, Enter; the cross goes on by itself. */
export async function markFrameByKeyboard(
  page: Page,
  frame: number,
  places: readonly Place[],
): Promise<void> {
  await goToFrame(page, frame);
  await page.keyboard.press('Tab');
  for (const id of LED) {
    await expect(asked(page, id)).toBeVisible();
    const cross = page.getByRole('button', {
      name: `Place here with Enter: ${landmark(id).label}`,
    });
    await expect(cross).toBeFocused();
    const at = await cross.boundingBox();
    if (at === null) throw new Error('the cross is not on the page');
    const wanted = placeOn(places, frame, id);
    const there = await onScreen(page, wanted);
    const scale = await scaleOf(page);
    await nudge(page, (there.x - at.x - at.width / 2) / scale, ['ArrowLeft', 'ArrowRight']);
    await nudge(page, (there.y - at.y - at.height / 2) / scale, ['ArrowUp', 'ArrowDown']);
    await page.keyboard.press('Enter');
  }
  await expect(done(page)).toBeVisible();
  await expect(frameSlider(page)).toBeFocused();
}

/** Presses both ends of the rod in the picture; its length is known. */
export async function setScale(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Set-up' }).click();
  await page.getByRole('button', { name: 'Place both ends on the picture' }).click();
  for (const [u, v] of [truth.rod.top, truth.rod.bottom]) await pressOnClip(page, { u, v });
  await page.getByRole('button', { name: 'Keep this scale' }).click();
  await expect(page.getByRole('button', { name: 'Place both ends again' })).toBeVisible();
}

/** Names the span of a rep (from 0): steps to its first frame, then to its last. */
export async function nameRep(page: Page, number: number): Promise<void> {
  const rep = truth.reps[number];
  if (rep === undefined) throw new RangeError(`the clip has no rep ${number}`);
  await page.getByRole('button', { name: /^Reps/ }).click();
  const form = page.getByRole('region', { name: 'New rep' });
  await goToFrame(page, rep.firstFrame);
  await form.getByRole('button', { name: 'Take frame' }).first().click();
  await goToFrame(page, rep.lastFrame);
  await form.getByRole('button', { name: 'Take frame' }).last().click();
  await form.getByRole('button', { name: 'Add this rep' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('rep 1 of 1');
}
