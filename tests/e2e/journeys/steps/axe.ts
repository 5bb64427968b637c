import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

/** WCAG 2.2 up to AA, with all that it builds on. */
const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Nothing for axe to find on the page as it stands, and nothing wider than the screen. */
export async function expectAccessible(page: Page, state: string): Promise<void> {
  // at the second width it is on the page already: to load it takes as long as to look
  const there = await page.evaluate(() => 'axe' in globalThis);
  const { violations } = await new AxeBuilder({ page, ...(there && { axeSource: ';' }) })
    // no frames here to put together, which takes longer than the looking
    .setLegacyMode()
    .options({
      runOnly: { type: 'tag', values: TAGS },
      resultTypes: ['violations'],
      // style sheets read once more, for a rule against pages locked to one way of holding the phone
      preload: false,
    })
    .analyze();
  const said = violations.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id}: ${target.join(' ')}: ${failureSummary}`),
  );
  expect.soft(said, state).toEqual([]);
  const { scrolled, shown } = await page.evaluate(() => ({
    scrolled: document.documentElement.scrollWidth,
    shown: document.documentElement.clientWidth,
  }));
  expect.soft(scrolled, `${state}: width of the page`).toBe(shown);
}
