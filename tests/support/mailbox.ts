import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

export interface Mail {
  to: string;
  subject: string;
  /** the text part, decoded */
  text: string;
}

/** What the app has sent, newest last. */
export interface Mailbox {
  all(): Mail[];
  /** The newest mail to this address, waited for; with `after`, only one beyond that many to the same address. */
  newestTo(address: string, after?: number): Promise<Mail>;
  countTo(address: string): number;
}

/** Reads the folder that mail-catcher.ts fills. */
export function openMailbox(folder: string, patienceMs = 15_000): Mailbox {
  const all = () =>
    readdirSync(folder)
      .filter((name) => name.endsWith('.eml'))
      .sort()
      .map((name) => parseMail(readFileSync(join(folder, name), 'utf8')));
  const to = (address: string) => all().filter((mail) => mail.to.includes(address));
  return {
    all,
    countTo: (address) => to(address).length,
    async newestTo(address, after = 0) {
      const end = Date.now() + patienceMs;
      for (;;) {
        const found = to(address);
        const newest = found.at(-1);
        if (newest !== undefined && found.length > after) return newest;
        if (Date.now() > end)
          throw new Error(`no mail to ${address} within ${patienceMs / 1000} s`);
        await pause(100);
      }
    },
  };
}

/** Enough of RFC 5322 and MIME for what nodemailer writes: one text part, alone or among alternatives. */
export function parseMail(raw: string): Mail {
  const { headers, body } = splitPart(raw);
  const boundary = /boundary="?([^";]+)"?/i.exec(headers.get('content-type') ?? '')?.[1];
  const parts =
    boundary === undefined ? [raw] : body.split(`--${boundary}`).map((part) => part.trim());
  const text = parts
    .map(splitPart)
    .find((part) => (part.headers.get('content-type') ?? '').startsWith('text/plain'));
  return {
    to: headers.get('to') ?? '',
    subject: decodeWords(headers.get('subject') ?? ''),
    text:
      text === undefined
        ? ''
        : decodeBody(text.body, text.headers.get('content-transfer-encoding')),
  };
}

function splitPart(raw: string) {
  const text = raw.replaceAll('\r\n', '\n');
  const end = text.indexOf('\n\n');
  const head = end === -1 ? text : text.slice(0, end);
  const headers = new Map<string, string>();
  for (const line of head.replaceAll(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: end === -1 ? '' : text.slice(end + 2) };
}

function decodeBody(body: string, encoding = '7bit'): string {
  if (encoding.toLowerCase() === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding.toLowerCase() === 'quoted-printable')
    return decodeQuoted(body.replaceAll('=\n', ''));
  return body;
}

function decodeQuoted(text: string): string {
  const bytes = text.replaceAll(/=([0-9A-F]{2})/gi, (_all, hex: string) =>
    String.fromCharCode(Number.parseInt(hex, 16)),
  );
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

/** RFC 2047 words in a subject that is not plain ASCII. */
function decodeWords(subject: string): string {
  return subject.replaceAll(
    /=\?utf-8\?([bq])\?([^?]*)\?=\s*/gi,
    (_all, kind: string, word: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(word, 'base64').toString('utf8')
        : decodeQuoted(word.replaceAll('_', ' ')),
  );
}
