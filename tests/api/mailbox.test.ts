import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { catchMail, type MailCatcher } from '#tests/support/mail-catcher.ts';
import { openMailbox } from '#tests/support/mailbox.ts';

let folder: string;
let catcher: MailCatcher;
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'mailbox-'));
  catcher = await catchMail(folder);
});
afterEach(async () => {
  await catcher.stop();
  rmSync(folder, { recursive: true });
});

const send = (mail: { to: string; subject: string; text: string; html?: string }) =>
  createTransport(catcher.url).sendMail({ from: 'redshank@greywater-row.example', ...mail });

it('gives a mail back as it was sent: a long link, a letter that is not ASCII, an HTML part beside it', async () => {
  const link = `https://greywater-row.example/join/${'a1='.repeat(40)}`;
  const subject = 'Zoë has invited you to Greywater Row – join until Friday';
  const text = `Hello Zoë,\n\nopen ${link}\n`;
  await send({ to: 'coach@greywater-row.example', subject, text, html: `<p>${link}</p>` });

  const mail = await openMailbox(folder).newestTo('coach@greywater-row.example');
  expect(mail.subject).toBe(subject);
  expect(mail.text.trim()).toBe(text.trim());
});

it('keeps the mails of several people apart, the newest last', async () => {
  await send({ to: 'a@greywater-row.example', subject: 'first', text: 'one' });
  await send({ to: 'b@greywater-row.example', subject: 'other', text: 'two' });
  await send({ to: 'a@greywater-row.example', subject: 'second', text: 'three' });

  const mailbox = openMailbox(folder);
  expect(mailbox.countTo('a@greywater-row.example')).toBe(2);
  expect((await mailbox.newestTo('a@greywater-row.example', 1)).subject).toBe('second');
  expect((await mailbox.newestTo('b@greywater-row.example')).text.trim()).toBe('two');
});

it('says who got no mail', async () => {
  const waiting = openMailbox(folder, 0).newestTo('nobody@greywater-row.example');
  await expect(waiting).rejects.toThrow('no mail to nobody@greywater-row.example');
});
