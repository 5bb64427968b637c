import type { UserActor } from '#shared/access/actors.ts';
import type { PeoplePage } from '#shared/contracts/people.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { endSessionsOf } from '../accounts/open-session.ts';
import { audit } from '../audit/audit.ts';
import { MailLink } from '../mail-links/mail-link.entity.ts';
import { peoplePage } from './people.service.ts';
import { needAnotherOwner, personToChange } from './person-of-practice.ts';

type Of = Unit<UserActor>;

/**
 * Closes an account: its sessions end, and so do the links that it was sent or that invite in its name.
 * @throws Problem 'last-owner'
 */
export const deactivate = async (unit: Of, id: string): Promise<PeoplePage> => {
  const { em } = unit;
  const person = await personToChange(unit, id);
  await needAnotherOwner(unit, person);
  if (!person.disabledAt) {
    em.assign(person, { disabledAt: new Date() });
    await endSessionsOf(unit, id);
    await em.nativeUpdate(
      MailLink,
      { $or: [{ user: id }, { by: id }], usedAt: null, revokedAt: null },
      { revokedAt: new Date() },
    );
    audit(unit, 'account.deactivate', id);
    await em.flush();
  }
  return peoplePage(unit);
};

export const reactivate = async (unit: Of, id: string): Promise<PeoplePage> => {
  const person = await personToChange(unit, id);
  if (person.disabledAt) {
    unit.em.assign(person, { disabledAt: null });
    audit(unit, 'account.reactivate', id);
    await unit.em.flush();
  }
  return peoplePage(unit);
};
