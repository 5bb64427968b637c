import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../db/in-practice.ts';
import { Session } from '../features/accounts/session.entity.ts';
import type { User } from '../features/accounts/user.entity.ts';
import { makeClip } from '../features/clips/clip.factory.ts';
import { makeVisit } from '../features/visits/visit.factory.ts';
import { type LiveEvent, tell } from './tell.ts';

let api: Api;
let server: Server;
let base: string;
beforeAll(async () => {
  api = await startApi();
  server = createServer(api.app);
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', resolve);
  });
  base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(async () => {
  server.close();
  server.closeAllConnections();
  await api.close();
});

const open: AbortController[] = [];
afterEach(() => {
  for (const each of open.splice(0)) each.abort();
});

const cookieOf = async (user: User): Promise<string> => {
  const session = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(
      em.create(Session, { user: user.id, device: 'A tab', expiresAt: new Date(Date.now() + 1e7) }),
    ),
  );
  return api.ground.sessions.cookieFor(session.id).split(';')[0] ?? '';
};

const soon = (check: () => void): Promise<void> => vi.waitFor(check, { timeout: 15_000 });

/** Opens a stream and collects what it says. */
const listen = async (cookie: string, lastEventId?: string) => {
  const abort = new AbortController();
  open.push(abort);
  const response = await fetch(`${base}/api/events`, {
    headers: { Cookie: cookie, ...(lastEventId ? { 'Last-Event-ID': lastEventId } : {}) },
    signal: abort.signal,
  });
  const state = { text: '', ended: false, response };
  const reader = response.body?.getReader();
  const decoder = new TextDecoder();
  const read = async (): Promise<void> => {
    for (;;) {
      const part = await reader?.read();
      if (!part || part.done) break;
      state.text += decoder.decode(part.value, { stream: true });
    }
    state.ended = true;
  };
  read().catch(() => undefined);
  await soon(() => {
    expect(state.text).toContain('retry:');
  });
  return state;
};

const EVENT: LiveEvent = {
  type: 'comments',
  clipId: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01',
  byUserId: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c02',
};
const publish = (event: LiveEvent = EVENT): Promise<void> =>
  api.ground.inPractice(product(api.world.practiceId), (unit) =>
    tell(unit, { coachId: api.world.coach.id }, event),
  );
const hears = (state: { text: string }, text: string): Promise<void> =>
  soon(() => {
    expect(state.text).toContain(text);
  });

describe('the stream of events', () => {
  it('is for staff', async () => {
    const answer = await fetch(`${base}/api/events`);
    expect(answer.status).toBe(401);
    await answer.body?.cancel();
  });

  it('tells what was committed to those who may see it', async () => {
    const [coach, supervisor, otherCoach, foreigner] = await Promise.all(
      [api.world.coach, api.world.supervisor, api.world.otherCoach, api.world.foreignOwner].map(
        async (user) => listen(await cookieOf(user)),
      ),
    );
    if (!coach || !supervisor || !otherCoach || !foreigner) throw new Error('four streams');
    expect(coach.response.headers.get('content-type')).toContain('text/event-stream');
    expect(coach.response.headers.get('cache-control')).toContain('no-transform');
    await publish({ type: 'reading', visitId: api.world.visit.id, side: 'left' });
    await hears(coach, '"type":"reading"');
    await hears(supervisor, '"type":"reading"');
    expect(otherCoach.text).not.toContain('reading');
    expect(foreigner.text).not.toContain('reading');
  });

  it('says who has a clip open to those who may see it, and keeps it from the rest', async () => {
    const { coach, supervisor, otherCoach, foreignOwner, athlete } = api.world;
    const clip = await api.ground.inPractice(coach, ({ em }) => {
      const visit = makeVisit(em, { athlete, coach });
      return Promise.resolve(makeClip(em, { visit, uploadedBy: coach }));
    });
    const [own, other] = await Promise.all(
      [coach, otherCoach].map(async (user) => listen(await cookieOf(user))),
    );
    if (!own || !other) throw new Error('two streams');
    const path = `/api/clips/${clip.id}/here`;
    await (await api.as(supervisor)).post(path).send({ here: true }).expect(204);
    await hears(own, `"type":"here","clipId":"${clip.id}"`);
    expect(own.text).toContain(`"by":{"id":"${supervisor.id}","name":"${supervisor.name}"}`);
    expect(own.text).not.toContain(supervisor.email);
    expect(own.text).not.toContain('id: ');
    expect(other.text).not.toContain('here');
    for (const user of [otherCoach, foreignOwner])
      await (await api.as(user)).post(path).send({ here: true }).expect(404);
    await (await api.as(supervisor)).post(path).send({ here: false }).expect(204);
    await hears(own, '"here":false');
  });

  it('says nothing of what was rolled back', async () => {
    const coach = await listen(await cookieOf(api.world.coach));
    await expect(
      api.ground.inPractice(product(api.world.practiceId), async (unit) => {
        await tell(unit, { coachId: api.world.coach.id }, EVENT);
        throw new Error('undone');
      }),
    ).rejects.toThrow('undone');
    await publish({
      ...EVENT,
      type: 'marks',
      repId: EVENT.clipId,
      clipId: EVENT.clipId,
      byUserId: EVENT.clipId,
    });
    await hears(coach, '"type":"marks"');
    expect(coach.text).not.toContain('comments');
  });

  it('goes on after a cut where it was cut', async () => {
    const cookie = await cookieOf(api.world.coach);
    const first = await listen(cookie);
    await publish();
    await hears(first, 'id: ');
    const id = /id: (\S+)/.exec(first.text)?.[1] ?? '';
    open.at(-1)?.abort();
    await publish({ type: 'reading', visitId: EVENT.clipId, side: 'left' });
    const second = await listen(cookie, id);
    await hears(second, '"type":"reading"');
    const third = await listen(cookie, 'an-id-nobody-knows');
    await hears(third, '"type":"missed"');
  });

  it('ends with the session, after saying so', async () => {
    const cookie = await cookieOf(api.world.coach);
    const state = await listen(cookie);
    const out = await fetch(`${base}/api/sign-out`, {
      method: 'POST',
      headers: { Cookie: cookie },
    });
    expect(out.status).toBe(204);
    await hears(state, '"type":"signed-out"');
    await soon(() => {
      expect(state.ended).toBe(true);
    });
  });
});
