import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Route } from '#shared/contracts/route.ts';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import { product } from '#server/db/in-practice.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { Call } from '#server/features/calls/call.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { Upload } from '#server/features/clips/upload.entity.ts';
import { Comment } from '#server/features/comments/comment.entity.ts';
import { Consent } from '#server/features/athletes/consent.entity.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { makeRep } from '#server/features/reps/rep.factory.ts';
import { SetUp } from '#server/features/visits/set-up.entity.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import { makeApp } from '#server/http/app.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';

/** What the `:id` of a route names. A route that is missing here fails the type check. */
const NAMES: Record<RouteNameWithId, keyof Ids> = {
  endSession: 'session',
  athlete: 'athlete',
  editAthlete: 'athlete',
  listConsents: 'athlete',
  recordConsent: 'athlete',
  withdrawConsent: 'consent',
  listVisits: 'athlete',
  addVisit: 'athlete',
  visit: 'visit',
  editVisit: 'visit',
  answerSafety: 'visit',
  deleteSetUp: 'setUp',
  uploadClip: 'visit',
  openUpload: 'visit',
  cancelUpload: 'upload',
  clip: 'clip',
  editClip: 'clip',
  deleteClip: 'clip',
  usePart: 'clip',
  clipVideo: 'clip',
  clipPoster: 'clip',
  clipStrip: 'clip',
  clipSheet: 'clip',
  clipFrame: 'clip',
  listReps: 'clip',
  addRep: 'clip',
  editRep: 'rep',
  deleteRep: 'rep',
  listMarks: 'rep',
  saveMarks: 'rep',
  bench: 'clip',
  listCalls: 'visit',
  recordCall: 'visit',
  sideReading: 'visit',
  setAssumption: 'visit',
  listComments: 'clip',
  addComment: 'clip',
  editComment: 'comment',
  deleteComment: 'comment',
  revokeReplay: 'replay',
};
type RouteNameWithId = {
  [N in RouteName]: (typeof routes)[N] extends { path: `${string}:id${string}` } ? N : never;
}[RouteName];

/** Bodies that would do something if the thing could be seen. */
const BODIES: Partial<Record<RouteName, object>> = {
  editAthlete: { version: 1, sport: 'x' },
  recordConsent: { givenBy: 'athlete', purposes: ['assessment'], validUntil: '2999-01-01' },
  editVisit: { version: 1, note: 'x' },
  answerSafety: {
    answers: {
      'pain-today': false,
      'hip-replacement-or-limits': false,
      'weight-bearing-limits': false,
      'recent-surgery-or-fracture': false,
      'falls-or-poor-balance': false,
      'vertigo-or-dizziness': false,
      'nerve-symptoms': false,
      'confidential-any': false,
    },
    supportWithinReach: true,
    knowsWhenToStop: true,
  },
  openUpload: { name: 'a.mp4', bytes: 10, view: 'front' },
  editClip: { version: 1, mirrored: true },
  addRep: { supportSide: 'left', startFrame: 0, endFrame: 10 },
  editRep: { version: 1, excludedNote: 'x' },
  saveMarks: {
    commands: [
      {
        id: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01',
        frame: 1,
        landmark: 'asis-support',
        baseRevision: 0,
        set: { to: 'hidden' },
      },
    ],
  },
  recordCall: { seen: 'early', confidence: 'sure' },
  setAssumption: { on: true },
  addComment: { body: 'x', fromFrame: 0, toFrame: 0 },
  editComment: { body: 'x' },
};

type Ids = Record<
  | 'session'
  | 'athlete'
  | 'consent'
  | 'visit'
  | 'setUp'
  | 'upload'
  | 'clip'
  | 'rep'
  | 'comment'
  | 'replay',
  string
>;

let api: Api;
let ids: Ids;
beforeAll(async () => {
  api = await startApi();
  const { coach, athlete, visit, practiceId } = api.world;
  ids = await api.ground.inPractice(product(practiceId), async ({ em }) => {
    const clip = makeClip(em, { visit, uploadedBy: coach });
    const rep = makeRep(em, { clip, createdBy: coach });
    const comment = em.create(Comment, {
      clip,
      body: 'Words.',
      fromFrame: 0,
      toFrame: 0,
      shared: true,
      by: coach,
    });
    const replay = em.create(Replay, {
      visit,
      rep,
      side: 'right',
      fromFrame: 0,
      toFrame: 9,
      showReading: true,
      showCall: true,
      message: '',
      tokenHash: 'x',
      passPhraseHash: null,
      expiresAt: new Date(Date.now() + 1e8),
      by: coach,
    });
    const upload = em.create(Upload, {
      visit,
      name: 'a.mp4',
      bytes: 10,
      view: 'front',
      mirrored: false,
      openedBy: coach,
    });
    const setUp = em.create(SetUp, { name: 'Hall', distanceMm: 3000, savedBy: coach });
    const session = em.create(Session, {
      user: coach,
      device: 'A test',
      expiresAt: new Date(Date.now() + 1e8),
    });
    em.create(Call, {
      visit,
      side: 'right',
      seen: 'early',
      substitutions: [],
      confidence: 'sure',
      handsFelt: '',
      by: coach,
      beforeFigures: true,
    });
    const consent = await em.findOneOrFail(Consent, { athlete: athlete.id });
    await em.flush();
    return {
      session: session.id,
      athlete: athlete.id,
      consent: consent.id,
      visit: visit.id,
      setUp: setUp.id,
      upload: upload.id,
      clip: clip.id,
      rep: rep.id,
      comment: comment.id,
      replay: replay.id,
    };
  });
});
afterAll(() => api.close());

const withId = Object.keys(NAMES) as RouteNameWithId[];

const knock = async (name: RouteNameWithId, user: User | null) => {
  const { method, path } = routes[name];
  const address = path
    .replace(':id', ids[NAMES[name]])
    .replace(':side', 'right')
    .replace(':index', '0');
  const agent = user ? await api.as(user) : api.nobody;
  return agent[method](address).send(method === 'get' ? undefined : (BODIES[name] ?? {}));
};

/** Ending a session that is not one's own does nothing and says nothing. */
const SILENT: ReadonlySet<RouteNameWithId> = new Set(['endSession']);

describe('every route', () => {
  it('of the contracts is served, and nothing else', () => {
    const served: Route[] = [];
    makeApp(api.ground, { features, onRoute: (route) => served.push(route) });
    const names = served.map(({ method, path }) => `${method} ${path}`).sort();
    const promised = Object.values(routes)
      .map(({ method, path }) => `${method} ${path}`)
      .sort();
    expect(names).toEqual(promised);
  });

  it.each(withId)('%s is not there for another practice', async (name) => {
    for (const user of [api.world.foreignCoach, api.world.foreignOwner]) {
      const answer = await knock(name, user);
      expect(answer.status).toBe(SILENT.has(name) ? 204 : 404);
      if (!SILENT.has(name)) expect(answer.body.code).toBe('not-found');
    }
  });

  const ofCaseload = withId.filter((name) => !['endSession', 'deleteSetUp'].includes(name));
  it.each(ofCaseload)('%s is not there for a coach whose athlete it is not', async (name) => {
    const answer = await knock(name, api.world.otherCoach);
    expect(answer.status).toBe(404);
  });

  it.each(withId)('%s asks nobody in without a session', async (name) => {
    expect((await knock(name, null)).status).toBe(401);
  });
});
