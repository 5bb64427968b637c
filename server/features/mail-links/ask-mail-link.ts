import { randomUUID } from 'node:crypto';
import { atSameTime } from '../../http/same-time.ts';
import type { Ground } from '../../main/ground.ts';

const STEP_MS = 250;
const HOUR_MS = 3_600_000;
const LASTS_MS = { reset: HOUR_MS, start: 24 * HOUR_MS } as const;

/**
 * Asks for a letter without a sign-in. Nothing is looked up here: an address that nobody has is written down like
 * any other, and only the job that writes letters knows the difference.
 */
export const askMailLink = (
  { orm }: Pick<Ground, 'orm'>,
  kind: 'reset' | 'start',
  { email, person = '', practice = '' }: { email: string; person?: string; practice?: string },
): Promise<void> =>
  atSameTime(STEP_MS, async () => {
    const until = new Date(Date.now() + LASTS_MS[kind]);
    await orm.em
      .fork()
      .execute('select ask_mail_link(?::uuid, ?::uuid, ?, ?, ?, ?, ?::timestamptz)', [
        randomUUID(),
        randomUUID(),
        kind,
        email,
        person,
        practice,
        until.toISOString(),
      ]);
  });
