import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { Plan } from './plan.entity.ts';

export interface PlanInSight {
  readonly plan: Plan;
  readonly visit: Visit;
  readonly athlete: Athlete;
}

/**
 * The plan, if this actor may do this with it.
 * @throws Problem 'not-found', 'not-allowed', 'consent-withdrawn' or 'supervision-not-agreed'
 */
export const planInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
): Promise<PlanInSight> => {
  const plan = found(await em.findOne(Plan, { id }, { populate: ['visit.athlete', 'madeBy'] }));
  const visit = plan.visit.unwrap() as Visit;
  const athlete = visit.athlete.unwrap() as Athlete;
  needCaseload(actor, action, athlete);
  await needOpen({ em, actor }, athlete, action);
  return { plan, visit, athlete };
};
