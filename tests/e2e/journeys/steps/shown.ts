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
  /** Of Quill’s right side, given, with a day ticked off. */
  readonly planId: string;
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

/** The plan of the side that the links show: what nobody has to decide about, given, and answered once. */
async function givenPlan(
  coach: APIRequestContext,
  { visitId }: ShownVisit,
  link: string,
): Promise<string> {
  const params = { id: visitId, side: 'right' } as const;
  const { planId } = await ask(coach, routes.planStart, { params });
  const plan = planId
    ? await ask(coach, routes.plan, { params: { id: planId } })
    : await ask(coach, routes.makePlan, { params, body: { from: 'call' } });
  const items = plan.items
    .filter(({ undecided }) => !undecided)
    .map(({ exercise, stage, side, dose, cue }) => ({
      ...{ exercise, stage, side, dose, cue },
      sideConfirmed: true,
    }));
  const edited = await ask(coach, routes.editPlan, {
    params: { id: plan.id },
    body: { version: plan.version, items, retestOn: '2999-01-01', note: 'Slowly.' },
  });
  await ask(coach, routes.givePlan, {
    params: { id: plan.id },
    body: { version: edited.version },
  });
  const token = new URL(link).pathname.slice('/r/'.length);
  const day = new Date().toISOString().slice(0, 10);
  await ask(coach, routes.tickExercise, {
    params: { token },
    body: { exercise: items[0]?.exercise ?? 'foot-tripod', day, done: true },
  });
  await ask(coach, routes.answerPain, {
    params: { token },
    body: { day, level: 0, places: [], which: null, time: null, exercise: null },
  });
  return plan.id;
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
  const links = await linksOf(coach, quill);
  return {
    quill,
    planId: await givenPlan(coach, quill, links.open),
    quillAside: await shownVisit(coach, 'Quill', 'lifted-side', 'IMG_0431.MP4'),
    lindgren: await shownVisit(coach, 'Lindgren'),
    brook: await shownVisit(coach, 'Brook'),
    weir: await shownVisit(coach, 'Weir'),
    fell: await shownVisit(coach, 'Fell'),
    refused: await refusedVisit(coach),
    newcomerId: newcomer.id,
    beginner: { athleteId: beginner.id, visitId: visit.id },
    setUpId: setUp.id,
    links,
  };
}

/** Takes back what other journeys would meet. */
export async function tidyShown(coach: APIRequestContext, { setUpId }: Shown): Promise<void> {
  await ask(coach, routes.deleteSetUp, { params: { id: setUpId } });
}
