import type { EntityManager } from '@mikro-orm/postgresql';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { peopleFor } from '../people/people-for.ts';

/** Everybody whose word on this athlete's readings counts, by name. */
export const reviewersOf = (em: EntityManager, athlete: Athlete): Promise<User[]> =>
  peopleFor(em, athlete, 'review.decide');
