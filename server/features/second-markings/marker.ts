import type { EntityManager } from '@mikro-orm/postgresql';
import { can } from '#shared/access/can.ts';
import { caseloadOf } from '../../http/need.ts';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { actorsOfAthlete } from '../people/actors-of-athlete.ts';

/** Everybody of the practice who may mark frames of this athlete a second time, by name. */
export const possibleMarkers = async (em: EntityManager, athlete: Athlete): Promise<User[]> =>
  (await actorsOfAthlete(em, athlete))
    .filter(({ actor }) => can(actor, 'marks.second', caseloadOf(athlete)))
    .map(({ user }) => user);
