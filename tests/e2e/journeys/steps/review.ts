import { expect, type Page } from '@playwright/test';
import { openBench, pressOnClip } from './bench.ts';
import type { Run } from './run.ts';

const signOffOf = (page: Page) => page.getByRole('region', { name: 'Sign-off' });

/** The coach hands the right side in, the first time or once more. */
export async function handIn(page: Page, run: Run): Promise<void> {
  await page.goto(`/visits/${run.visitId}/sides/right#sign-off`);
  const panel = signOffOf(page);
  await panel.getByRole('button', { name: /^Hand in/ }).click();
  await expect(panel.getByRole('heading', { name: /^Waiting for / })).toBeVisible();
}

/** From the queue to the sign-off of the run's athlete. */
async function fromQueue(page: Page, run: Run) {
  await page.goto('/review');
  await page
    .getByRole('link', { name: new RegExp(`^Reading and sign-off: Wren ${run.familyName}`) })
    .click();
  return signOffOf(page);
}

/** Opens the clip from the queue, draws a stroke beside a comment, and sends the side back with a reason. */
export async function sendBack(
  page: Page,
  run: Run,
  { frame, words, reason, along }: SentBack,
): Promise<void> {
  await page.goto('/review');
  const clip = page.getByRole('link', {
    name: new RegExp(`^Open the clip: Wren ${run.familyName}`),
  });
  await expect(clip).toHaveAttribute('href', new RegExp(run.clipId));
  await openBench(page, run.clipId, `?frame=${frame}`);
  await page.getByRole('button', { name: 'Comments' }).click();
  await page.getByLabel(`Comment at frame ${frame}`).fill(words);
  await page.getByRole('button', { name: 'Stroke' }).click();
  for (const place of along) await pressOnClip(page, place);
  await page.getByRole('button', { name: 'Comment', exact: true }).click();
  await expect(page.getByText(words, { exact: true })).toBeVisible();
  await expect(page.getByText(/with a stroke/)).toBeVisible();

  const panel = await fromQueue(page, run);
  await panel.getByRole('button', { name: 'Send back with a reason' }).click();
  await panel.getByLabel(/^What is to be mended/).fill(reason);
  await panel.getByRole('button', { name: 'Send back', exact: true }).click();
  await expect(panel.getByRole('heading', { name: /^Sent back by / })).toBeVisible();
}

interface SentBack {
  readonly frame: number;
  readonly words: string;
  readonly reason: string;
  /** Places of the picture that the stroke goes through. */
  readonly along: readonly { u: number; v: number }[];
}

/** From the queue to the signature. */
export async function signOff(page: Page, run: Run): Promise<void> {
  const panel = await fromQueue(page, run);
  await panel.getByRole('button', { name: 'Sign off' }).click();
  await expect(panel.getByRole('heading', { name: /^Signed off by / })).toBeVisible();
}
