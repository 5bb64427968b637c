import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { inviteBody, PeoplePage } from '#shared/contracts/people.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import { User } from '../accounts/user.entity.ts';
import { SEND_MAIL_LINK } from '../mail-links/jobs/send-mail-link-type.ts';
import { MailLink } from '../mail-links/mail-link.entity.ts';
import { audit } from '../audit/audit.ts';
import { personRows } from './people-rows.ts';
import { presentInvitation, presentPersonRow } from './people.presenter.ts';

type Of = Unit<UserActor>;

const INVITATION_DAYS = 7;

export const needPeople = ({ actor }: Of): void =>
  need(actor, 'people.manage', { kind: 'practice', practiceId: actor.practiceId });

const openInvitation = () => ({
  kind: 'invitation' as const,
  usedAt: null,
  revokedAt: null,
  expiresAt: { $gt: new Date() },
});

export const peoplePage = async (unit: Of): Promise<PeoplePage> => {
  needPeople(unit);
  const { em, actor } = unit;
  const invitations = await em.find(MailLink, openInvitation(), {
    populate: ['by'],
    orderBy: { createdAt: 'desc' },
  });
  return {
    people: (await personRows(em, actor.practiceId)).map(presentPersonRow),
    invitations: invitations.map(presentInvitation),
  };
};

/**
 * Asks for the letter of an invitation. Whether the address has an account in another practice is told to its
 * holder alone, in that letter.
 * @throws Problem 'invalid-input' for an address of this practice
 */
export const invite = async (
  unit: Of,
  { email, role }: z.output<typeof inviteBody>,
): Promise<PeoplePage> => {
  needPeople(unit);
  const { em, actor } = unit;
  if (await em.findOne(User, { email }))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.email', message: 'There is an account of this practice with this address.' },
    ]);
  await em.nativeUpdate(MailLink, { ...openInvitation(), email }, { revokedAt: new Date() });
  const link = em.create(MailLink, {
    kind: 'invitation',
    email,
    role,
    by: em.getReference(User, actor.id),
    expiresAt: new Date(Date.now() + INVITATION_DAYS * 86_400_000),
  });
  await enqueue(unit, SEND_MAIL_LINK, { linkId: link.id });
  audit(unit, 'invitation.make', link.id, { as: role });
  await em.flush();
  return peoplePage(unit);
};

export const withdrawInvitation = async (unit: Of, id: string): Promise<void> => {
  const link = found(await unit.em.findOne(MailLink, { ...openInvitation(), id }));
  needPeople(unit);
  unit.em.assign(link, { revokedAt: new Date() });
  audit(unit, 'invitation.withdraw', id);
};
