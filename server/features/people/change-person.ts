import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { PeoplePage, personBody } from '#shared/contracts/people.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { Supervision } from '../accounts/supervision.entity.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { peoplePage } from './people.service.ts';
import { needAnotherOwner, personToChange } from './person-of-practice.ts';

type Of = Unit<UserActor>;

/** Sets whose athletes a supervisor sees, all at once. */
const assign = async (unit: Of, supervisor: User, coachIds: readonly string[]): Promise<void> => {
  const { em } = unit;
  const wanted = [...new Set(coachIds)];
  const coaches = await em.find(User, { id: { $in: wanted } });
  if (coaches.length !== wanted.length || wanted.includes(supervisor.id))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.coachIds', message: 'Choose other people of this practice.' },
    ]);
  await em.nativeDelete(Supervision, { supervisor: supervisor.id });
  for (const coach of coaches) em.create(Supervision, { supervisor, coach });
  audit(unit, 'account.coaches', supervisor.id, { rows: wanted.length });
};

/**
 * Changes a role and, of a supervisor, whose athletes they see. Who is no supervisor any more sees nobody else's.
 * @throws Problem 'last-owner'
 */
export const changePerson = async (
  unit: Of,
  id: string,
  { role, coachIds }: z.output<typeof personBody>,
): Promise<PeoplePage> => {
  const person = await personToChange(unit, id);
  const becomes = role ?? person.role;
  if (becomes !== person.role) {
    if (becomes !== 'owner') await needAnotherOwner(unit, person);
    if (person.role === 'supervisor')
      await unit.em.nativeDelete(Supervision, { supervisor: person.id });
    unit.em.assign(person, { role: becomes });
    audit(unit, 'account.role', person.id, { as: becomes });
  }
  if (coachIds) {
    if (becomes !== 'supervisor')
      throw new Problem('invalid-input', undefined, [
        { path: 'body.coachIds', message: 'Only a supervisor is assigned to coaches.' },
      ]);
    await assign(unit, person, coachIds);
  }
  await unit.em.flush();
  return peoplePage(unit);
};
