import type { PageOfProduct } from '../page-of-product.ts';
import { heading, text } from './known-by.ts';

const pathOf = (link: string) => new URL(link).pathname;

/** What an athlete sees. */
export const REPLAYS: readonly PageOfProduct[] = [
  {
    name: 'a replay',
    who: null,
    address: ({ links }) => pathOf(links.open),
    stands: heading('Your right hip turns out early'),
  },
  {
    name: 'a replay with a plan, the answer about pain open',
    who: null,
    address: ({ links }) => pathOf(links.open),
    then: async (page) => {
      await page.getByRole('button', { name: 'Say how it feels' }).click();
      await page.getByRole('button', { name: '6', exact: true }).click();
    },
    stands: text('Where? Tap all that hurt.'),
  },
  {
    name: 'a replay behind a pass phrase',
    who: null,
    address: ({ links }) => pathOf(links.locked),
    stands: heading('Your replay asks for a pass phrase'),
    says: /401/,
  },
  {
    name: 'a replay that was ended',
    who: null,
    address: ({ links }) => pathOf(links.ended),
    stands: heading('This link no longer opens anything'),
    says: /404/,
  },
];
