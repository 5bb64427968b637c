import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { asAdmin } from '#tests/support/admin.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { sendNotices, tokenTo, writeLetters } from '#tests/support/letters.ts';
import { newToken } from '../../http/token-hash.ts';
import { TEST_PASSWORD } from '../accounts/user.factory.ts';

const NEW_PASSWORD = 'reeds at low water';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const sql = (text: string, values: unknown[] = []) =>
  asAdmin(
    (client) => client.query<Record<string, unknown>>(text, values),
    new URL(api.ground.config.database.app).pathname.slice(1),
  );
const forget = (email: string) => api.nobody.post('/api/forgot').send({ email }).expect(204);
const reset = (token: string, password = NEW_PASSWORD) =>
  api.nobody.post('/api/reset').send({ token, password });
const signIn = (email: string, password: string) =>
  api.nobody.post('/api/sign-in').send({ email, password });
const start = (email: string) =>
  api.nobody
    .post('/api/start')
    .send({ email, name: 'Wren Alder', practiceName: 'Saltmarsh Lane' })
    .expect(204);
const join = (token: string) =>
  api.nobody.post('/api/join').send({ token, name: 'Wren Alder', password: NEW_PASSWORD });

describe('a forgotten password', () => {
  it('is set anew by the letter’s link, and every session ends', async () => {
    const { coach } = api.world;
    const before = await api.as(coach);
    await forget(coach.email.toUpperCase());
    const token = await tokenTo(api, coach.email);
    await before.get('/api/me').expect(200);
    await reset(token).expect(204);
    await before.get('/api/me').expect(401);
    await signIn(coach.email, TEST_PASSWORD).expect(401);
    await signIn(coach.email, NEW_PASSWORD).expect(200);
    await sendNotices(api);
    expect(api.mailbox.at(-1)).toMatchObject({
      to: coach.email,
      subject: 'Your Redshank password was changed',
    });
  });

  it('of nobody is asked for with the same answer and the same rows, and no letter goes out', async () => {
    const { otherCoach } = api.world;
    const rows = async () => {
      const links = await sql('select count(*)::int as n from mail_link');
      const jobs = await sql('select count(*)::int as n from job_outbox');
      return [links.rows[0]?.n, jobs.rows[0]?.n] as [number, number];
    };
    const grown = async (email: string) => {
      const [links, jobs] = await rows();
      const answer = await forget(email);
      const [linksAfter, jobsAfter] = await rows();
      expect([linksAfter - links, jobsAfter - jobs]).toEqual([1, 1]);
      const { 'x-request-id': _id, date: _date, ...headers } = answer.headers;
      delete headers['ratelimit'];
      return { status: answer.status, text: answer.text, headers };
    };
    expect(await grown('nobody@test.example')).toEqual(await grown(otherCoach.email));
    const sent = api.mailbox.length;
    await writeLetters(api);
    expect(api.mailbox.slice(sent).map(({ to }) => to)).toEqual([otherCoach.email]);
  });

  it('keeps no token: the table holds hashes alone', async () => {
    const { owner } = api.world;
    await forget(owner.email);
    const token = await tokenTo(api, owner.email);
    const { rows } = await sql('select row_to_json(l)::text as all from mail_link l');
    expect(rows.length).toBeGreaterThan(0);
    expect(rows.some((row) => String(row.all).includes(token))).toBe(false);
    expect(token).toMatch(/^[\w-]{43}$/);
  });

  it('of a deactivated account gets no letter', async () => {
    const { foreignCoach } = api.world;
    await sql('update account set disabled_at = now() where id = $1', [foreignCoach.id]);
    await forget(foreignCoach.email);
    await expect(tokenTo(api, foreignCoach.email)).rejects.toThrow('no link was sent');
    await sql('update account set disabled_at = null where id = $1', [foreignCoach.id]);
  });

  it('is asked for five times in an hour, known or not', async () => {
    for (const email of ['flood@test.example', api.world.foreignOwner.email]) {
      for (let n = 0; n < 5; n += 1) await forget(email);
      const answer = await api.nobody.post('/api/forgot').send({ email }).expect(429);
      expect(answer.body.code).toBe('too-many-tries');
    }
  });
});

describe('a link that opens nothing', () => {
  const dead: Record<string, () => Promise<string>> = {
    'never made': () => Promise.resolve(newToken()),
    malformed: () => Promise.resolve('../../%00 not a token'),
    empty: () => Promise.resolve(''),
    used: async () => {
      const email = `used-${randomUUID()}@test.example`;
      await start(email);
      const token = await tokenTo(api, email);
      await join(token).expect(201);
      return token;
    },
    expired: async () => {
      const email = `late-${randomUUID()}@test.example`;
      await start(email);
      const token = await tokenTo(api, email);
      await sql(`update mail_link set expires_at = now() where email = $1`, [email]);
      return token;
    },
    withdrawn: async () => {
      const email = `withdrawn-${randomUUID()}@test.example`;
      const owner = await api.as(api.world.owner);
      const { body } = await owner
        .post('/api/practice/invitations')
        .send({ email, role: 'coach' })
        .expect(201);
      const token = await tokenTo(api, email);
      const { id } = body.invitations.find((row: { email: string }) => row.email === email);
      await owner.delete(`/api/practice/invitations/${id}`).expect(204);
      return token;
    },
    'replaced by a newer letter': async () => {
      const email = `twice-${randomUUID()}@test.example`;
      const owner = await api.as(api.world.owner);
      const invite = () =>
        owner.post('/api/practice/invitations').send({ email, role: 'coach' }).expect(201);
      await invite();
      const token = await tokenTo(api, email);
      await invite();
      return token;
    },
  };

  it.each(Object.keys(dead))('%s: everywhere the same answer', async (kind) => {
    const token = await dead[kind]?.();
    const answers = [
      await api.nobody.post('/api/mail-links/look').send({ token }),
      await join(token ?? ''),
      await reset(token ?? ''),
    ];
    for (const { status, body } of answers) {
      const { requestId: _, ...said } = body;
      expect({ status, ...said }).toEqual({
        status: 410,
        type: 'urn:redshank:problem:link-gone',
        code: 'link-gone',
        title: expect.stringContaining('does not work any more') as unknown,
      });
    }
  });

  it('is one of another purpose: a new password is not set by an invitation, nor the reverse', async () => {
    const email = `purpose-${randomUUID()}@test.example`;
    await start(email);
    const invitation = await tokenTo(api, email);
    await reset(invitation).expect(410);
    await forget(api.world.supervisor.email);
    const forgotten = await tokenTo(api, api.world.supervisor.email);
    await join(forgotten).expect(410);
    // neither was used up by that
    await join(invitation).expect(201);
    await reset(forgotten).expect(204);
  });
});

describe('a link', () => {
  it('is looked at as often as one likes, and used once, by two at once too', async () => {
    const email = `once-${randomUUID()}@test.example`;
    await start(email);
    const token = await tokenTo(api, email);
    for (let n = 0; n < 2; n += 1) {
      const { body } = await api.nobody.post('/api/mail-links/look').send({ token }).expect(200);
      expect(body).toMatchObject({ kind: 'start', email, practiceName: 'Saltmarsh Lane' });
    }
    const answers = await Promise.all([join(token), join(token)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 410]);
  });

  it('is as before where what it was to do failed', async () => {
    await forget(api.world.otherCoach.email);
    const token = await tokenTo(api, api.world.otherCoach.email);
    const { body } = await reset(token, 'short').expect(422);
    expect(body.faults[0]).toMatchObject({ path: 'body.password' });
    await reset(token).expect(204);
  });

  it('of a new password ends the earlier ones of that account', async () => {
    const { email } = api.world.foreignCoach;
    await forget(email);
    const earlier = await tokenTo(api, email);
    await forget(email);
    const later = await tokenTo(api, email);
    await reset(later).expect(204);
    await reset(earlier).expect(410);
  });
});

describe('a new practice', () => {
  it('begins with its owner, who sees nothing of others', async () => {
    const email = `owner-${randomUUID()}@test.example`;
    await start(email);
    const answer = await join(await tokenTo(api, email)).expect(201);
    expect(answer.body).toMatchObject({
      user: { name: 'Wren Alder', email, role: 'owner' },
      practice: { name: 'Saltmarsh Lane' },
    });
    const cookie = String(answer.headers['set-cookie']).split(';')[0] ?? '';
    const people = await api.nobody.get('/api/practice/people').set('Cookie', cookie).expect(200);
    expect(people.body.people).toHaveLength(1);
    const athletes = await api.nobody.get('/api/athletes').set('Cookie', cookie).expect(200);
    expect(athletes.body.total).toBe(0);
  });

  it('is not started twice with one address: only its holder is told why', async () => {
    const { owner } = api.world;
    await start(owner.email);
    await writeLetters(api);
    const letter = api.mailbox.at(-1);
    expect(letter?.to).toBe(owner.email);
    expect(letter?.subject).toBe('You have a Redshank account already');
    expect(letter?.text).not.toContain('/join/');
  });
});
