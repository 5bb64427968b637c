import { randomUUID } from 'node:crypto';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { Account, emailBody } from '#shared/contracts/accounts.ts';
import type { Unit } from '../../db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import { audit } from '../audit/audit.ts';
import { SEND_MAIL_LINK } from '../mail-links/jobs/send-mail-link-type.ts';
import { MailLink } from '../mail-links/mail-link.entity.ts';
import { needPassword, ownAccount, type Work } from './own-account.ts';
import { User } from './user.entity.ts';

type Of = Unit<UserActor>;

const LASTS_MS = 24 * 3_600_000;

const endOpen = ({ em, actor }: Of): Promise<number> =>
  em.nativeUpdate(MailLink, { user: actor.id, revokedAt: null }, { revokedAt: new Date() });

/**
 * Sends a letter to the old address and one to the new; an earlier change that is still open ends. Whether the new
 * address has an account already is told to its holder alone.
 * @throws Problem 'password-wrong'
 */
export const changeEmail = async (
  work: Work,
  { email, password }: z.output<typeof emailBody>,
): Promise<Account> => {
  await needPassword(work, password);
  return work(async (unit) => {
    const { em, actor } = unit;
    const user = await em.findOneOrFail(User, { id: actor.id });
    if (user.email === email)
      throw new Problem('invalid-input', undefined, [
        { path: 'body.email', message: 'This is your address already.' },
      ]);
    await endOpen(unit);
    const changeId = randomUUID();
    const both = { user, changeId, newEmail: email, expiresAt: new Date(Date.now() + LASTS_MS) };
    for (const link of [
      em.create(MailLink, { ...both, kind: 'email-from', email: user.email }),
      em.create(MailLink, { ...both, kind: 'email-to', email }),
    ])
      await enqueue(unit, SEND_MAIL_LINK, { linkId: link.id });
    audit(unit, 'account.email-asked', user.id);
    await em.flush();
    return ownAccount(unit);
  });
};

export const dropEmailChange = async (unit: Of): Promise<Account> => {
  await endOpen(unit);
  return ownAccount(unit);
};
