import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { can } from '#shared/access/can.ts';
import type { UserActor } from '#shared/access/actors.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { makeAthlete } from './athlete.factory.ts';
import { coachesInSight } from './caseload.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const BODY = {
  givenName: 'Avery',
  familyName: 'Sedge',
  birthDate: '1991-03-04',
  heightMm: 1820,
  sport: 'Hurdles',
};

describe('an athlete', () => {
  it('is added to one’s own caseload and read back', async () => {
    const coach = await api.as(api.world.otherCoach);
    const added = await coach.post('/api/athletes').send(BODY).expect(201);
    expect(added.body).toMatchObject({
      ...BODY,
      minor: false,
      cautions: '',
      contactEmail: null,
      coach: { id: api.world.otherCoach.id },
      consentedTo: [],
      consentUntil: null,
      lastVisit: null,
      visitCount: 0,
      version: 1,
    });
    const read = await coach.get(`/api/athletes/${added.body.id}`).expect(200);
    expect(read.body).toEqual(added.body);
  });

  it('is not added by a supervisor', async () => {
    const supervisor = await api.as(api.world.supervisor);
    const answer = await supervisor.post('/api/athletes').send(BODY).expect(403);
    expect(answer.body.code).toBe('not-allowed');
  });

  it('is listed with the coaches whose athletes a supervisor or an owner sees; a coach gets none', async () => {
    const names = async (who: Parameters<Api['as']>[0]) =>
      (await (await api.as(who)).get('/api/athletes').expect(200)).body.coaches.map(
        ({ id }: { id: string }) => id,
      );
    const { coach, otherCoach, supervisor, owner, foreignOwner } = api.world;
    expect(await names(coach)).toEqual([]);
    expect(await names(supervisor)).toEqual([coach.id]);
    expect(await names(owner)).toContain(coach.id);
    expect(await names(owner)).toContain(otherCoach.id);
    expect(await names(foreignOwner)).not.toContain(coach.id);
  });

  it('is refused with every fault at once', async () => {
    const coach = await api.as(api.world.coach);
    const answer = await coach
      .post('/api/athletes')
      .send({ givenName: ' ', familyName: 'x\u0007', birthDate: '2999-01-01', heightMm: 20 })
      .expect(422);
    expect(answer.body.faults.map((fault: { path: string }) => fault.path).sort()).toEqual([
      'body.birthDate',
      'body.familyName',
      'body.givenName',
      'body.heightMm',
    ]);
  });

  it('is changed once; the older hand learns of it', async () => {
    const coach = await api.as(api.world.coach);
    const path = `/api/athletes/${api.world.athlete.id}`;
    const { version } = (await coach.get(path)).body;
    const changed = await coach.patch(path).send({ version, sport: 'Rowing' }).expect(200);
    expect(changed.body).toMatchObject({
      sport: 'Rowing',
      version: version + 1,
      givenName: 'Robin',
    });
    const late = await coach.patch(path).send({ version, sport: 'Chess' }).expect(409);
    expect(late.body.code).toBe('edited-meanwhile');
    expect((await coach.get(path)).body.sport).toBe('Rowing');
  });

  it('is seen by coach, supervisor and owner, and by nobody else', async () => {
    const { coach, supervisor, owner, otherCoach, foreignCoach, foreignOwner, athlete } = api.world;
    const path = `/api/athletes/${athlete.id}`;
    for (const user of [coach, supervisor, owner]) await (await api.as(user)).get(path).expect(200);
    for (const user of [otherCoach, foreignCoach, foreignOwner]) {
      const agent = await api.as(user);
      await agent.get(path).expect(404);
      await agent.patch(path).send({ version: 1 }).expect(404);
      await agent.get(`${path}/consents`).expect(404);
    }
    await api.nobody.get(path).expect(401);
    await (await api.as(supervisor)).patch(path).send({ version: 1 }).expect(403);
  });
});

describe('the list of athletes', () => {
  const names = (body: { items: { familyName: string }[] }) =>
    body.items.map(({ familyName }) => familyName);

  beforeAll(async () => {
    await api.ground.inPractice(product(api.world.practiceId), ({ em }) => {
      for (const familyName of ['Alder', 'Birch', 'Cedar', '100%_']) {
        makeAthlete(em, { coach: api.world.coach, givenName: 'Lou', familyName });
      }
      return Promise.resolve();
    });
  });

  it('holds whom one may see, page by page', async () => {
    const coach = await api.as(api.world.coach);
    const first = await coach.get('/api/athletes?pageSize=3').expect(200);
    expect(first.body).toMatchObject({ total: 5, page: 1, pageSize: 3 });
    expect(names(first.body)).toEqual(['100%_', 'Alder', 'Birch']);
    const second = await coach.get('/api/athletes?pageSize=3&page=2');
    expect(names(second.body)).toEqual(['Cedar', 'Marsh']);
    const foreigner = await api.as(api.world.foreignCoach);
    expect((await foreigner.get('/api/athletes')).body.items).toMatchObject([
      { id: api.world.foreignAthlete.id },
    ]);
  });

  it('is searched by all words in any order, and % is a letter', async () => {
    const coach = await api.as(api.world.coach);
    const search = async (q: string) =>
      names((await coach.get('/api/athletes').query({ q })).body as { items: never[] });
    expect(await search('alder lou')).toEqual(['Alder']);
    expect(await search('%')).toEqual(['100%_']);
    expect(await search('zz')).toEqual([]);
  });

  it('is filtered by consent and coach, and sorted by the last visit', async () => {
    const owner = await api.as(api.world.owner);
    const valid = await owner.get('/api/athletes?consent=valid');
    expect(names(valid.body)).toEqual(['Marsh']);
    expect(valid.body.items[0].consentedTo).toEqual([
      'assessment',
      'sharing-by-link',
      'supervision',
    ]);
    const none = await owner.get('/api/athletes?consent=none');
    expect(names(none.body)).not.toContain('Marsh');
    expect(none.body.total).toBe(none.body.items.length);
    const theirs = await owner.get('/api/athletes').query({ coach: api.world.otherCoach.id });
    expect(names(theirs.body)).toEqual(['Sedge']);
    const latest = await owner.get('/api/athletes?sort=-lastVisit');
    expect(names(latest.body)[0]).toBe('Marsh');
  });

  it('agrees with can, role by role', () => {
    const { owner, supervisor, coach, otherCoach, practiceId } = api.world;
    const actorOf = (user: typeof owner, coachIds: string[] = []): UserActor => ({
      kind: 'user',
      id: user.id,
      practiceId,
      role: user.role,
      coachIds,
    });
    const coaches = [owner, supervisor, coach, otherCoach].map(({ id }) => id);
    for (const actor of [
      actorOf(owner),
      actorOf(supervisor, [coach.id]),
      actorOf(coach),
      actorOf(otherCoach, [coach.id]),
    ]) {
      const inSight = coachesInSight(actor);
      expect(coaches.filter((id) => inSight === null || inSight.includes(id))).toEqual(
        coaches.filter((coachId) =>
          can(actor, 'athlete.read', { kind: 'caseload', practiceId, coachId }),
        ),
      );
    }
  });
});
