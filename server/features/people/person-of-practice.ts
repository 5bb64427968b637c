import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { needPeople } from './people.service.ts';

/**
 * The person, for an owner. Changes of people wait for each other, so that of two owners who put each other out at
 * once one stays.
 */
export const personToChange = async (unit: Unit<UserActor>, id: string): Promise<User> => {
  const { em, actor } = unit;
  await em.execute('select 1 from practice where id = ? for update', [actor.practiceId]);
  const person = found(await em.findOne(User, { id }));
  needPeople(unit);
  return person;
};

/** @throws Problem 'last-owner' where nobody else owns the practice */
export const needAnotherOwner = async (
  { em }: Unit<UserActor>,
  { id, role, disabledAt }: User,
): Promise<void> => {
  if (role !== 'owner' || disabledAt) return;
  const others = await em.count(User, { role: 'owner', disabledAt: null, id: { $ne: id } });
  if (others === 0) throw new Problem('last-owner');
};
