import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { asAdmin } from '#tests/support/admin.ts';
import { firstStep, secondStep, withCodes } from '#tests/support/one-time-codes.ts';
import { JobOutbox } from '../../jobs/job-outbox.entity.ts';
import type { User } from '../accounts/user.entity.ts';
import { makeUser } from '../accounts/user.factory.ts';
import { makeAthlete } from '../athletes/athlete.factory.ts';

let api: Api;
let owner: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  owner = await api.as(api.world.owner);
});
afterAll(() => api.close());

const at = ({ id }: User, act = '') => `/api/practice/people/${id}${act}`;
const newUser = (role: User['role']) =>
  api.ground.inPractice(api.world.owner, ({ em }) => Promise.resolve(makeUser(em, { role })));
const seen = async (user: User, athleteId = api.world.athlete.id) =>
  (await (await api.as(user)).get(`/api/athletes/${athleteId}`)).status;

describe('a supervisor', () => {
  it('sees the athletes of the coaches that the owner names, at once', async () => {
    const { coach, otherCoach } = api.world;
    const curlew = await newUser('supervisor');
    expect(await seen(curlew)).toBe(404);
    const { body } = await owner
      .patch(at(curlew))
      .send({ coachIds: [coach.id, otherCoach.id] })
      .expect(200);
    const row = body.people.find((person: { id: string }) => person.id === curlew.id);
    expect(row.coachIds.sort()).toEqual([coach.id, otherCoach.id].sort());
    expect(await seen(curlew)).toBe(200);
    await owner
      .patch(at(curlew))
      .send({ coachIds: [otherCoach.id] })
      .expect(200);
    expect(await seen(curlew)).toBe(404);
  });

  it('who becomes a coach sees nobody else’s athletes, and stays so as supervisor anew', async () => {
    const curlew = await newUser('supervisor');
    await owner
      .patch(at(curlew))
      .send({ coachIds: [api.world.coach.id] })
      .expect(200);
    await owner.patch(at(curlew)).send({ role: 'coach' }).expect(200);
    expect(await seen(curlew)).toBe(404);
    await owner.patch(at(curlew)).send({ role: 'supervisor' }).expect(200);
    expect(await seen(curlew)).toBe(404);
  });

  it('is not assigned to somebody of another practice, to themselves, or as a coach', async () => {
    const { supervisor, coach, foreignCoach, otherCoach } = api.world;
    for (const [user, coachIds] of [
      [supervisor, [foreignCoach.id]],
      [supervisor, [supervisor.id]],
      [otherCoach, [coach.id]],
    ] as const)
      await owner.patch(at(user)).send({ coachIds }).expect(422);
    expect(await seen(supervisor)).toBe(200);
  });
});

describe('deactivating', () => {
  it('ends every session at once and refuses the sign-in like a wrong password', async () => {
    const dunlin = await newUser('coach');
    const session = await api.as(dunlin);
    await session.get('/api/me').expect(200);
    const { body } = await owner.post(at(dunlin, '/deactivate')).expect(200);
    const row = body.people.find((person: { id: string }) => person.id === dunlin.id);
    expect(row.deactivatedAt).not.toBeNull();
    await session.get('/api/me').expect(401);
    const signIn = () =>
      api.nobody.post('/api/sign-in').send({ email: dunlin.email, password: 'a plain test word' });
    expect((await signIn()).body.code).toBe('sign-in-refused');
    await owner.post(at(dunlin, '/reactivate')).expect(200);
    await signIn().expect(200);
    // the sessions of before stay ended
    await session.get('/api/me').expect(401);
  });

  it('keeps the athletes, whom the owner still sees', async () => {
    const dunlin = await newUser('coach');
    const athlete = await api.ground.inPractice(api.world.owner, ({ em }) =>
      Promise.resolve(makeAthlete(em, { coach: dunlin, givenName: 'Tern' })),
    );
    await owner.post(at(dunlin, '/deactivate')).expect(200);
    await owner.get(`/api/athletes/${athlete.id}`).expect(200);
  });
});

describe('somebody who lost phone and recovery codes', () => {
  const reset = (user: User) => owner.post(at(user, '/codes/reset'));

  it('is let in by the password alone, signed out everywhere and told by letter', async () => {
    const { user, here, recoveryCodes } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    const { body } = await reset(user).expect(200);
    expect(body.people).toContainEqual(
      expect.objectContaining({ id: user.id, oneTimeCodes: false }),
    );
    await here.get('/api/me').expect(401);
    // half a sign-in of before is worth nothing
    expect((await secondStep(api, cookie, recoveryCodes[0] ?? '')).status).toBe(401);
    const { answer } = await firstStep(api, user.email);
    expect(answer.body.user.id).toBe(user.id);
    const jobs = await api.ground.inPractice(api.world.owner, ({ em }) =>
      em.find(JobOutbox, { queue: 'send-notice' }),
    );
    expect(jobs.map(({ payload }) => payload)).toContainEqual(
      expect.objectContaining({ userId: user.id, notice: 'codes-reset' }),
    );
  });

  it('is somebody else, with codes: one’s own are turned off where one proves to have them', async () => {
    expect((await reset(api.world.owner).expect(409)).body.code).toBe('not-as-it-stands');
    expect((await reset(await newUser('coach')).expect(409)).body.code).toBe('codes-off');
  });

  it('is let in by an owner alone', async () => {
    const { user, here } = await withCodes(api);
    for (const one of [api.world.coach, api.world.supervisor])
      await (await api.as(one)).post(at(user, '/codes/reset')).expect(403);
    await here.get('/api/me').expect(200);
  });
});

describe('a caseload', () => {
  it('goes over whole, with its visits, to another coach, and from then on only there', async () => {
    const [from, to] = [await newUser('coach'), await newUser('coach')];
    const athletes = await api.ground.inPractice(api.world.owner, ({ em }) =>
      Promise.resolve(
        ['Tern', 'Wren', 'Jay'].map((givenName) => makeAthlete(em, { coach: from, givenName })),
      ),
    );
    const first = athletes[0]?.id ?? '';
    expect([await seen(from, first), await seen(to, first)]).toEqual([200, 404]);
    const { body } = await owner.post(at(from, '/hand-over')).send({ to: to.id }).expect(200);
    const count = (id: string) =>
      body.people.find((person: { id: string }) => person.id === id).athletes;
    expect([count(from.id), count(to.id)]).toEqual([0, 3]);
    for (const { id } of athletes)
      expect([await seen(from, id), await seen(to, id)]).toEqual([404, 200]);
    // an edit that began before meets a newer version
    const late = await (
      await api.as(to)
    )
      .patch(`/api/athletes/${first}`)
      .send({ version: 1, sport: 'x' });
    expect(late.body.code).toBe('edited-meanwhile');
  });

  it('does not go to a supervisor, to the same person, to who is gone, or out of the practice', async () => {
    const { coach, supervisor, foreignCoach } = api.world;
    const gone = await newUser('coach');
    await owner.post(at(gone, '/deactivate')).expect(200);
    for (const to of [supervisor.id, coach.id, gone.id, foreignCoach.id])
      await owner.post(at(coach, '/hand-over')).send({ to }).expect(422);
    expect(await seen(coach)).toBe(200);
  });
});

describe('the last owner', () => {
  it('can be neither deactivated nor made something else', async () => {
    for (const answer of [
      await owner.post(at(api.world.owner, '/deactivate')),
      await owner.patch(at(api.world.owner)).send({ role: 'coach' }),
    ]) {
      expect(answer.status).toBe(409);
      expect(answer.body.code).toBe('last-owner');
    }
    await owner.get('/api/me').expect(200);
  });

  it('stays where two owners put each other out at once', async () => {
    const foreign = await api.as(api.world.foreignOwner);
    const second = await api.ground.inPractice(api.world.foreignOwner, ({ em }) =>
      Promise.resolve(makeUser(em, { role: 'owner' })),
    );
    const other = await api.as(second);
    const answers = await Promise.all([
      foreign.post(at(second, '/deactivate')),
      other.patch(at(api.world.foreignOwner)).send({ role: 'coach' }),
      foreign.patch(at(second)).send({ role: 'supervisor' }),
      other.post(at(api.world.foreignOwner, '/deactivate')),
    ]);
    expect(answers.filter(({ status }) => status === 200).length).toBeGreaterThan(0);
    const { rows } = await asAdmin(
      (client) =>
        client.query<{ n: number }>(
          `select count(*)::int as n from account where practice_id = $1 and role = 'owner' and disabled_at is null`,
          [api.world.foreignPracticeId],
        ),
      new URL(api.ground.config.database.app).pathname.slice(1),
    );
    expect(rows[0]?.n).toBe(1);
  });
});

it('people are changed by owners alone', async () => {
  const { coach, supervisor } = api.world;
  for (const user of [coach, supervisor]) {
    const agent = await api.as(user);
    await agent.patch(at(coach)).send({ role: 'owner' }).expect(403);
    await agent.post(at(coach, '/deactivate')).expect(403);
    await agent.post(at(coach, '/hand-over')).send({ to: user.id }).expect(403);
  }
});
