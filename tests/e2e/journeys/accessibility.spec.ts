import type { APIRequestContext } from '@playwright/test';
import { expect, test } from '../support/app.ts';
import { expectAccessible } from './steps/axe.ts';
import { expectKeyboardWay } from './steps/keyboard.ts';
import { PAGES } from './steps/pages.ts';
import { carryOn, COACH, OWNER, sessionOf, SUPERVISOR } from './steps/people.ts';
import { prepareShown, type Shown, tidyShown } from './steps/shown.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

const WIDE = { width: 1440, height: 900 };
const WIDTHS = [WIDE, { width: 390, height: 844 }];

/** These stand in another order there, or in other parts; the rest only becomes narrower. */
const differsOnThePhone = /Bench|Today|reading|replay|athlete with|people/i;

const people = new Map<string, APIRequestContext>();
const sessionFor = (email: string): APIRequestContext => {
  const session = people.get(email);
  if (session === undefined) throw new Error(`${email} is not signed in`);
  return session;
};
let shown: Shown;
test.beforeAll(async ({ app }) => {
  test.setTimeout(PREPARED_WITHIN + 60_000);
  for (const email of [COACH, SUPERVISOR, OWNER]) people.set(email, await sessionOf(app, email));
  shown = await prepareShown(sessionFor(COACH));
});
test.afterAll(async () => {
  await tidyShown(sessionFor(COACH), shown);
  for (const session of people.values()) await session.dispose();
});

for (const { name, who, address, stands, then, says } of PAGES)
  test(`${name}: nothing for axe to find, and a way round by keyboard`, async ({
    page,
    allowConsole,
  }) => {
    if (says) allowConsole(says);
    if (who !== null) await carryOn(page, sessionFor(who));
    await page.goto(address(shown));
    await then?.(page);
    for (const viewport of WIDTHS) {
      await page.setViewportSize(viewport);
      await expect(stands(page)).toBeVisible();
      await expect(page.locator('[aria-busy=true]')).toHaveCount(0);
      await expectAccessible(page, `${viewport.width} px`);
      if (viewport === WIDE || differsOnThePhone.test(name)) await expectKeyboardWay(page);
    }
  });
