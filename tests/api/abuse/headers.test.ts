import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import type { Route } from '#shared/contracts/route.ts';
import { makeApp } from '#server/http/app.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { tokenTo } from '#tests/support/letters.ts';
import { everythingIn } from '#tests/support/everything-in.ts';

const folder = mkdtempSync(join(tmpdir(), 'redshank-headers-'));
mkdirSync(join(folder, 'assets'));
for (const name of ['index.html', 'replay.html', 'icon.svg', 'assets/app-1a2b3c.js'])
  writeFileSync(join(folder, name), '<!doctype html><title>Redshank</title>');

let api: Api;
let plain: ReturnType<typeof supertest>;
let secure: ReturnType<typeof supertest>;
beforeAll(async () => {
  api = await startApi();
  const { ground } = api;
  plain = supertest(makeApp(ground, { features, pages: folder }));
  const config = { ...ground.config, publicUrl: 'https://redshank.test' };
  secure = supertest(makeApp({ ...ground, config }, { features, pages: folder }));
});
afterAll(async () => {
  await api.close();
  rmSync(folder, { recursive: true });
});

const ID = '00000000-0000-4000-8000-000000000000';
/** One answer of each kind: pages, files, data, and every way of saying no. */
const ANSWERS: Record<string, (from: ReturnType<typeof supertest>) => supertest.Test> = {
  'a page': (from) => from.get('/athletes'),
  'a replay’s page': (from) => from.get('/r/dead'),
  'a file': (from) => from.get('/icon.svg'),
  'a script': (from) => from.get('/assets/app-1a2b3c.js'),
  'a file that is not there': (from) => from.get('/assets/old.js'),
  data: (from) => from.get('/api/health'),
  'the description of the interface': (from) => from.get('/api/openapi.json'),
  'no session': (from) => from.get('/api/me'),
  'a video without a session': (from) => from.get(`/api/clips/${ID}/video`),
  'a stream without a session': (from) => from.get('/api/events'),
  'a dead link': (from) => from.get(`/api/r/${'a'.repeat(43)}`),
  'an unknown address': (from) => from.get('/api/nothing'),
  'an unknown method': (from) => from.options('/api/me'),
  'a foreign origin': (from) => from.post('/api/sign-in').set('Origin', 'http://evil.example'),
  'a broken body': (from) => from.post('/api/sign-in').type('json').send('{"a":'),
  'another kind of body': (from) => from.post('/api/sign-in').type('text').send('a'),
  'a body that is too large': (from) =>
    from.post('/api/sign-in').send({ email: 'x'.repeat(40_000) }),
  'wrong fields': (from) => from.post('/api/sign-in').send({}),
  'an address that cannot be read': (from) => from.get('/%E0%A4%A'),
};

describe.each(Object.entries(ANSWERS))('%s', (_name, ask) => {
  it('carries every header that keeps a browser safe', async () => {
    const { headers } = await ask(plain);
    const policy = String(headers['content-security-policy']);
    for (const part of [
      "default-src 'self'",
      "script-src 'self' 'wasm-unsafe-eval'",
      "style-src 'self'",
      "object-src 'none'",
      "base-uri 'none'",
      "form-action 'self'",
      "frame-ancestors 'none'",
    ])
      expect(policy.split(';')).toContain(part);
    expect(policy).not.toMatch(/unsafe-inline|unsafe-eval'? [^w]|https?:|\*/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('no-referrer');
    expect(headers['x-frame-options']).toBe('SAMEORIGIN');
    expect(headers['cross-origin-opener-policy']).toBe('same-origin');
    expect(headers['cross-origin-resource-policy']).toBe('same-origin');
    expect(headers['permissions-policy']).toContain('microphone=()');
    expect(headers['access-control-allow-origin']).toBeUndefined();
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['server']).toBeUndefined();
    expect(headers['strict-transport-security']).toBeUndefined();
  });

  it('tells browsers to come by https alone where the instance is there', async () => {
    const { headers } = await ask(secure);
    const [, age] =
      /max-age=(\d+); includeSubDomains/.exec(String(headers['strict-transport-security'])) ?? [];
    expect(Number(age)).toBeGreaterThanOrEqual(31_536_000);
  });
});

it('no answer of the interface is kept by a browser or on the way, refusals included', async () => {
  for (const [name, ask] of Object.entries(ANSWERS)) {
    const request = ask(plain);
    if (!new URL(request.url).pathname.startsWith('/api')) continue;
    expect((await request).headers['cache-control'], name).toBe('no-store');
  }
});

describe('a write from elsewhere', () => {
  const writes = (Object.values(routes) as Route[]).filter(({ method }) => method !== 'get');
  const address = ({ path }: Route): string =>
    path.replace(/:(id|\w*Id)\b/g, ID).replace(/:\w+/g, 'x');

  it.each([
    { Origin: 'http://evil.example' },
    { Origin: 'null' },
    { Origin: 'http://redshank.test.evil.example' },
    { Origin: 'http://redshank.test:81' },
    { Origin: 'https://redshank.test' },
    { 'Sec-Fetch-Site': 'cross-site' },
    { 'Sec-Fetch-Site': 'same-site' },
  ])('with %j is refused by every route that changes something', async (headers) => {
    const owner = await api.as(api.world.owner);
    const before = await everythingIn(api);
    expect(writes.length).toBeGreaterThan(60);
    for (const route of writes) {
      const answer = await owner[route.method](address(route)).set(headers);
      expect([answer.status, answer.body.code], route.path).toEqual([403, 'foreign-origin']);
    }
    const tus = await owner.patch(`/api/uploads/${ID}`).set(headers);
    expect(tus.body.code).toBe('foreign-origin');
    expect(await everythingIn(api)).toEqual(before);
  });
});

it('the address in a letter is the instance’s own, whatever host was asked', async () => {
  const { coach } = api.world;
  await api.nobody
    .post('/api/forgot')
    .set({ Host: 'evil.example', 'X-Forwarded-Host': 'evil.example' })
    .send({ email: coach.email })
    .expect(204);
  const token = await tokenTo(api, coach.email);
  const letter = api.mailbox.at(-1)?.text ?? '';
  expect(letter).toContain(`http://redshank.test/reset/${token}`);
  expect(letter).not.toContain('evil');
});
