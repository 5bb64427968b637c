import type { APIRequestContext, Locator, Page } from '@playwright/test';
import { paths } from '#src/ui/paths.ts';
import { expect, test } from '../support/app.ts';
import { expectAccessible } from './steps/axe.ts';
import { carryOn, COACH, sessionOf } from './steps/people.ts';
import { prepareShown, type Shown, tidyShown } from './steps/shown.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

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

const button = (name: string | RegExp) => (page: Page) =>
  page.getByRole('button', { name }).first();

interface Asked {
  /** What its title begins with. */
  readonly title: string;
  readonly address: (shown: Shown) => string;
  /** What is pressed to open it. */
  readonly opener: (page: Page) => Locator;
  /** What has to be opened before. */
  readonly first?: (page: Page) => Locator;
}

const DIALOGS: readonly Asked[] = [
  {
    title: 'Delete “Hall',
    address: () => paths.setUps(),
    opener: (page) => page.getByRole('row', { name: /Hall/ }).getByRole('button').first(),
  },
  {
    title: 'Withdraw the consent to filming?',
    address: ({ quill }) => paths.athlete(quill.athleteId),
    opener: (page) => page.getByRole('button', { name: /^Withdraw ?: Filming/ }),
  },
  {
    title: 'How was it filmed?',
    address: ({ quill }) => paths.visit(quill.visitId),
    opener: button('Correct'),
  },
  {
    title: 'Delete this clip?',
    address: ({ quill }) => paths.visit(quill.visitId),
    opener: button('Delete'),
  },
  {
    title: 'End this link?',
    address: ({ quill }) => paths.reading(quill.visitId, 'right'),
    opener: button('End it'),
  },
  {
    title: 'Keys',
    address: ({ quill }) => paths.bench(quill.clipId),
    opener: button('All keys'),
  },
  {
    title: 'Leave rep 1 out',
    address: ({ quill }) => paths.bench(quill.clipId),
    first: button(/^Reps/),
    opener: button('Leave out'),
  },
  {
    title: 'Mark rep 1 again, blind',
    address: ({ quill }) => paths.bench(quill.clipId),
    first: button(/^Reps/),
    opener: button('Mark again, blind'),
  },
];

for (const { title, address, opener, first } of DIALOGS)
  test(`the dialog ${title}: opened, gone round and left by keyboard`, async ({ page }) => {
    await page.goto(address(shown));
    if (first) await first(page).press('Enter');
    await opener(page).press('Enter');
    const dialog = page.getByRole('dialog', { name: title });
    await expect(dialog).toBeVisible();
    for (const width of [1440, 390]) {
      await page.setViewportSize({ width, height: 900 });
      await expectAccessible(page, `${width} px`);
    }
    await page.setViewportSize({ width: 1440, height: 900 });
    const inside = new Set<boolean>();
    const controls = await dialog.getByRole('button').count();
    for (let n = 0; n < controls + 2; n += 1) {
      await page.keyboard.press('Tab');
      inside.add(
        await dialog.evaluate(
          (own) => document.activeElement === document.body || own.contains(document.activeElement),
        ),
      );
    }
    expect([...inside], 'Tab leaves the dialog').toEqual([true]);
    await page.keyboard.press('Escape');
    await expect(dialog).toBeHidden();
    await expect(opener(page)).toBeFocused();
  });

test('the menus are opened and left by keyboard', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto(paths.today());
  for (const [name, within] of [
    ['Menu', page.getByRole('link', { name: 'Practice' })],
    [/your account$/, page.getByRole('button', { name: 'Sign out', exact: true })],
  ] as const) {
    const menu = page.getByRole('button', { name });
    await menu.press('Enter');
    await expect(within).toBeVisible();
    await expectAccessible(page, String(name));
    await within.focus();
    await page.keyboard.press('Escape');
    await expect(within).toBeHidden();
    await expect(menu).toBeFocused();
  }
});

test('the first stop of a page leads past its header', async ({ page }) => {
  await page.goto(paths.athletes());
  await expect(page.getByText(/^\d+ athletes$/)).toBeVisible();
  const skip = page.getByRole('link', { name: 'To the page' });
  await skip.press('Enter');
  await expect(page.getByRole('main')).toBeFocused();
  await page.keyboard.press('Tab');
  expect(
    await page
      .getByRole('main')
      .evaluate((main) => main !== document.activeElement && main.contains(document.activeElement)),
  ).toBe(true);
});
