import { expect, type Locator, type Page } from '@playwright/test';
import { framePoint } from '#shared/geometry/points.ts';
import { fit, toStage } from '#src/canvas/viewport.ts';
import { PICTURE } from './made.ts';

export const slider = (page: Page): Locator =>
  page.getByRole('slider', { name: 'Frame of the clip' });
export const saved = (page: Page): Locator => page.getByText('all saved').first();
/** A mark of the frame on show, as the keyboard reaches it. */
export const handle = (page: Page, landmark: string): Locator =>
  page.locator(`[data-landmark="${landmark}"]:not([data-asked])`);
/** The cross for the landmark that is asked for. */
export const cross = (page: Page): Locator => page.locator('[data-asked]');

/**
 * Opens the Bench and waits until the pixels of its frame are on the canvas.
 * @param timeout ms, for a long clip on a busy machine
 */
export const openBench = async (
  page: Page,
  clipId: string,
  search = '',
  timeout?: number,
): Promise<void> => {
  await page.goto(`/clips/${clipId}${search}`);
  await showsFrame(page, Number(new URLSearchParams(search).get('frame') ?? 0), timeout);
  // the stage over the picture is fetched on its own
  await expect(page.locator('.bench-clip .konvajs-content')).toBeVisible();
};

/** The slider says it and the canvas shows it. */
export const showsFrame = async (page: Page, frame: number, timeout?: number): Promise<void> => {
  await expect(slider(page)).toHaveAttribute('aria-valuenow', String(frame), { timeout });
  await expect(page.locator('canvas[data-picture="copy"]')).toHaveAttribute(
    'data-frame',
    String(frame),
    { timeout },
  );
};

/** Where a place of the picture lies on the screen while the whole picture is shown. */
export const onScreen = async (page: Page, u: number, v: number) => {
  const stage = await page.locator('.bench-clip').boundingBox();
  if (stage === null) throw new Error('the Bench shows no clip');
  const at = toStage(fit(PICTURE, stage), framePoint(u, v));
  return { x: stage.x + at.x, y: stage.y + at.y };
};

export const press = async (page: Page, u: number, v: number): Promise<void> => {
  const { x, y } = await onScreen(page, u, v);
  await page.mouse.click(x, y);
};

/** What the right side shows. */
export const desk = (page: Page, name: string | RegExp): Locator =>
  page.getByRole('navigation', { name: 'Beside the clip' }).getByRole('button', { name });
