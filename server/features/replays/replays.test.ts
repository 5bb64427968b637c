import { Readable } from 'node:stream';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { asAdmin } from '#tests/support/admin.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { makeConsent } from '../athletes/athlete.factory.ts';
import { Clip } from '../clips/clip.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let made: { visitId: string; repId: string; clipId: string; side: string };

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const { coach: user, athlete } = api.world;
  const golden = goldenClip('g01_early_big_thigh');
  const { width, height, geometry, frames, trial } = golden;
  const { visit, clip } = await api.ground.inPractice(user, ({ em }) => {
    makeConsent(em, { athlete, recordedBy: user, purposes: ['assessment', 'sharing-by-link'] });
    const visit = makeVisit(em, { athlete, coach: user });
    const facts = { width, height, geometry, frames, frameCount: frames.count };
    return Promise.resolve({ visit, clip: makeClip(em, { visit, uploadedBy: user, ...facts }) });
  });
  const side = trial.supportSide;
  let repId = '';
  for (const { startFrame, endFrame, commands } of golden.reps) {
    const { body } = await coach
      .post(`/api/clips/${clip.id}/reps`)
      .send({ supportSide: side, startFrame, endFrame });
    await coach.post(`/api/reps/${body.id}/marks`).send({ commands }).expect(200);
    repId ||= body.id;
  }
  const early = { seen: 'early', confidence: 'sure', handsFelt: 'A private thought.' };
  await coach.post(`/api/visits/${visit.id}/sides/${side}/call`).send(early).expect(201);
  await coach.get(`/api/visits/${visit.id}/sides/${side}/reading`).expect(200);
  made = { visitId: visit.id, repId, clipId: clip.id, side };
});
afterAll(() => api.close());

const make = async (more: object = {}) => {
  const { visitId, repId, side } = made;
  const { body } = await coach
    .post('/api/replays')
    .send({ visitId, repId, side, ...more })
    .expect(201);
  return { replay: body.replay, token: String(body.url).split('/r/')[1] ?? '' };
};
const open = (token: string) => api.nobody.get(`/api/r/${token}`);

describe('the links of an athlete', () => {
  const path = () => `/api/replays?athleteId=${api.world.athlete.id}`;

  it('are listed over all visits for those who see the athlete, and for nobody else', async () => {
    const { replay } = await make();
    for (const who of [api.world.coach, api.world.supervisor, api.world.owner]) {
      const { body } = await (await api.as(who)).get(path()).expect(200);
      expect(body.items.map(({ id }: { id: string }) => id)).toContain(replay.id);
    }
    for (const who of [api.world.otherCoach, api.world.foreignOwner])
      await (await api.as(who)).get(path()).expect(404);
  });

  it('are asked for by a visit or by an athlete, never by both or neither', async () => {
    await coach.get('/api/replays').expect(422);
    await coach.get(`${path()}&visitId=${made.visitId}`).expect(422);
  });
});

describe('a replay link', () => {
  let token: string;
  let replay: { id: string };
  beforeEach(async () => {
    ({ token, replay } = await make());
  });

  it('carries 256 random bits, of which only a hash is kept', async () => {
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/);
    const rows = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.execute<object[]>('select * from replay'),
    );
    expect(JSON.stringify(rows)).not.toContain(token);
    const listed = await coach.get(`/api/replays?visitId=${made.visitId}`).expect(200);
    expect(JSON.stringify(listed.body)).not.toContain(token);
  });

  it('shows the span, its moments and the reading in the words of the practice, and counts', async () => {
    const { body } = await open(token).expect(200);
    expect(body).toMatchObject({
      athleteGivenName: api.world.athlete.givenName,
      side: made.side,
      reading: { code: 'early-turn-out', repsUsed: 3, repsAgreeing: 3 },
      call: { seen: 'early', confidence: 'sure' },
    });
    expect(body.gates).toEqual({ from: 60, to: 90 });
    expect(body.moments.from).toBeLessThan(body.moments.to);
    expect(body.overlay.length).toBeGreaterThan(10);
    // no angle without its ±
    for (const frame of body.overlay) {
      expect(frame.liftPlusMinus === null).toBe(frame.lift === null);
      expect(frame.turnPlusMinus === null).toBe(frame.turn === null);
      if (frame.lift !== null) expect(frame.liftPlusMinus).toBeGreaterThanOrEqual(2);
    }
    await open(token).expect(200);
    const { body: list } = await coach.get(`/api/replays?visitId=${made.visitId}`);
    expect(list.items.find((row: { id: string }) => row.id === replay.id).openings).toBe(2);
  });

  it('says nothing measured while the reading rests on marks that nobody has looked at', async () => {
    // nobody else may change a reading
    const provisional = (value: boolean) =>
      asAdmin(
        (client) =>
          client.query('update reading set provisional = $1 where visit_id = $2', [
            value,
            made.visitId,
          ]),
        new URL(api.ground.config.database.app).pathname.slice(1),
      );
    await provisional(true);
    const { body } = await open(token).expect(200);
    expect(body.reading).toBeNull();
    expect(body.call).toMatchObject({ seen: 'early' });
    await provisional(false);
    expect((await open(token).expect(200)).body.reading).toMatchObject({ code: 'early-turn-out' });
  });

  it('tells a measure in a shared comment with its ±, and only beside a reading', async () => {
    const { body: before } = await open(token).expect(200);
    const at = before.overlay.find(
      ({ lift }: { lift: number | null }) => lift !== null && lift > 60,
    );
    const words = { body: 'Look here.', fromFrame: at.frame, toFrame: at.frame, shared: true };
    const said = await coach
      .post(`/api/clips/${made.clipId}/comments`)
      .send({ ...words, shape: { kind: 'measure', measure: 'turn' } })
      .expect(201);
    const { body } = await open(token).expect(200);
    const [comment] = body.comments;
    expect(comment.shape).toMatchObject({ kind: 'measured', label: 'Turn of the support hip' });
    const [value, within] = comment.shape.text.replace('−', '-').split('±').map(parseFloat);
    expect(value).toBeCloseTo(at.turn, 1);
    expect(within).toBeCloseTo(at.turnPlusMinus, 1);
    const bare = await make({ showReading: false });
    const { body: called } = await open(bare.token).expect(200);
    expect(called.comments).toMatchObject([{ body: 'Look here.', shape: null }]);
    await coach.delete(`/api/comments/${said.body.id}`).expect(204);
  });

  it('lets out nothing else of the practice', async () => {
    const { body } = await open(token).expect(200);
    const said = JSON.stringify(body);
    for (const secret of [
      api.world.athlete.familyName,
      api.world.athlete.id,
      api.world.coach.email,
      api.world.coach.id,
      made.visitId,
      made.clipId,
      'A private thought.',
    ])
      expect(said).not.toContain(secret);
    await api.nobody.get(`/api/clips/${made.clipId}/video`).expect(401);
  });

  it('dies by revoking, with one and the same answer for every failure', async () => {
    const unknown = await open('A'.repeat(43));
    expect(unknown.status).toBe(404);
    await coach.post(`/api/replays/${replay.id}/revoke`).expect(200);
    const dead = await open(token);
    const { requestId: _a, ...one } = unknown.body;
    const { requestId: _b, ...other } = dead.body;
    expect(other).toEqual(one);
    for (const path of ['video', 'poster'])
      await api.nobody.get(`/api/r/${token}/${path}`).expect(404);
    expect((await open('short')).status).toBe(404);
  });

  it('is asked for at every playing, so that no cache outlives it', async () => {
    const { files } = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.findOneOrFail(Clip, { id: made.clipId }),
    );
    await api.ground.storage.putStream(
      String(files.replay),
      Readable.from([Buffer.from('a clip')]),
      'video/mp4',
    );
    const playing = await api.nobody.get(`/api/r/${token}/video`).expect(200);
    expect(playing.headers['cache-control']).toBe('private, no-cache');
    const again = () =>
      api.nobody.get(`/api/r/${token}/video`).set('If-None-Match', String(playing.headers['etag']));
    await again().expect(304);
    await coach.post(`/api/replays/${replay.id}/revoke`).expect(200);
    await again().expect(404);
  });

  it('dies when it lapses', async () => {
    await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.execute(`update replay set expires_at = now() - interval '1 second' where id = ?`, [
        replay.id,
      ]),
    );
    await open(token).expect(404);
  });

  it('carries no angle where only the call is shown', async () => {
    const seen = await make({ showReading: false });
    const { body } = await open(seen.token).expect(200);
    expect(body).toMatchObject({ reading: null, course: null, call: { seen: 'early' } });
    for (const frame of body.overlay)
      expect(frame).toMatchObject({
        lift: null,
        liftPlusMinus: null,
        turn: null,
        turnPlusMinus: null,
      });
  });
});

describe('a pass phrase', () => {
  it('is asked for, given once per device, and wrong ones are all alike', async () => {
    const { token } = await make({ passPhrase: 'red leg bird' });
    const asked = await open(token);
    expect(asked.body).toMatchObject({ status: 401, code: 'pass-phrase-needed' });
    expect(JSON.stringify(asked.body)).not.toContain(api.world.athlete.givenName);
    await api.nobody.get(`/api/r/${token}/video`).expect(401);
    const unlock = (passPhrase: string) =>
      api.nobody.post(`/api/r/${token}/unlock`).send({ passPhrase });
    await unlock('blue leg bird').expect(401);
    const right = await unlock('red leg bird').expect(204);
    const cookie = String(right.headers['set-cookie']);
    expect(cookie).toMatch(/^__Secure-redshank_replay=.*HttpOnly; Secure/);
    expect(cookie).toContain(`Path=/api/r/${token}`);
    await open(token)
      .set('Cookie', cookie.split(';')[0] ?? '')
      .expect(200);
    const { token: another } = await make({ passPhrase: 'red leg bird' });
    await open(another)
      .set('Cookie', cookie.split(';')[0] ?? '')
      .expect(401);
  });

  it('cannot be guessed at for long', async () => {
    const { token } = await make({ passPhrase: 'red leg bird' });
    const statuses: number[] = [];
    for (let n = 0; n < 10; n += 1) {
      const answer = await api.nobody
        .post(`/api/r/${token}/unlock`)
        .send({ passPhrase: `no ${n}` });
      statuses.push(answer.status);
    }
    expect(statuses.at(-1)).toBe(429);
  });
});

describe('making one', () => {
  it('is for whoever works with the athlete', async () => {
    const { visitId, repId, side } = made;
    const body = { visitId, repId, side };
    const { replay } = await make();
    for (const [user, status] of [
      [api.world.supervisor, 403],
      [api.world.otherCoach, 404],
      [api.world.foreignCoach, 404],
    ] as const) {
      const who = await api.as(user);
      await who.post('/api/replays').send(body).expect(status);
      await who.post(`/api/replays/${replay.id}/revoke`).expect(status);
    }
  });

  it('needs a rep of that visit and side, and a span inside the clip', async () => {
    const other = made.side === 'left' ? 'right' : 'left';
    const wrongSide = await coach.post('/api/replays').send({ ...made, side: other });
    expect(wrongSide.body.faults).toMatchObject([{ path: 'body.repId' }]);
    const outside = await coach.post('/api/replays').send({ ...made, toFrame: 99_999 });
    expect(outside.body).toMatchObject({ status: 422, code: 'frame-out-of-range' });
  });

  it('stops, and what was made dies, when the consent is withdrawn', async () => {
    const { token } = await make();
    await open(token).expect(200);
    const { athlete } = api.world;
    const { body } = await coach.get(`/api/athletes/${athlete.id}/consents`);
    for (const { id, state } of body.items)
      if (state === 'valid') await coach.post(`/api/consents/${id}/withdraw`).expect(200);
    await open(token).expect(404);
    const refused = await coach.post('/api/replays').send(made);
    expect(refused.body).toMatchObject({ code: 'consent-withdrawn' });
  });
});
