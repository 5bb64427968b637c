import type { EntityManager } from '@mikro-orm/postgresql';
import type { Role } from '#shared/access/actors.ts';
import { Supervision } from './supervision.entity.ts';
import { User } from './user.entity.ts';

let count = 0;

/** bcrypt of 'a plain test word', at the lowest cost. */
export const TEST_PASSWORD = 'a plain test word';
const TEST_HASH = '$2b$04$aAPa/ZMG6hkIGUZbVayMf.FUeAf0h7YoFJdB1SEjLtlMatCq6Rreu';

/** An account; give `passwordHash` for one that is signed in to outside tests. */
export const makeUser = (
  em: EntityManager,
  given: { role: Role; name?: string; email?: string; passwordHash?: string },
): User => {
  count += 1;
  return em.create(User, {
    role: given.role,
    name: given.name ?? `Test ${given.role} ${count}`,
    email: given.email ?? `${given.role}-${count}@test.example`,
    passwordHash: given.passwordHash ?? TEST_HASH,
  });
};

export const assignCoach = (em: EntityManager, supervisor: User, coach: User): Supervision =>
  em.create(Supervision, { supervisor, coach });
