import type { EntityManager } from '@mikro-orm/postgresql';
import type { UserActor } from '#shared/access/actors.ts';
import { Supervision } from '../accounts/supervision.entity.ts';
import { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';

/** Everybody of the practice as `can` would know them, by name: a supervisor with this athlete's coach or without. */
export const actorsOfAthlete = async (
  em: EntityManager,
  athlete: Pick<Athlete, 'coach'>,
): Promise<{ user: User; actor: UserActor }[]> => {
  const users = await em.find(User, { disabledAt: null }, { orderBy: { name: 'asc', id: 'asc' } });
  const assigned = new Set(
    (await em.find(Supervision, { coach: athlete.coach.id })).map(
      ({ supervisor }) => supervisor.id,
    ),
  );
  return users.map((user) => ({
    user,
    actor: {
      kind: 'user',
      id: user.id,
      practiceId: user.practiceId,
      role: user.role,
      coachIds: user.role === 'supervisor' && assigned.has(user.id) ? [athlete.coach.id] : [],
    },
  }));
};
