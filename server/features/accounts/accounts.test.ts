import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';
import { TEST_PASSWORD } from './user.factory.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const signIn = (email: string, password = TEST_PASSWORD) =>
  api.nobody.post('/api/sign-in').send({ email, password });

describe('signing in', () => {
  it('opens a session with an httpOnly cookie that says who it is', async () => {
    const { coach, practiceId } = api.world;
    const answer = await signIn(coach.email.toUpperCase()).expect(200);
    expect(answer.body.user).toEqual({
      id: coach.id,
      name: coach.name,
      email: coach.email,
      role: 'coach',
    });
    expect(answer.body.practice.id).toBe(practiceId);
    const cookie = String(answer.headers['set-cookie']);
    expect(cookie).toContain('HttpOnly');
    expect(cookie).toContain('SameSite=Lax');
    const me = await api.nobody.get('/api/me').set('Cookie', cookie.split(';')[0] ?? '');
    expect(me.body).toEqual(answer.body);
  });

  it('ends the session that this browser had until then, whoever it was of', async () => {
    const { coach, supervisor } = api.world;
    const cookieOf = (answer: { headers: Record<string, unknown> }) =>
      String(answer.headers['set-cookie']).split(';')[0] ?? '';
    const mine = cookieOf(await signIn(coach.email).expect(200));
    const elsewhere = cookieOf(await signIn(coach.email).expect(200));
    const me = (cookie: string) => api.nobody.get('/api/me').set('Cookie', cookie);

    const refused = signIn(coach.email, 'not the word').set('Cookie', mine);
    await refused.expect(401);
    await me(mine).expect(200);

    const next = await signIn(supervisor.email).set('Cookie', mine).expect(200);
    expect([next.headers['set-cookie']].flat()).toHaveLength(1);
    await me(mine).expect(401);
    await me(elsewhere).expect(200);
    expect((await me(cookieOf(next)).expect(200)).body.user.id).toBe(supervisor.id);
  });

  it('stands in the audit trail', async () => {
    const { owner, practiceId } = api.world;
    await signIn(owner.email).expect(200);
    const trail = await api.ground.inPractice(product(practiceId), ({ em }) =>
      em.find(AuditEntry, { subjectId: owner.id }),
    );
    expect(trail).toMatchObject([{ action: 'account.sign-in', actor: 'user', byUser: owner.id }]);
  });

  it('answers the same for an unknown address and a wrong password', async () => {
    const wrong = await signIn(api.world.coach.email, 'not the word');
    const unknown = await signIn('nobody@test.example');
    expect(wrong.status).toBe(401);
    const { requestId: _a, ...first } = wrong.body;
    const { requestId: _b, ...second } = unknown.body;
    expect(second).toEqual(first);
    expect(first.code).toBe('sign-in-refused');
  });

  it('reports every fault of what was sent', async () => {
    const answer = await signIn('not an address', '');
    expect(answer.status).toBe(422);
    expect(answer.body.faults.map((fault: { path: string }) => fault.path)).toEqual([
      'body.email',
      'body.password',
    ]);
  });

  it('refuses an account after ten wrong tries, right password or not', async () => {
    const { email } = api.world.otherCoach;
    for (let i = 0; i < 10; i += 1) await signIn(email, 'wrong').expect(401);
    const answer = await signIn(email).expect(429);
    expect(answer.body.code).toBe('too-many-tries');
    expect(answer.headers['retry-after']).toMatch(/^\d+$/);
  });
});

describe('a session', () => {
  it('is asked for', async () => {
    const answer = await api.nobody.get('/api/me').expect(401);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(answer.body.code).toBe('sign-in-needed');
  });

  it('ends with sign-out, and the old cookie is worth nothing', async () => {
    const coach = await api.as(api.world.coach);
    await coach.get('/api/me').expect(200);
    const out = await coach.post('/api/sign-out').expect(204);
    expect(String(out.headers['set-cookie'])).toContain('Max-Age=0');
    await coach.get('/api/me').expect(401);
    await api.nobody.post('/api/sign-out').expect(204);
  });

  it('ends everywhere at once, but not for others', async () => {
    const [phone, tablet, owner] = await Promise.all([
      api.as(api.world.coach),
      api.as(api.world.coach),
      api.as(api.world.owner),
    ]);
    await phone.post('/api/sign-out-everywhere').expect(204);
    await tablet.get('/api/me').expect(401);
    await owner.get('/api/me').expect(200);
  });

  it('is listed and ended one by one, and never somebody else’s', async () => {
    const [here, there] = await Promise.all([api.as(api.world.owner), api.as(api.world.owner)]);
    const { body } = await here.get('/api/sessions').expect(200);
    const rows = body.items as { id: string; current: boolean }[];
    expect(rows.filter((row) => row.current)).toHaveLength(1);
    const other = (await there.get('/api/me')).body.session.id as string;
    expect(rows.map((row) => row.id)).toContain(other);

    const foreigner = await api.as(api.world.foreignOwner);
    await foreigner.delete(`/api/sessions/${other}`).expect(204);
    await there.get('/api/me').expect(200);

    await here.delete(`/api/sessions/${other}`).expect(204);
    await there.get('/api/me').expect(401);
  });
});

describe('a write', () => {
  it('from a foreign page is refused, from a script accepted', async () => {
    const { email } = api.world.foreignCoach;
    const body = { email, password: TEST_PASSWORD };
    const post = () => api.nobody.post('/api/sign-in').send(body);
    await post().set('Origin', 'http://evil.example').expect(403);
    await post().set('Origin', 'null').expect(403);
    await post().set('Sec-Fetch-Site', 'cross-site').expect(403);
    await post().set('Origin', 'http://redshank.test').expect(200);
    await post().expect(200);
  });
});
