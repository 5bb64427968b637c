import { expect, type Page } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import type { App } from '../../support/app.ts';
import { ask } from './ask.ts';

export const COACH = 'coach@greywater-row.example';
export const SUPERVISOR = 'supervisor@greywater-row.example';
export const OTHER_COACH = 'coach@pennywort-mill.example';

/** Signs in as a person does it, and waits until they stand where they wanted to be. */
export async function signInByForm(page: Page, app: App, email: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(app.demoPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveTitle('Today · Redshank');
}

/** Gives the page's context a session; for journeys that are not about signing in. */
export async function signIn(page: Page, app: App, email: string): Promise<void> {
  await ask(page.request, routes.signIn, { body: { email, password: app.demoPassword } });
}
