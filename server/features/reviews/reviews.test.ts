import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ReviewItem, SideReview } from '#shared/contracts/reviews.ts';
import type { Waiting } from '#shared/contracts/today.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { product } from '../../db/in-practice.ts';
import { makeAthlete, makeConsent } from '../athletes/athlete.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';

type Agent = Awaited<ReturnType<Api['as']>>;

let api: Api;
let coach: Agent;
let supervisor: Agent;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  supervisor = await api.as(api.world.supervisor);
});
afterAll(() => api.close());

const SEEN = { seen: 'early', confidence: 'sure' };

/** A side that was marked and called by eye, with its reading. */
const measured = async () => {
  const trial = await markedTrial(api, coach, goldenClip('g01_early_big_thigh'));
  await coach.post(`${trial.side}/call`).send(SEEN).expect(201);
  const { body } = await coach.get(`${trial.side}/reading`).expect(200);
  return { ...trial, readingId: String(body.reading.id), reading: body.reading as unknown };
};

/** A side that was only seen. */
const seenOnly = async () => {
  const visit = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    Promise.resolve(makeVisit(em, { athlete: api.world.athlete, coach: api.world.coach })),
  );
  const side = `/api/visits/${visit.id}/sides/left`;
  const { body } = await coach.post(`${side}/call`).send(SEEN).expect(201);
  return { side, callId: String(body.id), visit };
};

const aReading = (id: string) => ({ about: { kind: 'reading', id } });
const aCall = (id: string) => ({ about: { kind: 'call', id } });
const signOff = { verdict: 'sign-off' };
const sendBack = { verdict: 'send-back', reason: 'The lifted knee is marked too high past 80°.' };

const stateOf = async (side: string) =>
  ((await coach.get(`${side}/review`).expect(200)).body as SideReview).state;
const queueOf = async (agent: Agent) =>
  ((await agent.get('/api/reviews').expect(200)).body as { items: ReviewItem[] }).items;
const todayOf = async (agent: Agent) =>
  ((await agent.get('/api/today').expect(200)).body as { items: Waiting[] }).items;
const waitsOf = async (agent: Agent, visitId: string) =>
  (await queueOf(agent)).find((item) => item.visitId === visitId);

/** Another reading of the same side: a rep is left out. */
const leaveOutFirstRep = async (clipId: string) => {
  const reps = await coach.get(`/api/clips/${clipId}/reps`).expect(200);
  const [rep] = reps.body.items;
  await coach
    .patch(`/api/reps/${rep.id}`)
    .send({ version: rep.version, excluded: 'hopped' })
    .expect(200);
  return rep as { id: string; version: number };
};

describe('a review', () => {
  it('waits once it is handed in, opens at the first comment, and ends with the sign-off', async () => {
    const { side, readingId, clip, visit } = await measured();
    expect(await stateOf(side)).toBe('none');
    expect(await waitsOf(supervisor, visit.id)).toBeUndefined();
    await coach.post(`${side}/hand-in`).send(aReading(readingId)).expect(201);
    const first = await waitsOf(supervisor, visit.id);
    expect(first).toMatchObject({
      about: 'reading',
      label: 'Turns out early',
      seen: 'early',
      again: false,
      openComments: 0,
      coach: { id: api.world.coach.id },
      opens: { clipId: clip.id, commentId: null },
    });
    const words = { body: 'Is the heel down?', fromFrame: 30, toFrame: 30 };
    const said = await supervisor.post(`/api/clips/${clip.id}/comments`).send(words).expect(201);
    expect(await waitsOf(supervisor, visit.id)).toMatchObject({
      openComments: 1,
      opens: { clipId: clip.id, frame: 30, commentId: said.body.id, mine: true },
    });
    expect(await todayOf(supervisor)).toContainEqual(
      expect.objectContaining({ kind: 'to-review', visitId: visit.id }),
    );
    expect(await todayOf(coach)).not.toContainEqual(
      expect.objectContaining({ kind: 'reading-ready', visitId: visit.id }),
    );
    const signed = await supervisor
      .post(`${side}/review`)
      .send({ ...aReading(readingId), ...signOff })
      .expect(201);
    expect(signed.body).toMatchObject({
      state: 'signed-off',
      may: { handIn: false, decide: true },
      steps: [
        { step: 'signed-off', label: 'Turns out early', by: { id: api.world.supervisor.id } },
        { step: 'handed-in', by: { id: api.world.coach.id } },
      ],
    });
    expect(await waitsOf(supervisor, visit.id)).toBeUndefined();
    expect(await todayOf(coach)).toContainEqual(
      expect.objectContaining({ kind: 'reading-ready', visitId: visit.id, signedOff: true }),
    );
    const visits = await coach.get(`/api/athletes/${api.world.athlete.id}/visits`).expect(200);
    const row = visits.body.items.find((each: { id: string }) => each.id === visit.id);
    expect(row.sides).toMatchObject([{ review: 'signed-off' }]);
  });

  it('goes back with a reason, waits in the coach’s Today, and comes again once mended', async () => {
    const { side, readingId, clip, visit } = await measured();
    await coach.post(`${side}/hand-in`).send(aReading(readingId)).expect(201);
    await supervisor
      .post(`${side}/review`)
      .send({ ...aReading(readingId), ...sendBack })
      .expect(201);
    expect(await waitsOf(supervisor, visit.id)).toBeUndefined();
    expect(await todayOf(coach)).toContainEqual(
      expect.objectContaining({
        kind: 'sent-back',
        visitId: visit.id,
        reason: sendBack.reason,
        by: expect.objectContaining({ id: api.world.supervisor.id }),
      }),
    );
    await leaveOutFirstRep(clip.id);
    const mended = await coach.get(`${side}/reading`).expect(200);
    expect(mended.body.reading.id).not.toBe(readingId);
    await coach.post(`${side}/hand-in`).send(aReading(mended.body.reading.id)).expect(201);
    expect(await waitsOf(supervisor, visit.id)).toMatchObject({ again: true });
    expect((await todayOf(coach)).some(({ kind }) => kind === 'sent-back')).toBe(false);
  });

  it('needs a reason to send something back', async () => {
    const { side, readingId } = await measured();
    for (const reason of ['', '   ', undefined]) {
      const answer = await supervisor
        .post(`${side}/review`)
        .send({ ...aReading(readingId), verdict: 'send-back', reason });
      expect(answer.status).toBe(422);
    }
    expect(await stateOf(side)).toBe('none');
  });

  it('is of what stands there now: an older reading or call is not signed off unseen', async () => {
    const { side, readingId, clip } = await measured();
    await leaveOutFirstRep(clip.id);
    const late = await supervisor
      .post(`${side}/review`)
      .send({ ...aReading(readingId), ...signOff });
    expect(late.body).toMatchObject({ status: 409, code: 'edited-meanwhile' });
    const only = await seenOnly();
    await coach
      .post(`${only.side}/call`)
      .send({ ...SEEN, seen: 'still' })
      .expect(201);
    const lateCall = await coach.post(`${only.side}/hand-in`).send(aCall(only.callId));
    expect(lateCall.body).toMatchObject({ status: 409, code: 'edited-meanwhile' });
  });

  it('is not handed in twice, nor signed off twice', async () => {
    const { side, callId } = await seenOnly();
    await coach.post(`${side}/hand-in`).send(aCall(callId)).expect(201);
    const twice = await coach.post(`${side}/hand-in`).send(aCall(callId));
    expect(twice.body).toMatchObject({ status: 409, code: 'not-as-it-stands' });
    const word = { ...aCall(callId), ...signOff };
    await supervisor.post(`${side}/review`).send(word).expect(201);
    expect((await supervisor.post(`${side}/review`).send(word)).body).toMatchObject({
      code: 'not-as-it-stands',
    });
  });

  it('is possible of a call by eye alone, which carries no figure', async () => {
    const { side, callId, visit } = await seenOnly();
    await coach.post(`${side}/hand-in`).send(aCall(callId)).expect(201);
    expect(await waitsOf(supervisor, visit.id)).toMatchObject({
      about: 'call',
      seen: 'early',
      label: null,
      change: null,
      plusMinus: null,
      opens: null,
    });
    const { body } = await supervisor
      .post(`${side}/review`)
      .send({ ...aCall(callId), ...signOff })
      .expect(201);
    expect(body).toMatchObject({
      state: 'signed-off',
      steps: [{ about: { kind: 'call', id: callId }, seen: 'early', label: null }, {}],
    });
  });
});

describe('a signed reading', () => {
  it('stays as it was: new marks make a new reading beside it, and the old ones find it again', async () => {
    const { side, readingId, clip } = await measured();
    const stored = () =>
      api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
        em.execute<object[]>('select r.* from reading r where r.id = ?', [readingId]),
      );
    const before = await stored();
    await supervisor
      .post(`${side}/review`)
      .send({ ...aReading(readingId), ...signOff })
      .expect(201);
    const rep = await leaveOutFirstRep(clip.id);
    const next = await coach.get(`${side}/reading`).expect(200);
    expect(next.body.reading.id).not.toBe(readingId);
    expect(await stateOf(side)).toBe('changed');
    expect(await stored()).toEqual(before);
    await coach
      .patch(`/api/reps/${rep.id}`)
      .send({ version: rep.version + 1, excluded: null })
      .expect(200);
    const back = await coach.get(`${side}/reading`).expect(200);
    expect(back.body.reading.id).toBe(readingId);
    expect(await stateOf(side)).toBe('signed-off');
    expect(await stored()).toEqual(before);
  });

  it('cannot be changed or taken away by the product at all, nor can a word of its review', async () => {
    const { side, readingId } = await measured();
    await supervisor
      .post(`${side}/review`)
      .send({ ...aReading(readingId), ...signOff })
      .expect(201);
    for (const [sql, id] of [
      [`update reading set code = 'holds-still' where id = ?`, readingId],
      ['delete from reading where id = ?', readingId],
      [`update review set step = 'handed-in' where reading_id = ?`, readingId],
      ['delete from review where reading_id = ?', readingId],
    ] as const)
      await expect(
        api.ground.inPractice(product(api.world.practiceId), ({ em }) => em.execute(sql, [id])),
        sql,
      ).rejects.toThrow(/permission denied/);
  });
});

describe('who may', () => {
  it('hand in: the coach; decide: their supervisor and the owner, never the coach', async () => {
    const { side, callId } = await seenOnly();
    await supervisor.post(`${side}/hand-in`).send(aCall(callId)).expect(403);
    await coach.post(`${side}/hand-in`).send(aCall(callId)).expect(201);
    const word = { ...aCall(callId), ...signOff };
    await coach.post(`${side}/review`).send(word).expect(403);
    for (const who of [api.world.otherCoach, api.world.foreignOwner, api.world.foreignCoach]) {
      const stranger = await api.as(who);
      await stranger.get(`${side}/review`).expect(404);
      await stranger.post(`${side}/hand-in`).send(aCall(callId)).expect(404);
      await stranger.post(`${side}/review`).send(word).expect(404);
    }
    const owner = await api.as(api.world.owner);
    expect((await queueOf(owner)).length).toBeGreaterThan(0);
    await owner.post(`${side}/review`).send(word).expect(201);
  });

  it('see the queue: each their own sight, and nobody their own athletes’ sides', async () => {
    const { side, callId, visit } = await seenOnly();
    await coach.post(`${side}/hand-in`).send(aCall(callId)).expect(201);
    expect(await waitsOf(supervisor, visit.id)).toBeDefined();
    for (const who of [
      api.world.coach,
      api.world.otherCoach,
      api.world.foreignOwner,
      api.world.foreignCoach,
    ])
      expect(await queueOf(await api.as(who))).toEqual([]);
  });

  it('is a supervisor only while the athlete agrees that they look', async () => {
    const { coach: user, practiceId } = api.world;
    const visitId = await api.ground.inPractice(product(practiceId), async ({ em }) => {
      const athlete = makeAthlete(em, { coach: user, givenName: 'Sedge' });
      makeConsent(em, { athlete, recordedBy: user, purposes: ['assessment'] });
      const visit = makeVisit(em, { athlete, coach: user });
      await em.flush();
      return visit.id;
    });
    const side = `/api/visits/${visitId}/sides/left`;
    const { body } = await coach.post(`${side}/call`).send(SEEN).expect(201);
    const handed = await coach.post(`${side}/hand-in`).send(aCall(body.id)).expect(201);
    const named = (handed.body as SideReview).reviewers.map(({ id }) => id);
    expect(named).toEqual([api.world.owner.id]);
    expect(await waitsOf(supervisor, visitId)).toBeUndefined();
    const refused = await supervisor.get(`${side}/review`);
    expect(refused.body).toMatchObject({ status: 403, code: 'supervision-not-agreed' });
    expect(await waitsOf(await api.as(api.world.owner), visitId)).toBeDefined();
  });
});

describe('the queue', () => {
  it('begins with what has waited longest', async () => {
    for (let n = 0; n < 3; n += 1) {
      const { side, callId } = await seenOnly();
      await coach.post(`${side}/hand-in`).send(aCall(callId)).expect(201);
    }
    const times = (await queueOf(supervisor)).map(({ at }) => Date.parse(at));
    expect(times.length).toBeGreaterThanOrEqual(3);
    expect(times).toEqual(times.toSorted((a, b) => a - b));
  });
});
