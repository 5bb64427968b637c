import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Athlete } from './athlete.entity.ts';

/**
 * The athlete, if this actor may do this with them.
 * @throws Problem 'not-found' or 'not-allowed'
 */
export const athleteInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
): Promise<Athlete> => {
  const athlete = found(await em.findOne(Athlete, { id }));
  needCaseload(actor, action, athlete);
  return athlete;
};
