import { expect, type Page } from '@playwright/test';
import type { Run } from './run.ts';

/** What a plan starts from, as its card says it. */
export type PlanFrom = 'the measured reading' | 'seen by the coach, not measured';

/** The suggested plan, each side confirmed, a day for the retest, given to the athlete. */
export async function givePlan(
  page: Page,
  run: Pick<Run, 'visitId'>,
  retestOn: string,
  from: PlanFrom = 'the measured reading',
): Promise<void> {
  await page.goto(`/visits/${run.visitId}/sides/right`);
  await page.getByRole('link', { name: 'Open the plan' }).click();
  const found = page.getByRole('region', { name: 'What was found' }).getByRole('listitem');
  await found.filter({ hasText: from }).getByRole('button', { name: 'Make this plan' }).click();
  await expect(page).toHaveURL(/\/plans\//);
  const toConfirm = page.getByRole('button', { name: /^Confirm the side of / });
  await expect(toConfirm.first()).toBeVisible();
  for (let left = await toConfirm.count(); left > 0; left -= 1) {
    await toConfirm.first().click();
    await expect(toConfirm).toHaveCount(left - 1);
  }
  await page.getByLabel('Day of the retest').fill(retestOn);
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByRole('button', { name: 'Give it to the athlete' }).click();
  await expect(page.getByRole('button', { name: 'Given as it stands' })).toBeVisible();
}

/** On the athlete's page: today's first exercise is ticked off, and a knee that hurts is told. */
export async function tickAndTell(page: Page): Promise<void> {
  const today = page.getByRole('button', { name: /^today, / }).first();
  await today.click();
  await expect(today).toHaveAttribute('aria-pressed', 'true');
  await page.getByRole('button', { name: 'Say how it feels' }).click();
  await page.getByRole('button', { name: '6', exact: true }).click();
  await page.getByRole('button', { name: 'knee', exact: true }).click();
  await page.getByRole('button', { name: 'Send', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Send', exact: true })).toHaveCount(0);
}

/** The coach reads it in Today, and once more on the plan after a reload. */
export async function expectPainTold(page: Page, run: Run): Promise<void> {
  await page.goto('/');
  const hurts = page.getByRole('region', { name: /Something hurts/ });
  await expect(hurts).toContainText(run.familyName);
  await expect(hurts).toContainText('It hurts, 6 of 10: knee.');
}
