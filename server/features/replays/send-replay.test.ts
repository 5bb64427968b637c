import { Writable } from 'node:stream';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { makeApp } from '#server/http/app.ts';
import { makeLog } from '#server/http/logging.ts';
import { tokenHash } from '#server/http/token-hash.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';
import { foundInDatabase } from '#tests/support/whole-database.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';
import { Replay } from './replay.entity.ts';

const GUARDIAN = 'guardian.of.wren@test.example';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

/** A link that was just made, with its token, of an athlete of their own. */
const made = async ({ expiresAt = new Date(Date.now() + 1e8) } = {}) => {
  const { replay: id, consent } = await makeOneOfEach(api);
  const token = Buffer.from(id).toString('base64url').slice(0, 43);
  await api.ground.inPractice(api.world.coach, ({ em }) =>
    em.nativeUpdate(Replay, { id }, { tokenHash: tokenHash(token), expiresAt }),
  );
  return { id, token, consent };
};

const send = (
  { id, token }: { id: string; token: string },
  email = GUARDIAN,
  agent: Pick<typeof coach, 'post'> = coach,
) => agent.post(`/api/replays/${id}/letter`).send({ token, email });

it('puts the address into a letter that says nothing of what was seen', async () => {
  const link = await made();
  await send(link).expect(204);
  const letter = api.mailbox.at(-1);
  expect(letter?.to).toBe(GUARDIAN);
  expect(letter?.text).toContain(`http://redshank.test/r/${link.token}\n`);
  expect(letter?.text).not.toContain('pass phrase');
  const said = `${letter?.subject} ${letter?.text}`;
  for (const word of [/Wren/, /early/i, /right/i, /hip/i]) expect(said).not.toMatch(word);
});

it('says that a pass phrase is asked for, and not which', async () => {
  const link = await made();
  await api.ground.inPractice(api.world.coach, ({ em }) =>
    em.nativeUpdate(Replay, { id: link.id }, { passPhraseHash: 'a hash' }),
  );
  await send(link).expect(204);
  expect(api.mailbox.at(-1)?.text).toMatch(/It asks for a pass phrase, which .+ tells you/);
  expect(api.mailbox.at(-1)?.text).not.toContain('a hash');
});

it('keeps neither address, and writes down that it was sent', async () => {
  const link = await made();
  await send(link).expect(204);
  expect(await foundInDatabase(api, [link.token, GUARDIAN])).toEqual([]);
  const entries = await api.ground.inPractice(api.world.owner, ({ em }) =>
    em.find(AuditEntry, { action: 'replay.send', subjectId: link.id }),
  );
  expect(entries).toHaveLength(1);
  expect(entries[0]).toMatchObject({ byUser: api.world.coach.id, detail: null });
});

it('tells at once that a mail server is away, and keeps its words out of the log', async () => {
  const link = await made();
  let log = '';
  const to = new Writable({
    write(chunk: Buffer, _encoding, done) {
      log += chunk.toString();
      done();
    },
  });
  const mail = {
    send: ({ to: address, text }: { to: string; text: string }) =>
      Promise.reject(Object.assign(new Error(`${address}: ${text}`), { code: 'ECONNECTION' })),
    close: () => undefined,
  };
  const app = makeApp({ ...api.ground, mail, log: makeLog('info', to) }, { features });
  const { body } = await send(link, GUARDIAN, await api.as(api.world.coach, app)).expect(503);
  expect(body.code).toBe('letter-not-sent');
  expect(log).toContain('ECONNECTION');
  expect(log).not.toContain(link.token);
  expect(log).not.toContain(GUARDIAN);
});

it.each([
  ['the token of another link', { token: 'b'.repeat(43) }],
  ['a link that has lapsed', { expiresAt: new Date(Date.now() - 1000) }],
])('refuses %s', async (_what, { token, expiresAt }: { token?: string; expiresAt?: Date }) => {
  const link = await made({ expiresAt });
  const before = api.mailbox.length;
  const { body } = await send({ ...link, token: token ?? link.token }).expect(410);
  expect(body.code).toBe('link-gone');
  expect(api.mailbox).toHaveLength(before);
});

it('refuses a link that was ended, and one without a consent', async () => {
  const ended = await made();
  await coach.post(`/api/replays/${ended.id}/revoke`).expect(200);
  await send(ended).expect(410);
  const unasked = await made();
  await coach.post(`/api/consents/${unasked.consent}/withdraw`).expect(200);
  const { body } = await send(unasked).expect(409);
  expect(body.code).toBe('consent-missing');
});

it('is not for other coaches, nor for those who only supervise', async () => {
  const link = await made();
  await send(link, GUARDIAN, await api.as(api.world.otherCoach)).expect(404);
  await send(link, GUARDIAN, await api.as(api.world.foreignOwner)).expect(404);
  await send(link, GUARDIAN, await api.as(api.world.supervisor)).expect(403);
});

it('sends no more than ten letters in an hour to one address', async () => {
  const link = await made();
  const often = 'often@test.example';
  for (let sent = 0; sent < 10; sent += 1) await send(link, often).expect(204);
  const { body } = await send(link, ` ${often.toUpperCase()}`).expect(429);
  expect(body.code).toBe('too-many-tries');
  await send(link, 'another@test.example').expect(204);
});
