import type { EntityManager } from '@mikro-orm/postgresql';
import { RecoveryCode } from '../accounts/recovery-code.entity.ts';
import { User } from '../accounts/user.entity.ts';

/** From now on the account asks for its password alone; no code of before counts any more. */
export const dropCodes = async (em: EntityManager, id: string): Promise<void> => {
  await em.nativeUpdate(User, { id }, { codesSince: null, codeSecret: null, lastCodeStep: null });
  await em.nativeDelete(RecoveryCode, { user: id });
};
