import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { type ReadMail, readMail } from '#server/mail/read-mail.ts';

/** What the app has sent, newest last. */
export interface Mailbox {
  all(): ReadMail[];
  /** The newest mail to this address, waited for; with `after`, only one beyond that many to the same address. */
  newestTo(address: string, after?: number): Promise<ReadMail>;
  countTo(address: string): number;
}

/** Reads the folder that mail-catcher.ts fills. */
export function openMailbox(folder: string, patienceMs = 15_000): Mailbox {
  const all = () =>
    readdirSync(folder)
      .filter((name) => name.endsWith('.eml'))
      .sort()
      .map((name) => readMail(readFileSync(join(folder, name), 'utf8')));
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
