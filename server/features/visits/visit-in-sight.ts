import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import { Visit } from './visit.entity.ts';

/** A visit with whom it was of and who opened it. */
export interface VisitInSight {
  readonly visit: Visit;
  readonly athlete: Athlete;
  readonly coach: User;
}

/**
 * The visit, if this actor may do this with it.
 * @throws Problem 'not-found', 'not-allowed', 'consent-withdrawn' or 'supervision-not-agreed'
 */
export const visitInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
): Promise<VisitInSight> => {
  const visit = found(await em.findOne(Visit, { id }, { populate: ['athlete', 'coach'] }));
  const athlete = visit.athlete.unwrap() as Athlete;
  needCaseload(actor, action, athlete);
  await needOpen({ em, actor }, athlete, action);
  return { visit: visit, athlete, coach: visit.coach.unwrap() };
};
