import { expect, type Page } from '@playwright/test';
import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from './page-of-product.ts';
import { OWNER } from './people.ts';

const SECRET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';
const RECOVERY = [...'abcdefghij'].map((letter) => `abcd-efgh-ijkl-mno${letter}`);

const answer = (page: Page, path: string, json: object) =>
  page.route(`**${path}`, (route) => route.fulfill({ json }));

/** An owner who has to set codes up first, up to the picture for the phone; the demo's own owner stays without. */
const toDevice = async (page: Page) => {
  await page.route('**/api/me', async (route) => {
    const said = await route.fetch();
    await route.fulfill({ json: { ...((await said.json()) as object), codeMissing: true } });
  });
  const uri = `otpauth://totp/Redshank:owner?secret=${SECRET}&issuer=Redshank`;
  await answer(page, '/api/account/codes', { secret: SECRET, uri });
  await page.reload();
  await page.getByLabel('Your password').fill('x');
  await page.getByRole('button', { name: 'Go on' }).click();
};

/** One-time codes, in states that the demo has nobody in. */
export const CODES: readonly PageOfProduct[] = [
  {
    name: 'the second step of a sign-in',
    who: null,
    address: () => paths.signIn(),
    then: async (page) => {
      await answer(page, '/api/sign-in', { codeNeeded: true });
      await page.getByLabel('E-mail').fill(OWNER);
      await page.getByLabel('Password').fill('x');
      await page.getByRole('button', { name: 'Sign in' }).click();
    },
    stands: (page) => page.getByLabel('Code', { exact: true }),
  },
  {
    name: 'one-time codes that have to be set up first',
    who: OWNER,
    address: () => paths.account(),
    then: toDevice,
    stands: (page) => page.getByRole('img', { name: /^QR code/ }),
  },
  {
    name: 'new recovery codes',
    who: OWNER,
    address: () => paths.account(),
    then: async (page) => {
      await toDevice(page);
      await answer(page, '/api/account/codes/confirm', { recoveryCodes: RECOVERY });
      await page.getByLabel('The code that the app shows').fill('123456');
      await page.getByRole('button', { name: 'Turn on one-time codes' }).click();
      // on paper they stand alone
      await expect(page.getByText(RECOVERY[0] ?? '')).toBeVisible();
      await page.emulateMedia({ media: 'print' });
      await expect(page.getByText(RECOVERY[0] ?? '')).toBeVisible();
      await expect(page.getByRole('heading', { level: 1 })).toBeHidden();
      await page.emulateMedia({ media: null });
    },
    stands: (page) => page.getByRole('heading', { name: 'Your recovery codes' }),
  },
];
