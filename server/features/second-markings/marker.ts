import type { EntityManager } from '@mikro-orm/postgresql';
import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Supervision } from '../accounts/supervision.entity.ts';
import { User } from '../accounts/user.entity.ts';

const actorOf = (user: User, assigned: readonly Supervision[]): UserActor => ({
  kind: 'user',
  id: user.id,
  practiceId: user.practiceId,
  role: user.role,
  coachIds:
    user.role === 'supervisor'
      ? assigned.filter(({ supervisor }) => supervisor.id === user.id).map(({ coach }) => coach.id)
      : [],
});

/** Everybody of the practice who may mark frames of this athlete a second time, by name. */
export const possibleMarkers = async (em: EntityManager, athlete: Athlete): Promise<User[]> => {
  const users = await em.find(User, { disabledAt: null }, { orderBy: { name: 'asc', id: 'asc' } });
  const assigned = await em.find(Supervision, { coach: athlete.coach.id });
  return users.filter((user) =>
    can(actorOf(user, assigned), 'marks.second', {
      kind: 'caseload',
      practiceId: athlete.practiceId,
      coachId: athlete.coach.id,
    }),
  );
};
