import { expect, type Locator, type Page } from '@playwright/test';
import { SAFETY_WORDS } from '#src/features/visits/safety/safety-words.ts';
import { CLIP_FILE, truth } from './right-early.ts';

/** Seven seconds of work, behind the demo's clips where the app has just been made. */
export const PREPARED_WITHIN = 600_000;
/** Slow enough that a megabyte takes a while, as on a poor line, bytes a second. */
const POOR_LINE = 250_000;

const idIn = (page: Page, place: RegExp): string => {
  const id = place.exec(new URL(page.url()).pathname)?.[1];
  if (id === undefined) throw new Error(`no id in ${page.url()}`);
  return id;
};

/** From the list of athletes to a new one's page. */
export async function addAthlete(
  page: Page,
  who: { givenName: string; familyName: string; birthDate: string; heightCm: string },
): Promise<string> {
  await page
    .getByRole('navigation', { name: 'Main' })
    .getByRole('link', { name: 'Athletes' })
    .click();
  await page.getByRole('link', { name: 'Add an athlete' }).first().click();
  await page.getByLabel('Given name').fill(who.givenName);
  await page.getByLabel('Family name').fill(who.familyName);
  await page.getByLabel('Date of birth').fill(who.birthDate);
  await page.getByLabel('Body height').fill(who.heightCm);
  await page.getByRole('button', { name: 'Add', exact: true }).click();
  const name = `${who.givenName} ${who.familyName}`;
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();
  return idIn(page, /^\/athletes\/([0-9a-f-]+)$/);
}

/** Filming, supervision and a replay by link, until next year. */
export async function recordConsent(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Record the consent' }).first().click();
  await page.getByLabel('Filming and marking in this practice').check();
  await page.getByLabel('Review by a supervisor').check();
  await page.getByLabel('A replay behind a link, for the athlete').check();
  await page.getByLabel('How it was given').fill('On the tablet');
  await page.getByRole('button', { name: 'Record the consent' }).click();
  await expect(page.getByRole('link', { name: 'New visit' })).toBeVisible();
}

export async function openVisit(page: Page): Promise<string> {
  await page.getByRole('link', { name: 'New visit' }).click();
  await page.getByRole('button', { name: 'Open the visit' }).click();
  await expect(page.getByRole('heading', { level: 1, name: /^Visit of / })).toBeVisible();
  return idIn(page, /^\/visits\/([0-9a-f-]+)$/);
}

/** Every question answered with no; until then clips are not taken. */
export async function checkSafety(page: Page): Promise<void> {
  await expect(page.getByText('Closed until consent and safety check are there')).toBeVisible();
  for (const { question } of Object.values(SAFETY_WORDS)) {
    await page.getByRole('radiogroup', { name: question }).getByLabel('No').check();
  }
  await page.getByLabel(/^A chair or a wall is within reach/).check();
  await page.getByLabel(/knows to stop on pain/).check();
  await page.getByRole('button', { name: 'Record the safety check' }).click();
  await expect(page.getByText(/^All answered with no/)).toBeVisible();
}

/** Distance, lens height, rod and both pointers, as they were when the clip was made. */
export async function writeFigures(page: Page): Promise<void> {
  const { distanceMm, lensHeightMm, rodLengthMm, beltPointerMm, thighPointerMm } = truth.setUp;
  await page.getByRole('button', { name: 'Write the figures down' }).click();
  await page.getByRole('textbox', { name: 'Distance' }).fill(String(distanceMm / 1000));
  await page.getByRole('textbox', { name: 'Lens height' }).fill(String(lensHeightMm / 1000));
  await page.getByRole('textbox', { name: 'Rod' }).fill(String(rodLengthMm / 1000));
  await page.getByRole('textbox', { name: 'Belt pointer' }).fill(String(beltPointerMm));
  await page.getByRole('textbox', { name: 'Thigh pointer' }).fill(String(thighPointerMm));
  await page.getByRole('button', { name: 'Save the figures' }).click();
  await expect(page.getByRole('button', { name: 'Change these figures' })).toBeVisible();
}

/** The row of the clip, whether it is on its way or here. */
export const clipRow = (page: Page): Locator =>
  page.getByRole('list', { name: 'Clips of this visit' }).getByRole('listitem');

/** Chooses the .mov, waits until the page has said `judged` of it, and says which leg it shows. */
export async function chooseClip(page: Page, judged: string): Promise<Locator> {
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Choose files' }).click(),
  ]);
  await chooser.setFiles(CLIP_FILE);
  const row = clipRow(page);
  await expect(row).toContainText('about 60 frames per second, varying, 1080 × 1920, 15.0 s');
  await expect(row).toContainText(judged);
  await row.getByRole('radiogroup', { name: 'Stands on' }).getByLabel('Right').check();
  return row;
}

/** Sends the .mov of a visit whose figures are known on a poor line, and waits until it is prepared. */
export async function uploadClip(page: Page): Promise<string> {
  const line = await page.context().newCDPSession(page);
  const row = await chooseClip(page, '15.0 s: good');

  await line.send('Network.emulateNetworkConditions', {
    offline: false,
    latency: 0,
    downloadThroughput: -1,
    uploadThroughput: POOR_LINE,
  });
  await row.getByRole('button', { name: 'Send right-early.mov' }).click();
  await expect(row.getByRole('progressbar', { name: /, sent$/ })).toHaveAttribute(
    'aria-valuenow',
    /^[1-9][0-9]?$/,
    { timeout: 60_000 },
  );
  await expect(row).toContainText(/\d+ %, .* left/);
  await line.detach();

  await expect(row.getByText('ready')).toBeVisible({ timeout: PREPARED_WITHIN });
  await row.getByRole('link', { name: 'Open the Bench' }).waitFor();
  const address = await row.getByRole('link', { name: 'Open the Bench' }).getAttribute('href');
  return /^\/clips\/([0-9a-f-]+)/.exec(address ?? '')?.[1] ?? '';
}
