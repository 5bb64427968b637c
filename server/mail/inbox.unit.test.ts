import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, request } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { text as textOf } from 'node:stream/consumers';
import { afterAll, afterEach, describe, expect, it } from 'vitest';
import { type Config, readConfig } from '../main/config.ts';
import { type Inbox, inboxIsFor, openInbox } from './inbox.ts';
import { openMailer } from './open-mailer.ts';

const SECRET = 'a-long-and-random-part';
const databases = {
  DATABASE_URL: 'postgres://a@127.0.0.1/a',
  DATABASE_OWNER_URL: 'postgres://a@127.0.0.1/a',
  DATABASE_JOBS_URL: 'postgres://a@127.0.0.1/a',
};
const config = (env: NodeJS.ProcessEnv): Config => readConfig({ ...databases, ...env });

const data = mkdtempSync(join(tmpdir(), 'redshank-inbox-'));
afterAll(() => {
  rmSync(data, { recursive: true });
});
let inbox: Inbox | undefined;
afterEach(() => inbox?.close());

const ask = (url: string, options: { method?: string; host?: string } = {}) =>
  new Promise<{
    status: number | undefined;
    headers: NodeJS.Dict<string | string[]>;
    body: string;
  }>((resolve, reject) => {
    const { method = 'GET', host } = options;
    request(url, { method, headers: host === undefined ? {} : { host } }, (res) => {
      textOf(res).then(
        (body) => resolve({ status: res.statusCode, headers: res.headers, body }),
        reject,
      );
    })
      .on('error', reject)
      .end();
  });

describe('the inbox', () => {
  it('shows kept letters, newest first, their links to press and nothing in them as markup', async () => {
    const here = config({ REDSHANK_DATA: data });
    inbox = await openInbox(here, SECRET, 0);
    expect((await ask(inbox.url)).body).toContain('None yet.');
    const mailer = openMailer(here);
    const link = 'http://127.0.0.1:4600/reset/abc-DEF_123';
    await mailer.send({ to: 'a@test.example', subject: 'First', text: `Here:\n${link}\n` });
    await mailer.send({
      to: 'b@test.example',
      subject: 'Zoë’s <b>practice</b>',
      text: `<script>alert("x")</script> ${'long '.repeat(40)}\n`,
    });
    writeFileSync(join(data, 'mail', 'half.eml.new'), 'To: half@test.example\n\nhalf');
    const { status, headers, body } = await ask(inbox.url);
    expect(status).toBe(200);
    expect(headers['content-security-policy']).toContain("default-src 'none'");
    expect(headers['cache-control']).toBe('no-store');
    expect(body).toContain(`<a href="${link}" target="_blank" rel="noreferrer">${link}</a>`);
    expect(body).toContain('Zoë’s &lt;b&gt;practice&lt;/b&gt;');
    expect(body).toContain('&lt;script&gt;alert(&quot;x&quot;)&lt;/script&gt;');
    expect(body).not.toMatch(/<script|half@/);
    expect(body.indexOf('to b@test.example')).toBeLessThan(body.indexOf('to a@test.example'));
  });

  it('is there for this machine alone, under an address that others do not know', async () => {
    inbox = await openInbox(config({ REDSHANK_DATA: data }), SECRET, 0);
    const { origin, port } = new URL(inbox.url);
    expect(inbox.url).toMatch(/^http:\/\/127\.0\.0\.1:\d+\//);
    expect((await ask(`http://localhost:${port}/${SECRET}`)).status).toBe(200);
    for (const [url, options] of [
      [origin, {}],
      [`${origin}/${SECRET}x`, {}],
      [`${origin}/another`, {}],
      [`${inbox.url}?x=1`, {}],
      [inbox.url, { method: 'POST' }],
      [inbox.url, { host: 'evil.example' }],
      [inbox.url, { host: `evil.example:${port}` }],
    ] as const) {
      const { status, body } = await ask(url, options);
      expect([status, body], `${url} ${JSON.stringify(options)}`).toEqual([404, 'Nothing here.\n']);
    }
  });

  it('takes any free port where its own is taken', async () => {
    const other = createServer();
    await new Promise<void>((resolve) => {
      other.listen(0, '127.0.0.1', resolve);
    });
    const { port } = other.address() as AddressInfo;
    inbox = await openInbox(config({ REDSHANK_DATA: data }), SECRET, port);
    expect(new URL(inbox.url).port).not.toBe(String(port));
    expect((await ask(inbox.url)).status).toBe(200);
    other.close();
  });

  it.each([
    ['npm start', {}, true],
    ['npm run dev', { NODE_ENV: 'development' }, true],
    ['production', { NODE_ENV: 'production' }, false],
    ['a mail server', { REDSHANK_SMTP_URL: 'smtp://127.0.0.1:25' }, false],
    ['an address for others', { PUBLIC_URL: 'https://redshank.example' }, false],
    ['all addresses of the machine', { HOST: '0.0.0.0' }, false],
    ['the same behind a name', { HOST: '0.0.0.0', PUBLIC_URL: 'http://127.0.0.1:4600' }, false],
    ['the local network', { PUBLIC_URL: 'http://192.0.2.1:4600' }, false],
  ])('with %s: %o, %s', (_what, env, open) => {
    expect(inboxIsFor(config({ REDSHANK_DATA: data, ...env }))).toBe(open);
  });
});
