import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { product } from '#server/db/in-practice.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { TEST_PASSWORD } from '../accounts/user.factory.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { audit } from './audit.ts';
import { AuditEntry } from './audit-entry.entity.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let clipId: string;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const { visit, coach: uploadedBy } = api.world;
  const clip = await api.ground.inPractice(uploadedBy, ({ em }) =>
    Promise.resolve(makeClip(em, { visit, uploadedBy })),
  );
  clipId = clip.id;
});
afterAll(() => api.close());

const trail = (where: object, practiceId = api.world.practiceId): Promise<AuditEntry[]> =>
  api.ground.inPractice(product(practiceId), ({ em }) =>
    em.find(AuditEntry, where, { orderBy: { at: 'asc', id: 'asc' } }),
  );

describe('what is written down', () => {
  it('says who, in which role, whom it concerns, in which sign-in and from which network', async () => {
    const { athlete, coach: user } = api.world;
    const answer = await coach.patch(`/api/athletes/${athlete.id}`).send({
      version: 1,
      sport: 'Hurdles',
    });
    expect(answer.status).toBe(200);
    const [entry] = await trail({ action: 'athlete.edit' });
    expect(entry).toMatchObject({
      actor: 'user',
      byUser: user.id,
      role: 'coach',
      athleteId: athlete.id,
      subject: 'athlete',
      subjectId: athlete.id,
      detail: { fields: 'sport' },
      requestId: answer.headers['x-request-id'],
      network: expect.stringMatching(/^(127\.0\.0\.0\/24|0:0:0::\/48)$/) as string,
    });
    expect(entry?.sessionId).toMatch(/^[0-9a-f-]{36}$/);
    expect(JSON.stringify(entry)).not.toContain('Hurdles');
  });

  it('is undone with what was done', async () => {
    const { coach: actor } = api.world;
    const id = randomUUID();
    await expect(
      api.ground.inPractice(actor, async ({ em }) => {
        audit({ em, actor: { kind: 'product' } }, 'set-up.delete', id);
        await em.flush();
        throw new Error('The rest failed.');
      }),
    ).rejects.toThrow('The rest failed.');
    expect(await trail({ subjectId: id })).toEqual([]);
  });

  it('takes no words and no names', async () => {
    for (const as of ['Robin Test', 'She hopped.', 'ø'])
      await expect(
        api.ground.inPractice(product(api.world.practiceId), ({ em }) => {
          audit({ em, actor: { kind: 'product' } }, 'set-up.delete', randomUUID(), { as });
          return Promise.resolve();
        }),
      ).rejects.toThrow(/ids, codes and counts/);
  });

  it('of signing in and out, and of a wrong password, stands there', async () => {
    const { supervisor } = api.world;
    const signIn = (password: string) =>
      api.nobody.post('/api/sign-in').send({ email: supervisor.email, password });
    await signIn('not the word').expect(401);
    const cookie = String((await signIn(TEST_PASSWORD).expect(200)).headers['set-cookie']);
    await api.nobody
      .post('/api/sign-out')
      .set('Cookie', cookie.split(';')[0] ?? '')
      .expect(204);
    await vi.waitFor(async () => {
      const entries = await trail({ subjectId: supervisor.id });
      expect(entries.map(({ action, actor, role }) => [action, actor, role]).sort()).toEqual([
        ['account.sign-in', 'user', 'supervisor'],
        ['account.sign-in-refused', 'nobody', null],
        ['account.sign-out', 'user', 'supervisor'],
      ]);
    });
  });

  it('of looking at a clip stands there once in a session, however many requests it takes', async () => {
    // the file itself is not there; that it was asked for counts
    const look = (who: typeof coach) => who.get(`/api/clips/${clipId}/video`).expect(503);
    await Promise.all([look(coach), look(coach), look(coach)]);
    await look(coach);
    await coach.get(`/api/clips/${clipId}/frames/1`).expect(409);
    await look(await api.as(api.world.supervisor));
    const looks = await trail({ action: 'clip.open', subjectId: clipId });
    expect(looks.map(({ byUser }) => byUser).sort()).toEqual(
      [api.world.coach.id, api.world.supervisor.id].sort(),
    );
    expect(looks[0]?.athleteId).toBe(api.world.athlete.id);
  });
});

describe('a refused attempt', () => {
  it('on another’s athlete stands there once an hour, and on another practice’s nowhere', async () => {
    const { otherCoach, athlete, foreignCoach, foreignPracticeId } = api.world;
    const other = await api.as(otherCoach);
    for (let time = 0; time < 3; time += 1)
      await other.get(`/api/athletes/${athlete.id}`).expect(404);
    await other.post(`/api/athletes/${athlete.id}/visits`).send({}).expect(404);
    await (await api.as(foreignCoach)).get(`/api/athletes/${athlete.id}`).expect(404);
    const refused = await trail({ action: 'access.refuse', byUser: otherCoach.id });
    expect(refused.map(({ detail }) => detail)).toEqual([
      { tried: 'athlete.read' },
      { tried: 'visit.add' },
    ]);
    expect(refused[0]).toMatchObject({ athleteId: athlete.id, subjectId: athlete.id });
    expect(await trail({ action: 'access.refuse' }, foreignPracticeId)).toEqual([]);
    expect(await trail({ byUser: foreignCoach.id })).toEqual([]);
  });

  it('by role stands there too', async () => {
    const supervisor = await api.as(api.world.supervisor);
    await supervisor
      .patch(`/api/athletes/${api.world.athlete.id}`)
      .send({ version: 1 })
      .expect(403);
    expect(await trail({ action: 'access.refuse', byUser: api.world.supervisor.id })).toMatchObject(
      [{ detail: { tried: 'athlete.edit' }, role: 'supervisor' }],
    );
  });

  it('fills no more than sixty lines an hour', async () => {
    const { otherCoach, coach: uploadedBy, visit, practiceId } = api.world;
    const clips = await api.ground.inPractice(product(practiceId), ({ em }) =>
      Promise.resolve(Array.from({ length: 65 }, () => makeClip(em, { visit, uploadedBy }).id)),
    );
    const other = await api.as(otherCoach);
    for (const id of clips) await other.get(`/api/clips/${id}`).expect(404);
    expect(await trail({ action: 'access.refuse', byUser: otherCoach.id })).toHaveLength(60);
  });
});
