import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { TEST_PASSWORD } from '#server/features/accounts/user.factory.ts';
import { newToken } from '#server/http/token-hash.ts';
import { keepSessions } from '#server/http/session.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { tokenTo } from '#tests/support/letters.ts';
import { withCodes } from '#tests/support/one-time-codes.ts';
import { foundInDatabase, query } from '#tests/support/whole-database.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

/** @param with what the browser brings along */
const signIn = (email: string, cookie = '') =>
  api.nobody
    .post('/api/sign-in')
    .set('Cookie', cookie)
    .send({ email, password: TEST_PASSWORD })
    .expect(200);
const cookiesOf = (answer: { get: (name: 'Set-Cookie') => string[] | undefined }) =>
  answer.get('Set-Cookie') ?? [];
/** As the browser sends it back. */
const sent = (cookies: readonly string[]) => cookies.at(-1)?.split(';')[0] ?? '';
const sidOf = (cookie: string): string =>
  (JSON.parse(Buffer.from(cookie.split('.')[1] ?? '', 'base64url').toString()) as { sid: string })
    .sid;
const who = async (cookie: string): Promise<unknown> =>
  (await api.nobody.get('/api/me').set('Cookie', cookie)).body.user?.id;

describe('a session', () => {
  it('is new at every sign-in, whatever the browser brings along', async () => {
    const { coach, owner } = api.world;
    const attackers = sent(cookiesOf(await signIn(owner.email)));
    expect(await who(attackers)).toBe(owner.id);
    const forged = [
      attackers,
      'redshank_session=chosen',
      `redshank_session=${randomUUID()}`,
      `redshank_session=a; ${attackers}`,
      `sid=${randomUUID()}`,
    ];
    const seen = new Set([sidOf(attackers)]);
    for (const planted of forged) {
      const cookies = cookiesOf(await signIn(coach.email, planted));
      const own = sent(cookies);
      expect(seen.has(sidOf(own))).toBe(false);
      seen.add(sidOf(own));
      expect(await who(own)).toBe(coach.id);
    }
    // what the attacker knew has become nobody else’s: it ended when it was brought along
    await api.nobody.get('/api/me').set('Cookie', attackers).expect(401);
  });

  it('is not named in an address or a body: only the cookie opens it', async () => {
    const own = sent(cookiesOf(await signIn(api.world.coach.email)));
    const token = own.slice(own.indexOf('=') + 1);
    for (const path of [`/api/me?redshank_session=${token}`, `/api/me;redshank_session=${token}`])
      expect([401, 404]).toContain((await api.nobody.get(path)).status);
    await api.nobody.get('/api/me').set('Authorization', `Bearer ${token}`).expect(401);
  });

  it('has a cookie that scripts and other sites do not get, and that a browser keeps', async () => {
    const [cookie = '', ...more] = cookiesOf(await signIn(api.world.coach.email));
    expect(more).toEqual([]);
    expect(cookie).toMatch(
      /^redshank_session=[\w.-]+; Max-Age=43200; Path=\/; HttpOnly; SameSite=Lax$/,
    );
    expect(cookie.length).toBeLessThan(4096);
    expect(cookie).not.toMatch(/Domain/i);
    const secure = keepSessions({ db: () => api.ground.orm.em.fork(), key: 'k', secure: true });
    expect(secure.cookieFor(randomUUID())).toMatch(/; Secure;/);
  });

  it('ends at sign-out for the cookie of before, too', async () => {
    const own = sent(cookiesOf(await signIn(api.world.coach.email)));
    await api.nobody.post('/api/sign-out').set('Cookie', own).expect(204);
    expect(await who(own)).toBeUndefined();
  });
});

describe('what is random', () => {
  it('has 256 bits in a link, from the system’s generator', () => {
    const tokens = Array.from({ length: 2000 }, newToken);
    expect(new Set(tokens).size).toBe(tokens.length);
    for (const token of tokens) expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    // every bit is set in about half of them
    const set = Array.from(
      { length: 256 },
      (_, bit) =>
        tokens.filter(
          (token) => ((Buffer.from(token, 'base64url')[bit >> 3] ?? 0) >> (bit & 7)) & 1,
        ).length,
    );
    for (const count of set) expect(Math.abs(count - 1000)).toBeLessThan(150);
  });

  it('stands in the database nowhere as it is handed out', async () => {
    const { coach, otherCoach } = api.world;
    const invited = `${randomUUID()}@test.example`;
    const owner = await api.as(api.world.owner);
    await owner
      .post('/api/practice/invitations')
      .send({ email: invited, role: 'coach' })
      .expect(201);
    await api.nobody.post('/api/forgot').send({ email: coach.email }).expect(204);
    const links = [await tokenTo(api, invited), await tokenTo(api, coach.email)];
    const { secret, recoveryCodes } = await withCodes(api, { user: otherCoach });
    const cookie = sent(cookiesOf(await signIn(coach.email)));
    const handedOut = [
      ...links,
      secret,
      ...recoveryCodes,
      ...recoveryCodes.map((code) => code.replaceAll('-', '')),
      cookie.slice(cookie.indexOf('=') + 1),
      TEST_PASSWORD,
    ];
    expect(await foundInDatabase(api, handedOut)).toEqual([]);
    // and the search finds what is there
    expect(await foundInDatabase(api, [coach.email])).not.toEqual([]);
    const rows = await query(api, 'select distinct length(password_hash) as long from account');
    expect(rows).toEqual([{ long: 60 }]);
  });
});
