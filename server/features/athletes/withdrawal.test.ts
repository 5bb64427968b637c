import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Readable } from 'node:stream';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Purpose } from '#shared/contracts/consents.ts';
import { routes } from '#shared/contracts/routes.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { addressOf, type Ids, NAMES, type RouteNameWithId } from '#tests/support/every-route.ts';
import { product } from '../../db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { tokenHash } from '../../http/token-hash.ts';
import { Session } from '../accounts/session.entity.ts';
import { Call } from '../calls/call.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { prepareClipJob } from '../clips/jobs/prepare-clip.ts';
import { Clip } from '../clips/clip.entity.ts';
import { Replay } from '../replays/replay.entity.ts';
import { makeRep } from '../reps/rep.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { Athlete } from './athlete.entity.ts';
import { makeAthlete, makeConsent } from './athlete.factory.ts';
import { daysLater, today } from './days.ts';

const ALL: Purpose[] = ['assessment', 'supervision', 'teaching', 'sharing-by-link'];

let api: Api;
let server: Server;
let base: string;
let n = 0;
let made: { athleteId: string; visitId: string; clipId: string; repId: string; token: string };

beforeAll(async () => {
  api = await startApi();
  server = createServer(api.app);
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', resolve);
  });
  base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(async () => {
  server.close();
  server.closeAllConnections();
  await api.close();
});

/** An athlete with every purpose, a prepared clip, a rep, a call and a live link. */
beforeEach(async () => {
  const { coach, practiceId } = api.world;
  n += 1;
  const token = `withdrawal-${n}`.padEnd(43, 'w');
  made = await api.ground.inPractice(product(practiceId), async ({ em }) => {
    const athlete = makeAthlete(em, { coach });
    makeConsent(em, { athlete, recordedBy: coach, purposes: ALL });
    const visit = makeVisit(em, { athlete, coach });
    const clip = makeClip(em, { visit, uploadedBy: coach });
    const rep = makeRep(em, { clip, createdBy: coach });
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
    em.create(Replay, {
      ...{ visit, rep, side: 'right', fromFrame: 0, toFrame: 100, message: '', by: coach },
      ...{ showReading: false, showCall: true, passPhraseHash: null },
      tokenHash: tokenHash(token),
      expiresAt: new Date(Date.now() + 1e9),
    });
    await em.flush();
    const { bench, replay } = clip.files;
    for (const key of [bench, replay])
      await api.ground.storage.putStream(String(key), Readable.from(['0123456789']), 'video/mp4');
    return { athleteId: athlete.id, visitId: visit.id, clipId: clip.id, repId: rep.id, token };
  });
});

type Who = 'coach' | 'owner' | 'supervisor';
const as = (who: Who) => api.as(api.world[who]);
const withdraw = async (...purposes: Purpose[]) =>
  (
    await (
      await as('coach')
    )
      .post(`/api/athletes/${made.athleteId}/withdrawals`)
      .send({ purposes })
      .expect(200)
  ).body;

/** Every route that reads what was filmed, as an open page asks for it: a new one is refused too, or this fails. */
const openings = (): readonly string[] => {
  const { clipId, visitId, repId } = made;
  const ids = { clip: clipId, visit: visitId, rep: repId } as const;
  return (Object.keys(NAMES) as RouteNameWithId[]).flatMap((name) => {
    const of = NAMES[name];
    if (routes[name].method !== 'get' || !(of in ids)) return [];
    return [addressOf(name, ids as unknown as Ids)];
  });
};
const answersTo = async (who: Who) => {
  const agent = await as(who);
  const codes: Record<string, unknown> = {};
  for (const path of openings()) {
    const { status, body } = await agent.get(path).set('Range', 'bytes=2-4');
    codes[path] = body?.code ?? status;
  }
  return codes;
};
const all = (code: string) => Object.fromEntries(openings().map((path) => [path, code]));

describe('the consent to filming, withdrawn', () => {
  it('closes everything that was filmed to all who could open it, and says why', async () => {
    const coach = await as('coach');
    await coach.get(`/api/clips/${made.clipId}/video`).set('Range', 'bytes=2-4').expect(206);
    const athlete = await withdraw('assessment');
    expect(openings().length).toBeGreaterThan(15);
    expect(athlete).toMatchObject({ consentedTo: [], deletionDue: daysLater(today(), 30) });
    for (const who of ['coach', 'owner', 'supervisor'] as const)
      expect(await answersTo(who)).toEqual(all('consent-withdrawn'));
    const { body } = await coach.get(`/api/clips/${made.clipId}`).expect(403);
    expect(body.detail).toContain(daysLater(today(), 30));
    // a foreigner learns nothing of it
    const foreign = await api.as(api.world.foreignOwner);
    await foreign.get(`/api/clips/${made.clipId}`).expect(404);
  });

  it('says so when the browser asks whether its copy is still good', async () => {
    const coach = await as('coach');
    const path = `/api/clips/${made.clipId}/video`;
    const { headers } = await coach.get(path).expect(200);
    expect(headers['cache-control']).toBe('private, no-cache');
    const etag = String(headers.etag);
    await coach.get(path).set('If-None-Match', etag).expect(304);
    await withdraw('assessment');
    await coach.get(path).set('If-None-Match', etag).expect(403);
  });

  it('takes all lists and tasks of it away, and Today names the day', async () => {
    await withdraw('assessment');
    const coach = await as('coach');
    const { body: clips } = await coach.get(`/api/clips?athleteId=${made.athleteId}`).expect(200);
    expect(clips.items).toEqual([]);
    const { body } = await coach.get('/api/today').expect(200);
    const mine = body.items.filter(
      (item: { athlete: { id: string } }) => item.athlete.id === made.athleteId,
    );
    expect(mine).toMatchObject([{ kind: 'deletion-due', due: daysLater(today(), 30) }]);
  });

  it('takes the days of the practice, and keeps the day once it is named', async () => {
    const { practiceId } = api.world;
    const setDays = (days: number) =>
      api.ground.inPractice(product(practiceId), ({ em }) =>
        em.execute('update practice set withdrawal_days = ? where id = ?', [days, practiceId]),
      );
    await setDays(7);
    expect((await withdraw('assessment')).deletionDue).toBe(daysLater(today(), 7));
    await setDays(30);
    expect((await withdraw('assessment')).deletionDue).toBe(daysLater(today(), 7));
  });

  it('is taken back by a new consent alone: what was filmed opens, links stay dead', async () => {
    await withdraw('assessment');
    const coach = await as('coach');
    const body = { givenBy: 'athlete', purposes: ALL, validUntil: daysLater(today(), 90) };
    await coach.post(`/api/athletes/${made.athleteId}/consents`).send(body).expect(201);
    const { body: athlete } = await coach.get(`/api/athletes/${made.athleteId}`).expect(200);
    expect(athlete.deletionDue).toBeNull();
    await coach.get(`/api/clips/${made.clipId}/bench`).expect(200);
    await api.nobody.get(`/api/r/${made.token}`).expect(404);
  });

  it('lets clips be deleted, and takes no new ones', async () => {
    await withdraw('assessment');
    const coach = await as('coach');
    const { body } = await coach
      .post(`/api/visits/${made.visitId}/uploads`)
      .send({ name: 'a.mov', bytes: 1000, view: 'front' })
      .expect(403);
    expect(body.code).toBe('consent-withdrawn');
    await coach.delete(`/api/clips/${made.clipId}`).expect(204);
  });

  it('keeps a clip from being prepared until there is a new one', async () => {
    const { practiceId } = api.world;
    const stateOf = (to?: 'waiting') =>
      api.ground.inPractice(product(practiceId), async ({ em }) => {
        const clip = await em.findOneOrFail(Clip, { id: made.clipId });
        if (to) clip.state = to;
        return clip.state;
      });
    await stateOf('waiting');
    await withdraw('assessment');
    await prepareClipJob.run({
      ground: api.ground,
      practiceId,
      payload: { clipId: made.clipId },
      signal: new AbortController().signal,
    });
    expect(await stateOf()).toBe('waiting');
  });

  it('is not withdrawn by one of two who gave it', async () => {
    const { coach, practiceId } = api.world;
    const id = await api.ground.inPractice(product(practiceId), async ({ em }) => {
      const athlete = await em.findOneOrFail(Athlete, { id: made.athleteId });
      return makeConsent(em, { athlete, recordedBy: coach }).id;
    });
    const agent = await as('coach');
    const { body } = await agent.post(`/api/consents/${id}/withdraw`).expect(200);
    expect(body).toMatchObject({ state: 'withdrawn', held: [] });
    expect(body.withdrawals).toHaveLength(3);
    await agent.get(`/api/clips/${made.clipId}`).expect(200);
  });
});

describe('the consent to supervision, withdrawn', () => {
  it('closes what was filmed to the supervisor alone', async () => {
    await (await as('supervisor')).get(`/api/clips/${made.clipId}/bench`).expect(200);
    const athlete = await withdraw('supervision');
    expect(athlete.deletionDue).toBeNull();
    expect(athlete.consentedTo).toEqual(['assessment', 'sharing-by-link', 'teaching']);
    expect(await answersTo('supervisor')).toEqual(all('supervision-not-agreed'));
    for (const who of ['coach', 'owner'] as const)
      await (await as(who)).get(`/api/clips/${made.clipId}/bench`).expect(200);
    const list = `/api/clips?athleteId=${made.athleteId}`;
    expect((await (await as('supervisor')).get(list).expect(200)).body.items).toEqual([]);
    expect((await (await as('coach')).get(list).expect(200)).body.items).toHaveLength(1);
  });
});

describe('the consent to sharing, withdrawn', () => {
  it('kills links like links that never were, and nothing else', async () => {
    await api.nobody.get(`/api/r/${made.token}`).expect(200);
    await api.nobody.get(`/api/r/${made.token}/video`).set('Range', 'bytes=0-3').expect(206);
    await withdraw('sharing-by-link');
    for (const part of ['', '/video', '/poster']) {
      const dead = await api.nobody.get(`/api/r/${made.token}${part}`).set('Range', 'bytes=0-3');
      const never = await api.nobody
        .get(`/api/r/${'never'.padEnd(43, 'w')}${part}`)
        .set('Range', 'bytes=0-3');
      expect(dead.status).toBe(404);
      expect({ ...dead.body, requestId: '' }).toEqual({ ...never.body, requestId: '' });
    }
    await (await as('coach')).get(`/api/clips/${made.clipId}/bench`).expect(200);
  });
});

describe('the consent to teaching, withdrawn', () => {
  it('is no longer among what is agreed to, with the moment beside the consent', async () => {
    expect((await withdraw('teaching')).consentedTo).not.toContain('teaching');
    const { body } = await (await as('coach')).get(`/api/athletes/${made.athleteId}/consents`);
    expect(body.items[0]).toMatchObject({ purposes: ALL, state: 'valid' });
    expect(body.items[0].held).not.toContain('teaching');
    expect(body.items[0].withdrawals).toMatchObject([{ purpose: 'teaching' }]);
  });
});

describe('streams of events', () => {
  const soon = (check: () => void): Promise<void> => vi.waitFor(check, { timeout: 15_000 });
  const listen = async (who: Who) => {
    const abort = new AbortController();
    const user = api.world[who];
    const session = await api.ground.inPractice(user, ({ em }) =>
      Promise.resolve(
        em.create(Session, {
          user: user.id,
          device: 'A tab',
          expiresAt: new Date(Date.now() + 1e7),
        }),
      ),
    );
    const cookie = api.ground.sessions.cookieFor(session.id).split(';')[0] ?? '';
    const response = await fetch(`${base}/api/events`, {
      headers: { Cookie: cookie },
      signal: abort.signal,
    });
    const heard = { text: '', stop: () => abort.abort() };
    const read = async () => {
      for await (const part of response.body ?? [])
        heard.text += Buffer.from(part as Uint8Array).toString();
    };
    read().catch(() => undefined);
    await soon(() => expect(heard.text).toContain('retry:'));
    return heard;
  };
  const say = () =>
    api.ground.inPractice(product(api.world.practiceId), (unit) =>
      tell(
        unit,
        { coachId: api.world.coach.id },
        { type: 'comments', clipId: made.clipId, byUserId: api.world.coach.id },
      ),
    );

  it('tell of the withdrawal, then nothing more of the clips', async () => {
    const [coach, supervisor] = [await listen('coach'), await listen('supervisor')];
    await say();
    for (const each of [coach, supervisor])
      await soon(() => expect(each.text).toContain('"comments"'));
    await withdraw('supervision');
    await soon(() => expect(supervisor.text).toContain('"consent"'));
    await say();
    await soon(() => expect(coach.text.match(/"comments"/g)).toHaveLength(2));
    await withdraw('assessment');
    await say();
    // whatever was said before it has come by the time that this has
    await withdraw('teaching');
    await soon(() => expect(coach.text.match(/"consent"/g)).toHaveLength(2));
    expect(supervisor.text.match(/"comments"/g)).toHaveLength(1);
    expect(coach.text.match(/"comments"/g)).toHaveLength(2);
    for (const each of [coach, supervisor]) each.stop();
  });
});
