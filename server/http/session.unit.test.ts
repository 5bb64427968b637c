import type { EntityManager } from '@mikro-orm/postgresql';
import express from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { problemHandler } from './problem-handler.ts';
import { keepSessions, staffOf } from './session.ts';

const ID = '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01';
const MINUTE = 60_000;
const KEY = 'a key for tests';

/** A session's row as the look-up function gives it; null once it is revoked or over. */
let row: { last_seen_at: string; code_missing?: boolean } | null;
let touched: number;

const db = () =>
  ({
    execute: (sql: string) => {
      if (sql.includes('touch_session')) {
        touched += 1;
        if (row) row.last_seen_at = new Date().toISOString();
        return Promise.resolve([]);
      }
      return Promise.resolve(
        row
          ? [
              {
                session_id: ID,
                expires_at: '2999-01-01T00:00:00Z',
                last_seen_at: row.last_seen_at,
                user_id: 'u',
                user_name: 'Robin',
                email: 'r@test.example',
                role: 'coach',
                practice_id: 'p',
                practice_name: 'Practice',
                coach_ids: [],
                code_missing: row.code_missing ?? false,
              },
            ]
          : [],
      );
    },
  }) as Partial<EntityManager> as EntityManager;

const keeper = (key = KEY, secure = false) => keepSessions({ db, key, secure });
const app = express();
app.get('/', keeper().whoIs, (_req, res) => {
  res.json({ who: staffOf(res).user.name });
});
app.get('/before-codes', keeper().whoIsBeforeCodes, (_req, res) => {
  res.json({ who: staffOf(res).user.name });
});
app.use(problemHandler(pino({ level: 'silent' })));

const cookie = (given = keeper().cookieFor(ID)): string => given.split(';')[0] ?? '';
const get = (sent: string, path = '/') => supertest(app).get(path).set('Cookie', sent);

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['Date'] });
  vi.setSystemTime('2026-05-01T08:00:00Z');
  row = { last_seen_at: new Date().toISOString() };
  touched = 0;
});
afterEach(() => {
  vi.useRealTimers();
});
const later = (minutes: number): void => {
  vi.setSystemTime(Date.now() + minutes * MINUTE);
};

describe('the session cookie', () => {
  it('lets its holder in, and is renewed only in the second half of its ten minutes', async () => {
    const sent = cookie();
    later(4);
    const early = await get(sent).expect(200);
    expect(early.body).toEqual({ who: 'Robin' });
    expect(early.headers['set-cookie']).toBeUndefined();
    later(2);
    const late = await get(sent).expect(200);
    expect(String(late.headers['set-cookie'])).toContain('redshank_session=');
  });

  it('past its ten minutes is exchanged while the session lives, and only then', async () => {
    const sent = cookie();
    later(11 * 60);
    await get(sent).expect(200);
    row = null;
    await get(sent).expect(401);
  });

  it('is worth nothing after twelve idle hours', async () => {
    const sent = cookie();
    later(12 * 60 + 1);
    await get(sent).expect(401);
    expect(touched).toBe(0);
  });

  it('of who has to set up codes first opens that alone', async () => {
    const sent = cookie();
    if (row) row.code_missing = true;
    expect((await get(sent).expect(403)).body).toMatchObject({ code: 'codes-needed' });
    await get(sent, '/before-codes').expect(200);
    row = null;
    await get(sent, '/before-codes').expect(401);
  });

  it('marks the session as seen once a minute at most', async () => {
    const sent = cookie();
    await get(sent).expect(200);
    expect(touched).toBe(0);
    later(2);
    await get(sent).expect(200);
    await get(sent).expect(200);
    expect(touched).toBe(1);
  });

  it.each([
    ['signed by somebody else', cookie(keeper('another key').cookieFor(ID))],
    ['unsigned', `redshank_session=${btoa('{"alg":"none"}')}.${btoa(`{"sid":"${ID}"}`)}.`],
    ['not a token', 'redshank_session=hello'],
    ['empty', 'redshank_session='],
  ])('%s is refused', async (_what, sent) => {
    await get(sent).expect(401);
  });

  it('is out of reach for scripts and other sites, and for plain http elsewhere', () => {
    expect(keeper().cookieFor(ID)).toMatch(/HttpOnly; SameSite=Lax$/);
    expect(keeper(KEY, true).cookieFor(ID)).toMatch(/HttpOnly; Secure; SameSite=Lax$/);
  });

  it('of an encrypted instance is taken only under the name that a neighbouring host cannot plant', async () => {
    const encrypted = express();
    encrypted.get('/', keeper(KEY, true).whoIs, (_req, res) => res.sendStatus(204));
    encrypted.use(problemHandler(pino({ level: 'silent' })));
    const own = cookie(keeper(KEY, true).cookieFor(ID));
    expect(own).toMatch(/^__Host-redshank_session=/);
    await supertest(encrypted).get('/').set('Cookie', own).expect(204);
    await supertest(encrypted).get('/').set('Cookie', own.replace('__Host-', '')).expect(401);
  });
});
