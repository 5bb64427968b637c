import { randomUUID } from 'node:crypto';
import { type APIRequestContext, expect, type Page } from '@playwright/test';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import { paths } from '#src/ui/paths.ts';
import {
  addressOf,
  BODIES,
  type Ids,
  LINK_BODIES,
  NAMES,
  type RouteNameWithId,
  SILENT,
} from '#tests/support/every-route.ts';
import { ask } from './ask.ts';
import type { Run } from './run.ts';

type RouteNameWithoutId = Exclude<RouteName, RouteNameWithId>;
/** asks: for a visit in its query or body. link: opens with a token. lists: what one may see. bare: names nothing. */
type Kind = 'asks' | 'link' | 'lists' | 'bare';
/** The routes that name nothing by `:id`. A route that is missing here fails the type check. */
const WITHOUT_ID: Record<RouteNameWithoutId, Kind> = {
  health: 'bare',
  openApi: 'bare',
  signIn: 'bare',
  signInCode: 'bare',
  signOut: 'bare',
  signOutEverywhere: 'bare',
  forgot: 'bare',
  startPractice: 'bare',
  lookAtMailLink: 'bare',
  join: 'bare',
  resetPassword: 'bare',
  confirmEmail: 'bare',
  account: 'lists',
  changeName: 'bare',
  changePassword: 'bare',
  changeEmail: 'bare',
  dropEmailChange: 'bare',
  waitingMail: 'bare',
  setWaitingMail: 'bare',
  startCodes: 'bare',
  confirmCodes: 'bare',
  renewRecoveryCodes: 'bare',
  stopCodes: 'bare',
  people: 'bare',
  invite: 'bare',
  me: 'lists',
  sessions: 'lists',
  today: 'lists',
  listAthletes: 'lists',
  addAthlete: 'bare',
  listSetUps: 'lists',
  addSetUp: 'bare',
  listClips: 'lists',
  reliability: 'lists',
  protocol: 'lists',
  changeProtocol: 'bare',
  practice: 'lists',
  changePractice: 'bare',
  setOwnersCode: 'bare',
  audit: 'bare',
  auditNames: 'bare',
  auditFile: 'bare',
  consentWording: 'lists',
  changeConsentWording: 'bare',
  retention: 'bare',
  setRetention: 'bare',
  previewRetention: 'bare',
  reviewQueue: 'lists',
  eyeAgreement: 'lists',
  listReplays: 'asks',
  makeReplay: 'asks',
  openReplay: 'link',
  unlockReplay: 'link',
  replayFilm: 'link',
  tickExercise: 'link',
  answerPain: 'link',
  replayVideo: 'link',
  replayBeforeVideo: 'link',
  takeFilm: 'link',
  replayPoster: 'link',
  events: 'bare',
};

/** How a route is asked, with a body that would do something if the thing could be seen. */
const bodied = (name: RouteName, body: object = {}) => {
  const { method } = routes[name];
  return {
    method: method.toUpperCase(),
    data: method === 'get' ? undefined : (BODIES[name] ?? body),
  };
};

/** One thing of each kind that the coach of the story has; an open upload and a set-up are made for it. */
export async function everythingOf(request: APIRequestContext, run: Run): Promise<Ids> {
  const { athleteId, visitId, clipId } = run;
  const { session } = await ask(request, routes.me, {});
  const consents = await ask(request, routes.listConsents, { params: { id: athleteId } });
  const bench = await ask(request, routes.bench, { params: { id: clipId } });
  const replays = await ask(request, routes.listReplays, { query: { visitId } });
  const setUp = await ask(request, routes.addSetUp, {
    body: {
      name: `Hall of ${run.familyName}`,
      distanceMm: 3000,
      lensHeightMm: null,
      rodMm: null,
      beltPointerMm: null,
      thighPointerMm: null,
    },
  });
  const upload = await ask(request, routes.openUpload, {
    params: { id: visitId },
    body: { name: 'second.mov', bytes: 1000, view: 'front' },
  });
  const rep = bench.reps[0]?.rep.id ?? '';
  const second = await ask(request, routes.startSecondMarking, {
    params: { id: rep },
    body: { markerId: null, frames: null },
  });
  const side = { id: visitId, side: 'right' } as const;
  const { planId } = await ask(request, routes.planStart, { params: side });
  const plan =
    planId ?? (await ask(request, routes.makePlan, { params: side, body: { from: 'call' } })).id;
  const { items: reports } = await ask(request, routes.listReports, { params: { id: visitId } });
  const report = reports[0] ?? (await ask(request, routes.makeReport, { params: { id: visitId } }));
  const first = <T extends { id: string }>(items: readonly T[]): string => items[0]?.id ?? '';
  return {
    session: session.id,
    // of the owner: the interface's own tests knock with one that is there
    invitation: randomUUID(),
    person: (await ask(request, routes.me, {})).user.id,
    athlete: athleteId,
    consent: first(consents.items),
    visit: visitId,
    setUp: setUp.id,
    upload: upload.id,
    clip: clipId,
    rep,
    secondMarking: second.id,
    comment: first(bench.comments),
    plan,
    planToChange: plan,
    replay: first(replays.items),
    report: report.id,
    failedReport: report.id,
  };
}

/** Takes back what `everythingOf` made. */
export async function tidyUp(request: APIRequestContext, ids: Ids): Promise<void> {
  await ask(request, routes.cancelUpload, { params: { id: ids.upload } });
  await ask(request, routes.discardSecondMarking, { params: { id: ids.secondMarking } });
  await ask(request, routes.deleteSetUp, { params: { id: ids.setUp } });
}

/** Every route of the product, media and writes included, answers as if none of it were there. */
export async function expectNothingBehindRoutes(
  request: APIRequestContext,
  ids: Ids,
  run: Run,
): Promise<void> {
  for (const name of Object.keys(NAMES) as RouteNameWithId[]) {
    const answer = await request.fetch(addressOf(name, ids), bodied(name));
    expect.soft(answer.status(), name).toBe(SILENT.has(name) ? 204 : 404);
    if (!SILENT.has(name))
      expect.soft(await answer.json(), name).toMatchObject({ code: 'not-found' });
  }
  const { visit: visitId, rep: repId, athlete: athleteId } = ids;
  // one bit away from a link that opens
  const token = new URL(run.link).pathname
    .slice('/r/'.length)
    .replace(/^./, (first) => (first === 'A' ? 'B' : 'A'));
  for (const [name, kind] of Object.entries(WITHOUT_ID) as [RouteNameWithoutId, Kind][]) {
    const address = routes[name].path.replace(':token', token);
    if (kind === 'asks') {
      const answer = await request.fetch(address, {
        ...bodied(name, { visitId, repId, side: 'right' }),
        params: routes[name].method === 'get' ? { visitId } : undefined,
      });
      expect.soft(answer.status(), name).toBe(404);
    }
    if (kind === 'link')
      expect
        .soft((await request.fetch(address, bodied(name, LINK_BODIES[name]))).status(), name)
        .toBe(404);
    if (kind === 'lists') {
      const answer = await request.get(address);
      expect.soft(answer.status(), name).toBe(200);
      const said = await answer.text();
      for (const secret of [run.familyName, ...Object.values(ids)])
        expect.soft(said, name).not.toContain(secret);
    }
  }
  const clips = await ask(request, routes.listClips, { query: { athleteId } });
  expect(clips.items).toEqual([]);
  // the upload's own protocol, which is no route of the contracts: as if it had never been opened
  for (const id of [ids.upload, randomUUID()]) {
    const headers = { 'tus-resumable': '1.0.0' };
    const asked = await request.head(`/api/uploads/${id}`, { headers });
    expect(asked.status()).toBe(410);
    expect(asked.headers()).not.toHaveProperty('upload-offset');
    const sent = await request.patch(`/api/uploads/${id}`, {
      headers: {
        ...headers,
        'upload-offset': '0',
        'content-type': 'application/offset+octet-stream',
      },
      data: Buffer.from('bytes'),
    });
    expect(sent.status()).toBe(410);
  }
}

/** The pages say that there is nothing, and name nobody. */
export async function expectNothingOnPages(page: Page, run: Run): Promise<void> {
  const { athleteId, visitId, clipId, familyName } = run;
  const addresses = [
    paths.athlete(athleteId),
    paths.editAthlete(athleteId),
    paths.newConsent(athleteId),
    paths.newVisit(athleteId),
    paths.visit(visitId),
    paths.call(visitId, 'right'),
    paths.reading(visitId, 'right'),
    paths.bench(clipId),
  ];
  for (const address of addresses) {
    await page.goto(address);
    await expect(
      page.getByRole('heading', { level: 1, name: 'Nothing here' }),
      address,
    ).toBeVisible();
    await expect(page.getByText(familyName), address).toHaveCount(0);
  }
  await page.goto(`${paths.athletes()}?q=${encodeURIComponent(familyName)}`);
  await expect(page.getByRole('heading', { level: 1, name: 'Athletes' })).toBeVisible();
  await expect(page.getByRole('link', { name: familyName })).toHaveCount(0);
}
