import { type APIRequestContext, expect } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from './ask.ts';
import { demoClip } from './demo-clip.ts';
import { PREPARED_WITHIN } from './visit.ts';

/** A visit of the demo that has a clip with marks. */
export interface ShownVisit {
  readonly athleteId: string;
  readonly visitId: string;
  readonly clipId: string;
}

/** What the pages are opened on: the demo as it stands, and a few things that it lacks. */
export interface Shown {
  /** Turns out early, filmed from the front; has a call, comments and links. */
  readonly quill: ShownVisit;
  /** Filmed from the lifted side alone. */
  readonly quillAside: ShownVisit;
  readonly lindgren: ShownVisit;
  /** Both sides in one clip, the left without a call. */
  readonly brook: ShownVisit;
  readonly weir: ShownVisit;
  readonly fell: ShownVisit;
  /** A visit all of whose clips were refused. */
  readonly refused: ShownVisit;
  /** Neither consent nor visit. */
  readonly newcomerId: string;
  /** Consent, and a visit in which nothing was done yet. */
  readonly beginner: Pick<ShownVisit, 'athleteId' | 'visitId'>;
  readonly setUpId: string;
  readonly links: { readonly open: string; readonly locked: string; readonly ended: string };
}

async function shownVisit(
  coach: APIRequestContext,
  ...of: [familyName: string, view?: 'lifted-side', name?: string]
): Promise<ShownVisit> {
  const { athlete, visitId, id } = await demoClip(coach, ...of);
  return { athleteId: athlete.id, visitId, clipId: id };
}

async function refusedVisit(coach: APIRequestContext): Promise<ShownVisit> {
  const look = async () =>
    (await ask(coach, routes.listClips, { query: { state: 'refused' } })).items[0];
  // each clip is looked at when its turn comes
  await expect.poll(look, { timeout: PREPARED_WITHIN, intervals: [500] }).toBeDefined();
  const clip = await look();
  if (clip === undefined) throw new Error('the demo has no refused clip');
  return { athleteId: clip.athlete.id, visitId: clip.visitId, clipId: clip.id };
}

async function linksOf(coach: APIRequestContext, { visitId, clipId }: ShownVisit) {
  const { items: reps } = await ask(coach, routes.listReps, { params: { id: clipId } });
  const repId = reps[0]?.id ?? '';
  const make = (passPhrase: string | null) =>
    ask(coach, routes.makeReplay, {
      body: { visitId, side: 'right', repId, passPhrase, message: 'Look at the belt.' },
    });
  const [open, locked, ended] = [await make(null), await make('heron reed'), await make(null)];
  await ask(coach, routes.revokeReplay, { params: { id: ended.replay.id } });
  return { open: open.url, locked: locked.url, ended: ended.url };
}

const addAthlete = (coach: APIRequestContext, givenName: string, familyName: string) =>
  ask(coach, routes.addAthlete, { body: { givenName, familyName, birthDate: '1999-02-03' } });

/** Waits for the demo's clips, and makes what is missing for every page to be seen; `coach` has her session. */
export async function prepareShown(coach: APIRequestContext): Promise<Shown> {
  const quill = await shownVisit(coach, 'Quill');
  const newcomer = await addAthlete(coach, 'Fern', `Newcomer ${process.pid}`);
  const beginner = await addAthlete(coach, 'Moss', `Beginner ${process.pid}`);
  const params = { id: beginner.id };
  const validUntil = `${new Date().getFullYear() + 1}-01-31`;
  await ask(coach, routes.recordConsent, {
    params,
    body: { givenBy: 'athlete', purposes: ['assessment'], validUntil },
  });
  const visit = await ask(coach, routes.addVisit, { params, body: {} });
  const setUp = await ask(coach, routes.addSetUp, {
    body: {
      name: `Hall ${process.pid}`,
      distanceMm: 3000,
      lensHeightMm: null,
      rodMm: 1000,
      beltPointerMm: 140,
      thighPointerMm: null,
    },
  });
  return {
    quill,
    quillAside: await shownVisit(coach, 'Quill', 'lifted-side', 'IMG_0431.MP4'),
    lindgren: await shownVisit(coach, 'Lindgren'),
    brook: await shownVisit(coach, 'Brook'),
    weir: await shownVisit(coach, 'Weir'),
    fell: await shownVisit(coach, 'Fell'),
    refused: await refusedVisit(coach),
    newcomerId: newcomer.id,
    beginner: { athleteId: beginner.id, visitId: visit.id },
    setUpId: setUp.id,
    links: await linksOf(coach, quill),
  };
}

/** Takes back what other journeys would meet. */
export async function tidyShown(coach: APIRequestContext, { setUpId }: Shown): Promise<void> {
  await ask(coach, routes.deleteSetUp, { params: { id: setUpId } });
}
