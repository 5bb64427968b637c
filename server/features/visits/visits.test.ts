import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { makeAthlete } from '../athletes/athlete.factory.ts';
import { daysLater, today } from '../athletes/days.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { makeRep } from '../reps/rep.factory.ts';
import { makeVisit } from './visit.factory.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const answers = (...yes: string[]) =>
  Object.fromEntries(SAFETY_QUESTIONS.map((question) => [question, yes.includes(question)]));
const SAFE = { answers: answers(), supportWithinReach: true, knowsWhenToStop: true };

const newVisit = async (birthDate = '1990-01-01') => {
  const { coach, practiceId } = api.world;
  return api.ground.inPractice(product(practiceId), ({ em }) => {
    const athlete = makeAthlete(em, { coach, birthDate });
    return Promise.resolve(makeVisit(em, { athlete, coach, safety: null }));
  });
};

describe('a visit', () => {
  it('is opened for an athlete and stands in their history', async () => {
    const coach = await api.as(api.world.coach);
    const path = `/api/athletes/${api.world.athlete.id}/visits`;
    const opened = await coach.post(path).send({ day: '2026-01-10', note: 'After the camp.' });
    expect(opened.status).toBe(201);
    expect(opened.body).toMatchObject({
      day: '2026-01-10',
      note: 'After the camp.',
      athlete: { id: api.world.athlete.id, name: 'Robin Marsh', minor: false },
      safety: null,
      setUpName: null,
      filming: { distanceMm: null, lensHeightMm: null },
    });
    expect((await coach.post(path).send({})).body.day).toBe(today());
    const { body } = await coach.get(path).expect(200);
    expect(body.items.map((row: { day: string }) => row.day)).toEqual([
      today(),
      today(),
      '2026-01-10',
    ]);
  });

  it('shows its clips with their reps counted', async () => {
    const { coach, practiceId } = api.world;
    const visit = await newVisit();
    const clip = await api.ground.inPractice(product(practiceId), ({ em }) => {
      const made = makeClip(em, { visit, uploadedBy: coach });
      makeRep(em, { clip: made, createdBy: coach });
      makeRep(em, { clip: made, createdBy: coach });
      return Promise.resolve(made);
    });
    const { body } = await (await api.as(coach)).get(`/api/visits/${visit.id}`).expect(200);
    expect(body.visit.id).toBe(visit.id);
    expect(body.clips).toHaveLength(1);
    expect(body.clips[0]).toMatchObject({ id: clip.id, state: 'ready', repCount: 2 });
  });

  it('is nobody else’s', async () => {
    const { otherCoach, foreignOwner, supervisor, visit, athlete } = api.world;
    for (const user of [otherCoach, foreignOwner]) {
      const agent = await api.as(user);
      await agent.get(`/api/visits/${visit.id}`).expect(404);
      await agent.patch(`/api/visits/${visit.id}`).send({ version: 1 }).expect(404);
      await agent.put(`/api/visits/${visit.id}/safety`).send(SAFE).expect(404);
      await agent.get(`/api/athletes/${athlete.id}/visits`).expect(404);
      await agent.post(`/api/athletes/${athlete.id}/visits`).send({}).expect(404);
      await agent.get(`/api/visits/${visit.id}/sides/left/call`).expect(404);
    }
    const watching = await api.as(supervisor);
    await watching.get(`/api/visits/${visit.id}`).expect(200);
    await watching.put(`/api/visits/${visit.id}/safety`).send(SAFE).expect(403);
  });
});

describe('the safety check', () => {
  const check = async (visitId: string, body: object) =>
    (await api.as(api.world.coach)).put(`/api/visits/${visitId}/safety`).send(body);

  it('lets filming begin when every answer is no', async () => {
    const visit = await newVisit();
    const { body } = await check(visit.id, SAFE);
    expect(body.safety).toMatchObject({
      mayFilm: true,
      chaperone: null,
      askedBy: { id: api.world.coach.id },
    });
  });

  it('stops at a yes until somebody has cleared it', async () => {
    const visit = await newVisit();
    const yes = { ...SAFE, answers: answers('recent-surgery-or-fracture') };
    expect((await check(visit.id, yes)).body.safety.mayFilm).toBe(false);
    const cleared = await check(visit.id, { ...yes, clearedBy: 'Dr Vole, this morning' });
    expect(cleared.body.safety.mayFilm).toBe(true);
  });

  it('needs a guardian or chaperone beside a minor', async () => {
    const visit = await newVisit(daysLater(today(), -12 * 365));
    const unsaid = await check(visit.id, SAFE);
    expect(unsaid.status).toBe(422);
    expect(unsaid.body.faults[0].path).toBe('body.chaperone');
    expect((await check(visit.id, { ...SAFE, chaperone: false })).body.safety.mayFilm).toBe(false);
    expect((await check(visit.id, { ...SAFE, chaperone: true })).body.safety.mayFilm).toBe(true);
  });

  it('takes no question as answered', async () => {
    const visit = await newVisit();
    const { body } = await check(visit.id, { answers: {} });
    const paths = body.faults.map((fault: { path: string }) => fault.path);
    expect(paths).toContain('body.answers.pain-today');
    expect(paths).toContain('body.supportWithinReach');
    expect(paths).toHaveLength(SAFETY_QUESTIONS.length + 2);
  });
});

describe('a retest', () => {
  it('is filmed as the earlier visit of the athlete was, and like nobody else’s', async () => {
    const { athlete, coach: user, practiceId } = api.world;
    const agent = await api.as(user);
    const filming = {
      distanceMm: 2950,
      lensHeightMm: 1040,
      rodMm: 1000,
      beltPointerMm: 140,
      thighPointerMm: 120,
    };
    const path = `/api/athletes/${athlete.id}/visits`;
    const first = (await agent.post(path).send({}).expect(201)).body as { id: string };
    await agent.patch(`/api/visits/${first.id}`).send({ version: 1, filming }).expect(200);
    const again = await agent.post(path).send({ likeVisitId: first.id }).expect(201);
    expect(again.body.filming).toEqual(filming);
    // changed later by itself alone
    await agent
      .patch(`/api/visits/${again.body.id}`)
      .send({ version: 1, filming: { ...filming, distanceMm: 3100 } })
      .expect(200);
    const kept = await agent.get(`/api/visits/${first.id}`).expect(200);
    expect(kept.body.visit.filming).toEqual(filming);
    const others = await api.ground.inPractice(product(practiceId), async ({ em }) => {
      const somebody = makeAthlete(em, { coach: user, givenName: 'Sedge' });
      const visit = makeVisit(em, { athlete: somebody, coach: user });
      await em.flush();
      return visit.id;
    });
    await agent.post(path).send({ likeVisitId: others }).expect(404);
  });
});

describe('a set-up', () => {
  const SET_UP = {
    name: 'Hall, blue line',
    distanceMm: 3000,
    lensHeightMm: 950,
    rodMm: 1000,
    beltPointerMm: 150,
    thighPointerMm: null,
  };

  it('fills the filming of a visit in one touch, and what is typed stands over it', async () => {
    const coach = await api.as(api.world.coach);
    const saved = await coach.post('/api/set-ups').send(SET_UP).expect(201);
    expect(saved.body).toMatchObject({ ...SET_UP, lastUsed: null });
    const visit = await newVisit();
    const path = `/api/visits/${visit.id}`;
    const filled = await coach.patch(path).send({ version: 1, setUpId: saved.body.id }).expect(200);
    const { name: _, ...figures } = SET_UP;
    expect(filled.body).toMatchObject({ setUpName: SET_UP.name, filming: figures });
    const typed = await coach
      .patch(path)
      .send({ version: filled.body.version, filming: { ...figures, distanceMm: 2800 } })
      .expect(200);
    expect(typed.body).toMatchObject({ setUpName: null, filming: { distanceMm: 2800 } });
    await coach.patch(path).send({ version: 1, note: 'late' }).expect(409);
    const { body } = await coach.get('/api/set-ups');
    expect(body.items[0]).toMatchObject({ id: saved.body.id, lastUsed: today() });
  });

  it('belongs to its practice', async () => {
    const coach = await api.as(api.world.coach);
    const { id } = (await coach.post('/api/set-ups').send(SET_UP)).body as { id: string };
    const foreigner = await api.as(api.world.foreignCoach);
    expect((await foreigner.get('/api/set-ups')).body.items).toEqual([]);
    await foreigner.delete(`/api/set-ups/${id}`).expect(404);
    const supervisor = await api.as(api.world.supervisor);
    expect((await supervisor.get('/api/set-ups')).body.items).not.toEqual([]);
    await supervisor.delete(`/api/set-ups/${id}`).expect(403);
    await coach.delete(`/api/set-ups/${id}`).expect(204);
    await coach.delete(`/api/set-ups/${id}`).expect(404);
  });
});
