import { type APIRequestContext, expect, type Page, request as requests } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import type { App } from '../../support/app.ts';
import { ask } from './ask.ts';

export const COACH = 'coach@greywater-row.example';
export const OWNER = 'owner@greywater-row.example';
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

/** A session without a page, for what is looked up or made on the side. */
export async function sessionOf(app: App, email: string): Promise<APIRequestContext> {
  const session = await requests.newContext({ baseURL: app.url });
  await ask(session, routes.signIn, { body: { email, password: app.demoPassword } });
  return session;
}

/** Opens the page's context to the person of a session, so that nobody signs in twice. */
export async function carryOn(page: Page, session: APIRequestContext): Promise<void> {
  await page.context().addCookies((await session.storageState()).cookies);
}
