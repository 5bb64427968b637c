import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Route } from '#shared/contracts/route.ts';
import { routes } from '#shared/contracts/routes.ts';
import { product } from '#server/db/in-practice.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { Call } from '#server/features/calls/call.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { Upload } from '#server/features/clips/upload.entity.ts';
import { Comment } from '#server/features/comments/comment.entity.ts';
import { Consent } from '#server/features/athletes/consent.entity.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { makeRep } from '#server/features/reps/rep.factory.ts';
import { SecondMarking } from '#server/features/second-markings/second-marking.entity.ts';
import { SetUp } from '#server/features/visits/set-up.entity.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import { makeApp } from '#server/http/app.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import {
  addressOf,
  BODIES,
  type Ids,
  NAMES,
  type RouteNameWithId,
  SILENT,
} from '#tests/support/every-route.ts';

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
    const secondMarking = em.create(SecondMarking, {
      rep,
      marker: coach,
      askedBy: coach,
      frames: [{ frame: 1, landmarks: ['asis-support'] }],
      first: [],
      phases: {},
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
      secondMarking: secondMarking.id,
      comment: comment.id,
      replay: replay.id,
    };
  });
});
afterAll(() => api.close());

const withId = Object.keys(NAMES) as RouteNameWithId[];

const knock = async (name: RouteNameWithId, user: User | null) => {
  const { method } = routes[name];
  const agent = user ? await api.as(user) : api.nobody;
  return agent[method](addressOf(name, ids)).send(
    method === 'get' ? undefined : (BODIES[name] ?? {}),
  );
};

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
