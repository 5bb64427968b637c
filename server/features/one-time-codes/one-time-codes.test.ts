import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { Route } from '#shared/contracts/route.ts';
import { routes } from '#shared/contracts/routes.ts';
import { asAdmin } from '#tests/support/admin.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { sendNotices } from '#tests/support/letters.ts';
import { bytesOf, codeOf, firstStep, newUser, withCodes } from '#tests/support/one-time-codes.ts';
import { TEST_PASSWORD } from '../accounts/user.factory.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
  // no half minute ends by itself
  vi.useFakeTimers({ toFake: ['Date'], now: Date.now() });
});
afterAll(() => {
  vi.useRealTimers();
  return api.close();
});

const password = TEST_PASSWORD;
const START = '/api/account/codes';
const CONFIRM = '/api/account/codes/confirm';
const RENEW = '/api/account/codes/recovery';
const STOP = '/api/account/codes/stop';

describe('setting up', () => {
  it('gives a secret for the device, and is on with its first code', async () => {
    const user = await newUser(api);
    const [here, there] = [await api.as(user), await api.as(user)];
    expect((await here.post(START).send({ password: 'no' }).expect(403)).body.code).toBe(
      'password-wrong',
    );
    await here.post(CONFIRM).send({ code: '123456' }).expect(401);
    const { body } = await here.post(START).send({ password }).expect(200);
    expect(body.secret).toMatch(/^[A-Z2-7]{32}$/);
    expect(body.uri).toMatch(/^otpauth:\/\/totp\//);
    const uri = new URL(body.uri as string);
    expect(decodeURIComponent(uri.pathname)).toBe(`/Redshank:${user.email}`);
    expect(Object.fromEntries(uri.searchParams)).toEqual({
      secret: body.secret as string,
      issuer: 'Redshank',
    });
    // not on yet
    expect((await firstStep(api, user.email)).answer.body.user.id).toBe(user.id);
    for (const code of ['000000x', codeOf(body.secret as string, 2)])
      expect((await here.post(CONFIRM).send({ code }).expect(401)).body.code).toBe('code-wrong');
    const on = await here.post(CONFIRM).send({ code: codeOf(body.secret as string) });
    expect(on.status).toBe(200);
    expect(new Set(on.body.recoveryCodes).size).toBe(10);
    for (const code of on.body.recoveryCodes as string[])
      expect(code).toMatch(/^([a-z2-7]{4}-){5}[a-z2-7]{4}$/);
    expect((await here.get('/api/account').expect(200)).body.codes).toEqual({
      since: new Date().toISOString(),
      recoveryLeft: 10,
    });
    await there.get('/api/me').expect(401);
    expect((await here.post(START).send({ password }).expect(409)).body.code).toBe('codes-on');
    await here.post(CONFIRM).send({ code: '123456' }).expect(409);
  });

  it('begun again holds with the newest secret alone', async () => {
    const here = await api.as(await newUser(api));
    const begin = async () =>
      (await here.post(START).send({ password }).expect(200)).body.secret as string;
    const [first, second] = [await begin(), await begin()];
    await here
      .post(CONFIRM)
      .send({ code: codeOf(first) })
      .expect(401);
    await here
      .post(CONFIRM)
      .send({ code: codeOf(second) })
      .expect(200);
  });

  it('keeps neither secret nor recovery code as it is', async () => {
    const { user, secret, recoveryCodes } = await withCodes(api);
    const { rows } = await asAdmin(
      (client) =>
        client.query<{ sealed: string; hashes: string }>(
          `select a.code_secret as sealed, string_agg(r.code_hash, ' ') as hashes
           from account a join recovery_code r on r.user_id = a.id where a.id = $1 group by 1`,
          [user.id],
        ),
      new URL(api.ground.config.database.app).pathname.slice(1),
    );
    const { sealed = '', hashes = '' } = rows[0] ?? {};
    expect(sealed).not.toContain(secret);
    expect(Buffer.from(sealed, 'base64url').includes(bytesOf(secret))).toBe(false);
    expect(api.ground.sealer.open(sealed, user.id)).toEqual(bytesOf(secret));
    expect(() => api.ground.sealer.open(sealed, api.world.coach.id)).toThrow();
    expect(hashes.split(' ')).toHaveLength(10);
    for (const code of recoveryCodes) expect(hashes).not.toContain(code.replaceAll('-', ''));
  });

  it('is not guessed at with a borrowed session: ten wrong tries are all', async () => {
    const here = await api.as(await newUser(api));
    for (let n = 0; n < 10; n += 1) await here.post(CONFIRM).send({ code: '000000' }).expect(401);
    await here.post(CONFIRM).send({ code: '000000' }).expect(429);
    await here.post(START).send({ password }).expect(429);
  });
});

describe('turning off and renewing', () => {
  it('asks for password and code', async () => {
    const { user, here, secret, recoveryCodes } = await withCodes(api);
    const [one, two] = recoveryCodes;
    await here.post(RENEW).send({ password, code: 'wrong' }).expect(401);
    await here.post(RENEW).send({ password: 'no', code: one }).expect(403);
    const renewed = await here.post(RENEW).send({ password, code: one }).expect(200);
    const [fresh] = renewed.body.recoveryCodes as string[];
    expect(recoveryCodes).not.toContain(fresh);
    await here.post(STOP).send({ password, code: two }).expect(401);
    await here
      .post(STOP)
      .send({ password: 'no', code: codeOf(secret, 1) })
      .expect(403);
    await here
      .post(STOP)
      .send({ password, code: codeOf(secret) })
      .expect(401);
    await here.post(STOP).send({ password, code: fresh }).expect(204);
    expect((await firstStep(api, user.email)).answer.body.user.id).toBe(user.id);
    expect((await here.get('/api/account')).body.codes).toEqual({ since: null, recoveryLeft: 0 });
    for (const path of [RENEW, STOP])
      expect((await here.post(path).send({ password, code: fresh }).expect(409)).body.code).toBe(
        'codes-off',
      );
  });

  it('stands in the audit trail, and is told to the person by mail', async () => {
    const { user, here, secret, recoveryCodes } = await withCodes(api);
    const [code] = recoveryCodes;
    await here.post(RENEW).send({ password, code }).expect(200);
    await here
      .post(STOP)
      .send({ password, code: codeOf(secret, 1) })
      .expect(204);
    const { rows } = await asAdmin(
      (client) =>
        client.query<{ action: string }>(
          'select action from audit_entry where subject_id = $1 order by at, id',
          [user.id],
        ),
      new URL(api.ground.config.database.app).pathname.slice(1),
    );
    expect(rows.map(({ action }) => action).sort()).toEqual([
      'account.codes-off',
      'account.codes-on',
      'account.recovery',
      'account.recovery-renew',
    ]);
    await sendNotices(api);
    const letters = api.mailbox.filter(({ to }) => to === user.email);
    expect(letters.map(({ subject }) => subject).sort()).toEqual([
      'A recovery code was used',
      'New recovery codes were made',
      'One-time codes are off',
      'One-time codes are on',
    ]);
    for (const { text } of letters) {
      expect(text).toContain('If it was not you');
      expect(text).not.toContain(secret);
      for (const each of recoveryCodes) expect(text).not.toContain(each);
    }
  });
});

describe('a practice that asks its owners for codes', () => {
  it('lets an owner without them do nothing but set them up', async () => {
    const { owner, coach } = api.world;
    const first = await api.as(owner);
    const set = (needed: boolean) => first.put('/api/practice/owners-code').send({ needed });
    expect((await set(true).expect(409)).body.code).toBe('codes-first');
    const { secret } = await withCodes(api, { user: owner, agent: first });
    expect((await set(true).expect(200)).body.ownersNeedCode).toBe(true);

    const second = await api.as(await newUser(api, 'owner'));
    expect((await second.get('/api/me').expect(200)).body.codeMissing).toBe(true);
    const closed = (Object.values(routes) as Route[]).filter(
      ({ audience, beforeCodes }) => audience === 'staff' && !beforeCodes,
    );
    for (const { method, path } of closed) {
      const answer = await second[method](path);
      expect([answer.status, answer.body.code], path).toEqual([403, 'codes-needed']);
    }
    for (const user of [coach, api.world.foreignOwner])
      await (await api.as(user)).get('/api/athletes').expect(200);

    const { body } = await second.post(START).send({ password }).expect(200);
    await second
      .post(CONFIRM)
      .send({ code: codeOf(body.secret as string) })
      .expect(200);
    expect((await second.get('/api/me')).body.codeMissing).toBe(false);
    await second.get('/api/athletes').expect(200);

    const stop = await first.post(STOP).send({ password, code: codeOf(secret, 1) });
    expect([stop.status, stop.body.code]).toEqual([403, 'codes-needed']);
    await set(false).expect(200);
    await first
      .post(STOP)
      .send({ password, code: codeOf(secret, 1) })
      .expect(204);
  });

  it('leaves open before them who one is, their set-up and the way out, and nothing else', () => {
    const open = (Object.values(routes) as Route[]).filter(({ beforeCodes }) => beforeCodes);
    expect(open.map(({ path }) => path).sort()).toEqual([
      START,
      CONFIRM,
      '/api/me',
      '/api/sign-out-everywhere',
    ]);
  });

  it('is the owner’s to say', async () => {
    for (const user of [api.world.coach, api.world.supervisor])
      await (
        await api.as(user)
      )
        .put('/api/practice/owners-code')
        .send({ needed: false })
        .expect(403);
  });
});
