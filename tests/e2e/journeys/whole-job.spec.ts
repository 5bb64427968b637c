import { expect, test } from '../support/app.ts';
import { COACH, signIn, signInByForm } from './steps/people.ts';
import {
  addAthlete,
  checkSafety,
  openVisit,
  recordConsent,
  uploadClip,
  writeFigures,
} from './steps/visit.ts';
import { loadedRun } from './steps/run.ts';

// one story in chapters: each goes on where the one before it has stopped
test.describe.configure({ mode: 'serial' });

const made = loadedRun();

test('a coach signs in, adds an athlete, records the consent and opens a visit', async ({
  app,
  page,
}) => {
  await signInByForm(page, app, COACH);
  made.athleteId = await addAthlete(page, {
    givenName: 'Wren',
    familyName: made.familyName,
    birthDate: '1998-04-12',
    heightCm: '168',
  });
  await recordConsent(page);
  made.visitId = await openVisit(page);
});

test('safety, figures, and the clip: looked at, sent, prepared', async ({ app, page }) => {
  await signIn(page, app, COACH);
  await page.goto(`/visits/${made.visitId}`);
  await checkSafety(page);
  await writeFigures(page);
  made.clipId = await uploadClip(page);
  expect(made.clipId).not.toBe('');
});
