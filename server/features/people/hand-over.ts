import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { handOverBody, PeoplePage } from '#shared/contracts/people.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { peoplePage } from './people.service.ts';
import { personToChange } from './person-of-practice.ts';

/**
 * Moves a whole caseload. What was done stays in the name of who did it; an edit that is under way elsewhere meets
 * a newer version.
 * @throws Problem 'invalid-input' where the other may not have athletes
 */
export const handOver = async (
  unit: Unit<UserActor>,
  id: string,
  { to }: z.output<typeof handOverBody>,
): Promise<PeoplePage> => {
  const { em } = unit;
  await personToChange(unit, id);
  const taker = await em.findOne(User, { id: to, disabledAt: null });
  if (!taker || to === id || taker.role === 'supervisor')
    throw new Problem('invalid-input', undefined, [
      { path: 'body.to', message: 'Choose another coach or an owner of this practice.' },
    ]);
  const moved = await em.execute<{ id: string }[]>(
    'update athlete set coach_id = ?, version = version + 1 where coach_id = ? returning id',
    [to, id],
  );
  for (const athlete of moved)
    audit(unit, 'athlete.hand-over', athlete.id, { athlete: athlete.id, coach: to });
  await em.flush();
  return peoplePage(unit);
};
