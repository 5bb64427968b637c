import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { sendNotices, tokenTo, writeLetters } from '#tests/support/letters.ts';
import type { User } from './user.entity.ts';
import { makeUser, TEST_PASSWORD } from './user.factory.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const NEXT = 'reeds at low water';
const newUser = () =>
  api.ground.inPractice(api.world.owner, ({ em }) =>
    Promise.resolve(makeUser(em, { role: 'coach' })),
  );
const signIn = (email: string, password: string) =>
  api.nobody.post('/api/sign-in').send({ email, password });
const confirm = (token: string) => api.nobody.post('/api/confirm-email').send({ token });

describe('one’s own account', () => {
  it('says who one is, and takes a new name', async () => {
    const user = await newUser();
    const agent = await api.as(user);
    const { body } = await agent.get('/api/account').expect(200);
    expect(body).toEqual({
      name: user.name,
      email: user.email,
      emailChange: null,
      codes: { since: null, recoveryLeft: 0 },
    });
    await agent.patch('/api/account').send({ name: ' ' }).expect(422);
    await agent.patch('/api/account').send({ name: 'Wren Alder' }).expect(200);
    expect((await agent.get('/api/me')).body.user.name).toBe('Wren Alder');
  });
});

describe('a new password', () => {
  it('asks for the present one, and ends every other session', async () => {
    const user = await newUser();
    const [here, there] = [await api.as(user), await api.as(user)];
    const change = (current: string, next = NEXT) =>
      here.post('/api/account/password').send({ current, next });
    expect((await change('not the word').expect(403)).body.code).toBe('password-wrong');
    await change(TEST_PASSWORD, 'short').expect(422);
    await change(TEST_PASSWORD, 'ø'.repeat(40)).expect(422);
    await there.get('/api/me').expect(200);
    await change(TEST_PASSWORD).expect(204);
    await here.get('/api/me').expect(200);
    await there.get('/api/me').expect(401);
    await signIn(user.email, TEST_PASSWORD).expect(401);
    await signIn(user.email, NEXT).expect(200);
  });

  it('is told to the address of the account, and a refused one to nobody', async () => {
    const user = await newUser();
    const agent = await api.as(user);
    const letters = async () => {
      await sendNotices(api);
      return api.mailbox.filter(({ to }) => to === user.email);
    };
    const change = (current: string) =>
      agent.post('/api/account/password').send({ current, next: NEXT });
    await change('not the word').expect(403);
    expect(await letters()).toEqual([]);
    await change(TEST_PASSWORD).expect(204);
    const [letter] = await letters();
    expect(letter?.subject).toBe('Your Redshank password was changed');
    expect(letter?.text).toContain('http://redshank.test/forgot');
    expect(letter?.text).not.toContain(NEXT);
  });

  it('is not guessed at with a borrowed session: ten wrong tries are all', async () => {
    const agent = await api.as(await newUser());
    const wrong = () => agent.post('/api/account/password').send({ current: 'no', next: NEXT });
    for (let n = 0; n < 10; n += 1) await wrong().expect(403);
    await wrong().expect(429);
  });
});

describe('another e-mail address', () => {
  const ask = async (user: User, email: string) => {
    const agent = await api.as(user);
    const { body } = await agent
      .post('/api/account/email')
      .send({ email, password: TEST_PASSWORD })
      .expect(200);
    return { agent, body };
  };

  it.each(['old first', 'new first'])('holds once both addresses confirmed, %s', async (order) => {
    const user = await newUser();
    const email = `moved-${user.id}@test.example`;
    const { agent, body } = await ask(user, email);
    expect(body.emailChange).toMatchObject({
      to: email,
      confirmedFromOld: false,
      confirmedFromNew: false,
    });
    const tokens = [await tokenTo(api, user.email), await tokenTo(api, email)];
    if (order === 'new first') tokens.reverse();
    const [first = '', second = ''] = tokens;
    expect((await confirm(first).expect(200)).body).toEqual({ done: false });
    await confirm(first).expect(410);
    expect((await agent.get('/api/account')).body).toMatchObject({
      email: user.email,
      emailChange: { confirmedFromOld: order === 'old first' },
    });
    expect((await confirm(second).expect(200)).body).toEqual({ done: true });
    expect((await agent.get('/api/account')).body).toMatchObject({ email, emailChange: null });
    await signIn(user.email, TEST_PASSWORD).expect(401);
    await signIn(email, TEST_PASSWORD).expect(200);
  });

  it('holds too where both confirm at the same moment', async () => {
    const user = await newUser();
    const email = `both-${user.id}@test.example`;
    await ask(user, email);
    const tokens = [await tokenTo(api, user.email), await tokenTo(api, email)];
    const answers = await Promise.all(tokens.map((token) => confirm(token)));
    expect(answers.map(({ body }) => body.done as boolean).sort()).toEqual([false, true]);
    await signIn(email, TEST_PASSWORD).expect(200);
  });

  it('is dropped, or replaced by another wish: the links of before open nothing', async () => {
    const user = await newUser();
    const { agent } = await ask(user, `one-${user.id}@test.example`);
    const first = await tokenTo(api, user.email);
    await ask(user, `two-${user.id}@test.example`);
    await confirm(first).expect(410);
    const second = await tokenTo(api, user.email);
    const { body } = await agent.delete('/api/account/email').expect(200);
    expect(body.emailChange).toBeNull();
    await confirm(second).expect(410);
  });

  it('of somebody else answers the same, and only its holder is told', async () => {
    const user = await newUser();
    const { email } = api.world.foreignCoach;
    const { body } = await ask(user, email);
    const free = await ask(user, 'free@test.example');
    expect(Object.keys(body.emailChange)).toEqual(Object.keys(free.body.emailChange));
    await ask(user, email);
    await writeLetters(api);
    const letter = api.mailbox.findLast(({ to }) => to === email);
    expect(letter?.subject).toBe('You have a Redshank account already');
    expect(letter?.text).not.toContain('/confirm-email/');
  });

  it('asks for the password', async () => {
    const agent = await api.as(await newUser());
    await agent
      .post('/api/account/email')
      .send({ email: 'x@test.example', password: 'not the word' })
      .expect(403);
  });
});
