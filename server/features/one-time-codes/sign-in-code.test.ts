import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { Route } from '#shared/contracts/route.ts';
import { routes } from '#shared/contracts/routes.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import {
  bytesOf,
  codeOf,
  firstStep,
  secondStep,
  withCodes,
} from '#tests/support/one-time-codes.ts';
import { product } from '../../db/in-practice.ts';
import { sealWith } from '../../main/sealer.ts';
import { User } from '../accounts/user.entity.ts';
import { TEST_PASSWORD } from '../accounts/user.factory.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';

const MINUTE = 60_000;

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

/** The answer to each second step of one person, in order. */
const tried = async (cookie: string, ...codes: string[]) => {
  const answers: string[] = [];
  for (const code of codes) {
    const { status, body } = await secondStep(api, cookie, code);
    answers.push(status === 200 ? 'in' : (body.code as string));
  }
  return answers;
};
const trailOf = async (userId: string) =>
  (
    await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.find(AuditEntry, { subjectId: userId }),
    )
  ).map(({ action }) => action);

describe('a sign-in that is half done', () => {
  it('has a cookie of its own, for the second step alone', async () => {
    const { user } = await withCodes(api);
    const { answer, cookies } = await firstStep(api, user.email);
    expect(answer.status).toBe(200);
    expect(answer.body).toEqual({ codeNeeded: true });
    expect(cookies).toHaveLength(1);
    expect(cookies[0]).toMatch(
      /^__Secure-redshank_half=[\w-]+; Max-Age=300; Path=\/api\/sign-in\/code; HttpOnly; Secure; SameSite=Strict$/,
    );
  });

  it('opens no route, under its own name or a session’s', async () => {
    const { user } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    const session = `redshank_session=${cookie.slice(cookie.indexOf('=') + 1)}`;
    const staff = (Object.values(routes) as Route[]).filter(({ audience }) => audience === 'staff');
    expect(staff.length).toBeGreaterThan(50);
    for (const { method, path } of staff)
      for (const sent of [cookie, session]) {
        const answer = await api.nobody[method](path).set('Cookie', sent);
        expect([answer.status, answer.body.code], path).toEqual([401, 'sign-in-needed']);
      }
  });

  it('is over after five minutes', async () => {
    const { user, recoveryCodes } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    const [code = ''] = recoveryCodes;
    const now = Date.now();
    vi.setSystemTime(now + 5 * MINUTE);
    expect(await tried(cookie, code)).toEqual(['half-gone']);
    vi.setSystemTime(now + 5 * MINUTE - 1);
    expect(await tried(cookie, code)).toEqual(['in']);
  });

  it('begins anew where it is missing or forged, or after the password or the codes were changed', async () => {
    const { user, secret } = await withCodes(api);
    const next = codeOf(secret, 1);
    for (const cookie of [
      '',
      '__Secure-redshank_half=x',
      `__Secure-redshank_half=${'A'.repeat(200)}`,
    ])
      expect(await tried(cookie, next)).toEqual(['half-gone']);
    const { cookie } = await firstStep(api, user.email);
    const change = (data: object) =>
      api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
        em.nativeUpdate(User, { id: user.id }, data),
      );
    await change({ codesSince: null });
    expect(await tried(cookie, next)).toEqual(['half-gone']);
    await change({ codesSince: new Date(), passwordHash: '$2b$04$other' });
    expect(await tried(cookie, next)).toEqual(['half-gone']);
    await change({ disabledAt: new Date() });
    expect(await tried(cookie, next)).toEqual(['half-gone']);
  });

  it('says nothing of codes to who does not know the password', async () => {
    const { user } = await withCodes(api);
    const said = async (email: string) => {
      const { answer, cookies } = await firstStep(api, email, 'not the word');
      const { requestId: _, ...body } = answer.body;
      return { status: answer.status, body, cookies };
    };
    expect(await said(user.email)).toEqual(await said('nobody@test.example'));
  });
});

describe('the second step', () => {
  it('opens a new session and ends the half way', async () => {
    const { user, secret } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    const planted = 'redshank_session=planted';
    const code = codeOf(secret, 1);
    const answer = await secondStep(
      api,
      `${cookie}; ${planted}`,
      ` ${code.slice(0, 3)} ${code.slice(3)}`,
    ).expect(200);
    expect(answer.body).toMatchObject({ user: { id: user.id }, codeMissing: false });
    const cookies = answer.get('Set-Cookie') ?? [];
    expect(cookies[0]).toMatch(/^__Secure-redshank_half=; Max-Age=0; Path=\/api\/sign-in\/code;/);
    const session = cookies[1]?.split(';')[0] ?? '';
    expect(session).toMatch(/^redshank_session=.{50}/);
    const { body } = await api.nobody.get('/api/me').set('Cookie', session).expect(200);
    expect(body).toEqual(answer.body);
  });

  it('takes each code of the device once, and none older than one it took', async () => {
    const { user, secret } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    const [before, now, next] = [codeOf(secret, -1), codeOf(secret), codeOf(secret, 1)];
    expect(await tried(cookie, now, before, next, next)).toEqual([
      'code-wrong',
      'code-wrong',
      'in',
      'code-wrong',
    ]);
  });

  it('lets a clock be half a minute off, and no more', async () => {
    const { user, secret } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    vi.setSystemTime(Date.now() + 2 * MINUTE);
    expect(await tried(cookie, codeOf(secret, -2), codeOf(secret, 2), codeOf(secret, -1))).toEqual([
      'code-wrong',
      'code-wrong',
      'in',
    ]);
    expect(await tried(cookie, codeOf(secret, 1))).toEqual(['in']);
  });

  it('takes one code that comes twice at once, once', async () => {
    const { user, secret, recoveryCodes } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    for (const code of [codeOf(secret, 1), recoveryCodes[0] ?? '']) {
      const both = [secondStep(api, cookie, code), secondStep(api, cookie, code)];
      expect((await Promise.all(both)).map(({ status }) => status).sort()).toEqual([200, 401]);
    }
  });

  it('takes each recovery code once, however it is written, and nobody else’s', async () => {
    const [{ user, recoveryCodes }, other] = [await withCodes(api), await withCodes(api)];
    const { cookie } = await firstStep(api, user.email);
    const [code = '', second = ''] = recoveryCodes;
    const written = ` ${code.toUpperCase().replaceAll('-', ' ')} `;
    expect(await tried(cookie, other.recoveryCodes[0] ?? '', written, code, second)).toEqual([
      'code-wrong',
      'in',
      'code-wrong',
      'in',
    ]);
    expect((await trailOf(user.id)).sort()).toEqual([
      'account.code-refused',
      'account.code-refused',
      'account.codes-on',
      'account.recovery',
      'account.recovery',
      'account.sign-in',
      'account.sign-in',
    ]);
  });

  it('refuses a right code after five wrong ones, from a new first step too', async () => {
    const { user, secret } = await withCodes(api);
    const { cookie } = await firstStep(api, user.email);
    expect(await tried(cookie, ...Array<string>(5).fill('wrong'))).toEqual(
      Array(5).fill('code-wrong'),
    );
    const again = await firstStep(api, user.email);
    expect(await tried(again.cookie, codeOf(secret, 1))).toEqual(['too-many-tries']);
    // nobody else is held up by it
    const other = await withCodes(api);
    const half = await firstStep(api, other.user.email);
    expect(await tried(half.cookie, codeOf(other.secret, 1))).toEqual(['in']);
  });
});

describe('after the sealing key was changed', () => {
  it('no device fits any more, a recovery code lets in, and codes are set up anew', async () => {
    const { user, secret, recoveryCodes } = await withCodes(api);
    const [first = '', second = ''] = recoveryCodes;
    const codeSecret = sealWith('the key of before').seal(bytesOf(secret), user.id);
    await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.nativeUpdate(User, { id: user.id }, { codeSecret }),
    );
    const { cookie } = await firstStep(api, user.email);
    expect(await tried(cookie, codeOf(secret, 1), first)).toEqual(['code-wrong', 'in']);

    const here = await api.as(user);
    await here
      .post('/api/account/codes/stop')
      .send({ password: TEST_PASSWORD, code: second })
      .expect(204);
    const anew = await withCodes(api, { user, agent: here });
    const next = await firstStep(api, user.email);
    expect(await tried(next.cookie, codeOf(anew.secret, 1))).toEqual(['in']);
  });
});
