import type { EntityManager } from '@mikro-orm/postgresql';
import { User } from '../../features/accounts/user.entity.ts';
import type { DemoAccount } from './accounts.ts';

/** An account of the demo. */
export const makePerson = (
  em: EntityManager,
  { role, name, email }: DemoAccount,
  passwordHash: string,
): User => em.create(User, { role, name, email, passwordHash });
