import type { User } from '#server/features/accounts/user.entity.ts';
import { makeUser, TEST_PASSWORD } from '#server/features/accounts/user.factory.ts';
import { totp } from '#server/features/one-time-codes/totp.ts';
import type { Api } from './api.ts';

type Agent = Awaited<ReturnType<Api['as']>>;

const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';

/** As an authenticator reads a secret. */
export const bytesOf = (secret: string): Buffer => {
  const bits = [...secret].map((letter) => ALPHABET.indexOf(letter).toString(2).padStart(5, '0'));
  return Buffer.from((bits.join('').match(/.{8}/g) ?? []).map((byte) => Number.parseInt(byte, 2)));
};

/** What an authenticator shows now, or some steps of half a minute off. */
export const codeOf = (secret: string, stepsOff = 0): string =>
  totp(bytesOf(secret), Date.now() / 1000 + 30 * stepsOff);

export const newUser = (api: Api, role: User['role'] = 'coach'): Promise<User> =>
  api.ground.inPractice(api.world.owner, ({ em }) => Promise.resolve(makeUser(em, { role })));

/** Somebody with codes on. The code of this half minute is used up by that, not the coming one. */
export const withCodes = async (api: Api, given: { user?: User; agent?: Agent } = {}) => {
  const user = given.user ?? (await newUser(api));
  const here = given.agent ?? (await api.as(user));
  const begun = await here.post('/api/account/codes').send({ password: TEST_PASSWORD }).expect(200);
  const { secret } = begun.body as { secret: string };
  const on = await here
    .post('/api/account/codes/confirm')
    .send({ code: codeOf(secret) })
    .expect(200);
  const { recoveryCodes } = on.body as { recoveryCodes: string[] };
  return { user, here, secret, recoveryCodes };
};

/** The first step of a sign-in, and the cookies that it sets. */
export const firstStep = async (api: Api, email: string, password = TEST_PASSWORD) => {
  const answer = await api.nobody.post('/api/sign-in').send({ email, password });
  const cookies = answer.get('Set-Cookie') ?? [];
  return { answer, cookie: cookies.map((each) => each.split(';')[0]).join('; '), cookies };
};

export const secondStep = (api: Api, cookie: string, code: string) =>
  api.nobody.post('/api/sign-in/code').set('Cookie', cookie).send({ code });
