import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { madeFront } from '#shared/evaluate/made-pair.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { ask } from '../journeys/steps/ask.ts';
import { carryOn } from '../journeys/steps/people.ts';
import { expect, test } from '../support/app.ts';
import { COACH, makeClip, OWNER, sessionOf } from './made.ts';
import { giveGeometry, markAs, MOTION, STEP } from './made-marks.ts';

let owner: APIRequestContext;
let visitId: string;
/** The version that holds when the test begins. */
let first: number;

test.beforeAll(async ({ app }) => {
  owner = await sessionOf(app, OWNER);
  first = (await ask(owner, routes.protocol, {})).current.version;
  const coach = await sessionOf(app, COACH);
  const made = await makeClip(coach, 'Gates');
  visitId = made.visitId;
  await giveGeometry(coach, made.clipId);
  const filming = { startMs: 0, stepMs: STEP, scatterPx: 0.5, seed: 3 };
  await markAs(coach, made.clipId, madeFront(MOTION, filming));
  const params = { id: visitId, side: 'right' as const };
  await ask(coach, routes.recordCall, { params, body: { seen: 'early', confidence: 'sure' } });
  await ask(coach, routes.sideReading, { params });
  await coach.dispose();
});

// the other tests go on with the standard, whatever became of this one
test.afterAll(async () => {
  const { current } = await ask(owner, routes.protocol, {});
  if (current.version > first)
    await ask(owner, routes.changeProtocol, {
      body: { after: current.version, values: STANDARD_PROTOCOL, note: 'Back to the standard.' },
    });
  await owner.dispose();
});

test('a new version of the protocol leaves a reading as it is until it is read again; both are kept', async ({
  page,
}) => {
  const made = first + 1;
  const reading = `/visits/${visitId}/sides/right`;
  const section = page.getByRole('region', { name: 'Protocol', exact: true });
  const history = page.getByRole('region', { name: 'History' }).getByRole('listitem');
  await carryOn(page, owner);

  await page.goto('/practice/protocol');
  await page.getByLabel('Lower gate', { exact: true }).fill('55');
  await expect(page.getByText('Lower gate: 60° becomes 55°')).toBeVisible();
  await page.getByLabel('Why').fill('For the trial.');
  await page.getByRole('button', { name: `Make protocol ${made}` }).click();
  await expect(page.getByText(`Protocol ${made} holds from now on.`)).toBeVisible();
  await expect(page.getByText('For the trial.')).toBeVisible();

  await page.goto(reading);
  await expect(section).toContainText(`Protocol ${first} of Greywater Row`);
  await expect(section).toContainText('The turn from 60° to 90° of lift');
  await expect(section).toContainText(`Protocol ${made} holds since`);
  await expect(history).toHaveCount(1);
  await section.getByRole('button', { name: `Read again with protocol ${made}` }).click();

  await expect(section).toContainText(`Protocol ${made} of Greywater Row`);
  await expect(section).toContainText('The turn from 55° to 90° of lift');
  await expect(section.getByRole('button')).toHaveCount(0);
  await expect(history).toHaveCount(2);
  await expect(history.nth(0)).toContainText(`protocol ${made},`);
  await expect(history.nth(0)).toContainText('as the marks stand now');
  await expect(history.nth(1)).toContainText(`protocol ${first},`);
});
