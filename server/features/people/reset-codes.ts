import type { UserActor } from '#shared/access/actors.ts';
import type { PeoplePage } from '#shared/contracts/people.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { notify } from '../accounts/notices.ts';
import { endSessionsOf } from '../accounts/open-session.ts';
import { audit } from '../audit/audit.ts';
import { dropCodes } from '../one-time-codes/drop-codes.ts';
import { peoplePage } from './people.service.ts';
import { personToChange } from './person-of-practice.ts';

/**
 * Lets somebody in again who lost phone and recovery codes. Whoever has them now is out: all sessions end. One's own
 * codes are turned off where one proves that one has them.
 * @throws Problem 'codes-off' or 'not-as-it-stands'
 */
export const resetCodes = async (unit: Unit<UserActor>, id: string): Promise<PeoplePage> => {
  const person = await personToChange(unit, id);
  if (id === unit.actor.id)
    throw new Problem('not-as-it-stands', 'Turn off your own codes on the page of your account.');
  if (!person.codesSince) throw new Problem('codes-off');
  await dropCodes(unit.em, id);
  await endSessionsOf(unit, id);
  audit(unit, 'account.codes-reset', id);
  await notify(unit, id, 'codes-reset');
  // what was read before would be shown
  await unit.em.refresh(person);
  return peoplePage(unit);
};
