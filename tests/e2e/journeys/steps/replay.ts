import { expect, type Locator, type Page } from '@playwright/test';

/** The film of the replay plays: its own clock goes on. */
export async function expectPlaying(video: Locator): Promise<void> {
  const clock = () => video.evaluate((element: HTMLVideoElement) => element.currentTime);
  await expect.poll(clock, { timeout: 60_000 }).toBeGreaterThan(0);
  const before = await clock();
  await expect.poll(clock).not.toBe(before);
}

/** How many pixels of the drawing over the film are not clear. */
export const drawnPixels = (page: Page): Promise<number> =>
  page.getByRole('region', { name: 'The film' }).evaluate(async (film) => {
    const canvas = film.querySelector('canvas');
    if (canvas === null || canvas.width === 0) return 0;
    const copy = document.createElement('canvas');
    [copy.width, copy.height] = [canvas.width, canvas.height];
    const context = copy.getContext('2d', { willReadFrequently: true });
    context?.drawImage(await createImageBitmap(canvas), 0, 0);
    const pixels = context?.getImageData(0, 0, copy.width, copy.height).data ?? [];
    let drawn = 0;
    for (let at = 3; at < pixels.length; at += 4) if ((pixels[at] ?? 0) > 0) drawn += 1;
    return drawn;
  });
