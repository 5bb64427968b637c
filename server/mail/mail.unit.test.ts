import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { text } from 'node:stream/consumers';
import { SMTPServer } from 'smtp-server';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { folderMailer } from './folder-mailer.ts';
import { smtpMailer } from './smtp-mailer.ts';

const FROM = 'Redshank <redshank@greywater-row.example>';
const LETTER = {
  to: 'coach@greywater-row.example',
  subject: 'A comment waits for you',
  text: 'Open it here:\nhttp://127.0.0.1:4600/clips/1\n',
};

describe('letters over SMTP', () => {
  const letters: { from: string; to: string[]; source: string }[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo(address, _session, callback) {
      callback(address.address.startsWith('gone@') ? new Error('No such person') : null);
    },
    onData(stream, session, callback) {
      void text(stream).then((source) => {
        const { mailFrom, rcptTo } = session.envelope;
        letters.push({
          from: mailFrom ? mailFrom.address : '',
          to: rcptTo.map(({ address }) => address),
          source,
        });
        callback();
      });
    },
  });
  let url: string;
  beforeAll(
    () =>
      new Promise<void>((resolve) => {
        server.listen(0, '127.0.0.1', () => {
          url = `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`;
          resolve();
        });
      }),
  );
  afterAll(
    () =>
      new Promise<void>((resolve) => {
        server.close(() => {
          resolve();
        });
      }),
  );

  it('arrive with sender, subject and text', async () => {
    const mailer = smtpMailer(url, FROM);
    await mailer.send(LETTER);
    mailer.close();
    expect(letters).toHaveLength(1);
    expect(letters[0]).toMatchObject({
      from: 'redshank@greywater-row.example',
      to: ['coach@greywater-row.example'],
    });
    expect(letters[0]?.source).toContain('Subject: A comment waits for you');
    expect(letters[0]?.source).toContain('http://127.0.0.1:4600/clips/1');
  });

  it('that nobody takes are an error', async () => {
    const mailer = smtpMailer(url, FROM);
    await expect(mailer.send({ ...LETTER, to: 'gone@test.example' })).rejects.toThrow(
      'No such person',
    );
    mailer.close();
  });
});

describe('letters into a folder', () => {
  const folder = mkdtempSync(join(tmpdir(), 'redshank-mail-'));
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });

  it('are whole files that only their owner reads', async () => {
    const inbox = join(folder, 'inbox');
    const mailer = folderMailer(inbox, FROM);
    await mailer.send(LETTER);
    await mailer.send({ ...LETTER, subject: 'Another' });
    const files = readdirSync(inbox).sort();
    expect(files).toHaveLength(2);
    expect(files.every((name) => name.endsWith('.eml'))).toBe(true);
    const first = join(inbox, files[0] ?? '');
    expect(statSync(first).mode & 0o777).toBe(0o600);
    const source = readFileSync(first, 'utf8');
    expect(source).toContain('To: coach@greywater-row.example');
    expect(source).toContain('http://127.0.0.1:4600/clips/1');
  });
});
