import type { APIRequestContext, Page, Route } from '@playwright/test';
import { paths } from '#src/ui/paths.ts';
import { expect, test } from '../support/app.ts';
import { expectAccessible } from './steps/axe.ts';
import { PAGES } from './steps/pages.ts';
import { carryOn, COACH, sessionOf } from './steps/people.ts';
import { prepareShown, type Shown, tidyShown } from './steps/shown.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.use({ viewport: { width: 390, height: 844 } });

let coach: APIRequestContext;
let shown: Shown;
test.beforeAll(async ({ app }) => {
  test.setTimeout(PREPARED_WITHIN + 60_000);
  coach = await sessionOf(app, COACH);
  shown = await prepareShown(coach);
});
test.afterAll(async () => {
  await tidyShown(coach, shown);
  await coach.dispose();
});
test.beforeEach(({ page }) => carryOn(page, coach));

const ID = '[0-9a-f-]{36}';
/** Pages by their names in the table of pages, and the request without which each shows nothing. */
const NEEDS: Record<string, RegExp> = {
  'Today of a coach': /^\/api\/(today|me)$/,
  'the set-ups': /^\/api\/set-ups$/,
  'the athletes': /^\/api\/athletes$/,
  'an athlete with visits': RegExp(`^/api/athletes/${ID}$`),
  'the form that changes an athlete': RegExp(`^/api/athletes/${ID}$`),
  'a visit with everything': RegExp(`^/api/visits/${ID}$`),
  'the call by eye': RegExp(`^/api/visits/${ID}$`),
  'a reading: turns out early': /^\/api\/visits\/.*\/reading$/,
  'the Bench': /^\/api\/clips\/.*\/bench$/,
  'a replay': /^\/api\/r\/[^/]+$/,
};

const BROKEN = {
  status: 500,
  contentType: 'application/problem+json',
  body: JSON.stringify({
    type: 'about:blank',
    code: 'unexpected',
    title: 'Something went wrong.',
    status: 500,
    requestId: 'a-request',
  }),
};

/** The line to some requests: `held` until it is made to break; what comes after follows `now`. */
async function poorLine(page: Page, wanted: RegExp) {
  const held: Route[] = [];
  let now: 'held' | 'broken' | 'well' = 'held';
  await page.route(
    ({ pathname }) => wanted.test(pathname),
    async (route) => {
      if (now === 'held') held.push(route);
      else if (now === 'broken') await route.fulfill(BROKEN);
      else await route.continue();
    },
  );
  return {
    breaks: async () => {
      now = 'broken';
      for (const route of held.splice(0)) await route.fulfill(BROKEN);
    },
    isWell: () => void (now = 'well'),
  };
}

for (const [name, wanted] of Object.entries(NEEDS))
  test(`${name}: waits, fails, and is there when tried again`, async ({ page, allowConsole }) => {
    allowConsole(/500/);
    const own = PAGES.find((each) => each.name === name);
    if (own === undefined) throw new Error(`there is no page ${name}`);
    const line = await poorLine(page, wanted);
    await page.goto(own.address(shown));
    await expect(page.locator('[aria-busy=true]').first()).toBeAttached();
    await expectAccessible(page, 'while it is awaited');

    await line.breaks();
    const again = page.getByRole('button', { name: 'Try again' }).first();
    await expect(again).toBeVisible();
    await expectAccessible(page, 'after it has failed');

    line.isWell();
    await again.press('Enter');
    await expect(own.stands(page)).toBeVisible();
    await expect(again).toBeHidden();
  });

const EMPTY = [
  { path: '/api/today', address: paths.today(), says: 'It starts with an athlete.' },
  { path: '/api/athletes', address: paths.athletes(), says: 'No athletes yet' },
  { path: '/api/set-ups', address: paths.setUps(), says: 'No set-up yet' },
];
for (const { path, address, says } of EMPTY)
  test(`where nothing is yet, the page says what to do: ${says}`, async ({ page }) => {
    await page.route(
      ({ pathname }) => pathname === path,
      async (route) => {
        const answer = await route.fetch();
        const known = (await answer.json()) as object;
        await route.fulfill({ json: { ...known, items: [], total: 0, athletes: 0 } });
      },
    );
    await page.goto(address);
    await expect(page.getByText(says)).toBeVisible();
    await expectAccessible(page, says);
  });

test('a page that cannot be reached says so, and comes when the connection does', async ({
  page,
  context,
  allowConsole,
}) => {
  allowConsole(/ERR_INTERNET_DISCONNECTED/);
  await page.goto(paths.method());
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await page.route('**/api/athletes?*', (route) => route.abort('internetdisconnected'));
  await page.route('**/api/athletes', (route) => route.abort('internetdisconnected'));
  await page.getByRole('button', { name: 'Menu' }).click();
  await page.getByRole('link', { name: 'Athletes' }).click();
  await expect(page.getByText('There is no connection to Redshank right now.')).toBeVisible();
  await context.unrouteAll();
  await page.unrouteAll();
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByText(/^\d+ athletes$/)).toBeVisible();
});
