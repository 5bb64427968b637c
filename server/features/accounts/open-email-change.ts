import type { UserActor } from '#shared/access/actors.ts';
import type { Account } from '#shared/contracts/accounts.ts';
import type { Unit } from '../../db/in-practice.ts';
import { MailLink } from '../mail-links/mail-link.entity.ts';

/** What is open of a person's change of address, both links or none; the newest where there were several. */
export const openEmailChange = async ({
  em,
  actor,
}: Unit<UserActor>): Promise<Account['emailChange']> => {
  const links = await em.find(
    MailLink,
    { user: actor.id, revokedAt: null, expiresAt: { $gt: new Date() } },
    { orderBy: { createdAt: 'desc' } },
  );
  const changeId = links[0]?.changeId;
  const ofKind = (kind: string) =>
    links.find((link) => link.kind === kind && link.changeId === changeId);
  const from = ofKind('email-from');
  const to = ofKind('email-to');
  if (!from || !to || (from.usedAt && to.usedAt)) return null;
  return {
    to: to.email,
    confirmedFromOld: Boolean(from.usedAt),
    confirmedFromNew: Boolean(to.usedAt),
    until: to.expiresAt.toISOString(),
  };
};
