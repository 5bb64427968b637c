import { timingSafeEqual } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import { createServer, type RequestListener, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { isLoopback } from '../http/cookie-is-secure.ts';
import type { Config } from '../main/config.ts';
import { inboxPage } from './inbox-page.ts';
import { mailFolder } from './open-mailer.ts';
import { type ReadMail, readMail } from './read-mail.ts';

/** Where people look for it; any free port where this one is taken. */
const PORT = 4625;
const ADDRESS = '127.0.0.1';
const SHOWN = 100;

export interface Inbox {
  readonly url: string;
  readonly close: () => Promise<void>;
}

/**
 * Whether letters may be read on a page: only where none is sent, nothing says production, and nobody but this
 * machine reaches the instance. Whoever reads its letters can take any account.
 */
export const inboxIsFor = ({ environment, mail, host, publicUrl }: Config): boolean =>
  environment !== 'production' &&
  mail.smtpUrl === undefined &&
  ['127.0.0.1', '::1', 'localhost'].includes(host) &&
  isLoopback(publicUrl);

/** The newest letters, and how many more there are. A letter of which only a part is there has another name. */
const lettersIn = async (folder: string): Promise<{ letters: ReadMail[]; more: number }> => {
  const names = (await readdir(folder).catch(() => [])).filter((name) => name.endsWith('.eml'));
  const newest = names.sort().reverse().slice(0, SHOWN);
  const letters = await Promise.all(
    newest.map(async (name) => readMail(await readFile(join(folder, name), 'utf8'))),
  );
  return { letters, more: names.length - newest.length };
};

const same = (given: string, secret: string): boolean => {
  const [a, b] = [Buffer.from(given), Buffer.from(secret)];
  return a.length === b.length && timingSafeEqual(a, b);
};

const answer =
  (folder: string, secret: string): RequestListener =>
  (req, res) => {
    const here = res.socket?.localPort;
    // another site's name that leads to this machine must not read it
    const host = [`${ADDRESS}:${here}`, `localhost:${here}`].includes(req.headers.host ?? '');
    if (req.method !== 'GET' || !host || !same(req.url ?? '', `/${secret}`)) {
      res.writeHead(404, { 'Content-Type': 'text/plain' }).end('Nothing here.\n');
      return;
    }
    lettersIn(folder).then(
      ({ letters, more }) => {
        res.writeHead(200, {
          'Content-Type': 'text/html; charset=utf-8',
          'Cache-Control': 'no-store',
          'Content-Security-Policy':
            "default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
          'Referrer-Policy': 'no-referrer',
          'X-Content-Type-Options': 'nosniff',
        });
        res.end(inboxPage(letters, more));
      },
      () => {
        res.writeHead(500, { 'Content-Type': 'text/plain' }).end('The folder cannot be read.\n');
      },
    );
  };

const listen = (server: Server, port: number): Promise<void> =>
  new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, ADDRESS, () => {
      server.off('error', reject);
      resolve();
    });
  });

/**
 * Serves the kept letters to a browser on this machine.
 * @param secret part of the address: others who work on the same machine do not know it
 */
export const openInbox = async (
  config: Pick<Config, 'data'>,
  secret: string,
  port = PORT,
): Promise<Inbox> => {
  const server = createServer(answer(mailFolder(config), secret));
  await listen(server, port).catch(() => listen(server, 0));
  const at = server.address() as AddressInfo;
  return {
    url: `http://${ADDRESS}:${at.port}/${secret}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
};
