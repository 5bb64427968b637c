import { Writable } from 'node:stream';
import type { AddressInfo } from 'node:net';
import { connect } from 'node:net';
import { createServer } from 'node:http';
import supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { makeApp } from '#server/http/app.ts';
import { makeLog } from '#server/http/logging.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { query } from '#tests/support/whole-database.ts';

let api: Api;
let written = '';
let app: ReturnType<typeof makeApp>;
beforeAll(async () => {
  api = await startApi();
  const to = new Writable({
    write(chunk: Buffer, _encoding, done) {
      written += chunk.toString();
      done();
    },
  });
  app = makeApp({ ...api.ground, log: makeLog('info', to) }, { features });
});
afterAll(() => api.close());
beforeEach(() => {
  written = '';
});

const lines = (): Record<string, unknown>[] =>
  written
    .split('\n')
    .filter(Boolean)
    .map((line) => JSON.parse(line) as Record<string, unknown>);

/** Nothing that ends a line, moves a cursor or turns the writing around. */
const expectHarmless = (): void => {
  const tricks =
    // eslint-disable-next-line no-control-regex -- control characters are what is looked for
    /[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u2028-\u202e\u2066-\u2069]/;
  expect(written).not.toMatch(tricks);
};

describe('the log', () => {
  it.each([
    '/api/athletes/%0a%7b%22level%22:50%7d',
    '/api/%1b[2J%1b[1;31mowned',
    '/api/athletes?q=%0d%0aRobin+Marsh',
    `/api/${'x'.repeat(4000)}`,
  ])('has one line for %s', async (path) => {
    await supertest(app).get(path);
    expect(lines()).toHaveLength(1);
    expectHarmless();
    expect(written.length).toBeLessThan(1000);
    expect(written).not.toContain('Robin');
  });

  it('shows bytes of an address that are no letters as question marks', async () => {
    const server = createServer(app);
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const socket = connect((server.address() as AddressInfo).port, '127.0.0.1');
    const closed = new Promise((resolve) => socket.once('close', resolve));
    socket.end(
      Buffer.from('GET /api/\x9b31mred HTTP/1.1\r\nHost: a\r\nConnection: close\r\n\r\n', 'latin1'),
    );
    socket.resume();
    await closed;
    server.close();
    expectHarmless();
    for (const line of lines()) expect(line.req).toMatchObject({ path: '/api/?31mred' });
  });

  it.each([
    ['User-Agent', 'curl\t{"level":60}'],
    ['Referer', 'https://redshank.test/r/secret-token'],
    ['X-Request-Id', 'chosen-by-the-sender'],
    ['X-Forwarded-For', '203.0.113.9, <script>'],
  ])('takes nothing from the header %s', async (name, value) => {
    await supertest(app).get('/api/me').set(name, value);
    expect(lines()).toHaveLength(1);
    expect(written).not.toMatch(/level":60|secret-token|chosen-by|203\.0\.113|script/);
  });

  it('holds no name, address or password that was sent', async () => {
    await supertest(app)
      .post('/api/sign-in')
      .send({ email: 'robin.marsh@test.example', password: 'reeds\n{"level":60}' })
      .expect(401);
    await supertest(app).post('/api/start').send({
      email: 'robin.marsh@test.example',
      name: 'Robin\nMarsh',
      practiceName: 'Salt\nmarsh',
    });
    expect(lines()).toHaveLength(2);
    expectHarmless();
    expect(written).not.toMatch(/robin|marsh|reeds/i);
  });

  it.each(['/api/r/', '/API/R/', '/Api/r/'])('keeps no token of %s', async (start) => {
    const token = 'T0ken'.repeat(9);
    await supertest(app).get(`${start}${token}`).expect(404);
    expect(lines()).toHaveLength(1);
    expect(written).not.toContain('T0ken');
  });
});

it('a session keeps the kind of device, not what the sender wrote', async () => {
  const { coach } = api.world;
  const agent = 'Mozilla/5.0 (iPhone)\u0009<script>alert(1)</script> Safari/604.1';
  await supertest(app)
    .post('/api/sign-in')
    .set('User-Agent', agent)
    .send({ email: coach.email, password: 'a plain test word' })
    .expect(200);
  const rows = await query(api, 'select device from session where user_id = $1', [coach.id]);
  expect(rows.map(({ device }) => device)).toEqual(['Safari on iPhone']);
});
