import type { EntityManager } from '@mikro-orm/postgresql';
import { can } from '#shared/access/can.ts';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { hasConsent } from '../athletes/consent-check.ts';
import { actorsOfAthlete } from '../people/actors-of-athlete.ts';

/**
 * Everybody whose word on this athlete's readings counts, by name. A supervisor only while the athlete agrees that
 * they look.
 */
export const reviewersOf = async (em: EntityManager, athlete: Athlete): Promise<User[]> => {
  const supervised = await hasConsent(em, athlete.id, 'supervision');
  return (await actorsOfAthlete(em, athlete))
    .filter(
      ({ actor }) =>
        can(actor, 'review.decide', {
          kind: 'caseload',
          practiceId: athlete.practiceId,
          coachId: athlete.coach.id,
        }) &&
        (actor.role !== 'supervisor' || supervised),
    )
    .map(({ user }) => user);
};
