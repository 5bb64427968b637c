import type { EntityManager } from '@mikro-orm/postgresql';
import type { Action } from '#shared/access/actions.ts';
import { can } from '#shared/access/can.ts';
import { caseloadOf } from '../../http/need.ts';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { hasConsent } from '../athletes/consent-check.ts';
import { actorsOfAthlete } from './actors-of-athlete.ts';

/**
 * Everybody who may do this with what was filmed of an athlete, by name. An assigned supervisor only while the athlete
 * agrees that they look; nobody once filming is withdrawn.
 */
export const peopleFor = async (
  em: EntityManager,
  athlete: Athlete,
  action: Action,
): Promise<User[]> => {
  if (athlete.deletionDue) return [];
  const supervised = await hasConsent(em, athlete.id, 'supervision');
  const resource = caseloadOf(athlete);
  return (await actorsOfAthlete(em, athlete))
    .filter(
      ({ actor }) =>
        can(actor, action, resource) &&
        (actor.role !== 'supervisor' || actor.id === athlete.coach.id || supervised),
    )
    .map(({ user }) => user);
};
