import { LockMode } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Problem } from '../../http/problem.ts';
import { tokenHash } from '../../http/token-hash.ts';
import type { Sealer } from '../../main/sealer.ts';
import { notify } from '../accounts/notices.ts';
import { RecoveryCode } from '../accounts/recovery-code.entity.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { stepOfCode } from './totp.ts';

/** Upper case, without the spaces and hyphens that people put in. */
export const plainCode = (typed: string): string => typed.replace(/[\s-]/g, '').toUpperCase();

/** An open account, held until the transaction ends: of two who bring one code, one is late. */
export const lockedUser = (em: EntityManager, id: string): Promise<User | null> =>
  em.findOne(
    User,
    { id, disabledAt: null },
    { populate: ['codeSecret', 'passwordHash'], lockMode: LockMode.PESSIMISTIC_WRITE },
  );

/** Null where the instance has another key by now: no device fits any more, recovery codes do. */
const opened = (sealer: Sealer, sealed: string, of: string): Buffer | null => {
  try {
    return sealer.open(sealed, of);
  } catch {
    return null;
  }
};

/**
 * Takes a code of the device, which is then used up with all before it.
 * @throws Problem 'code-wrong'
 */
export const takeDeviceCode = async (
  em: EntityManager,
  user: User,
  sealer: Sealer,
  typed: string,
): Promise<void> => {
  const sealed = user.codeSecret.unwrap();
  if (!sealed) throw new Problem('code-wrong');
  const secret = opened(sealer, sealed, user.id);
  if (!secret) throw new Problem('code-wrong');
  const step = stepOfCode(secret, plainCode(typed), Date.now() / 1000, user.lastCodeStep ?? null);
  if (step === null) throw new Problem('code-wrong');
  await em.nativeUpdate(User, { id: user.id }, { lastCodeStep: step });
};

/**
 * Takes a code of the device or a recovery code, each once.
 * @throws Problem 'code-wrong'
 */
export const takeCode = async (
  em: EntityManager,
  user: User,
  sealer: Sealer,
  typed: string,
): Promise<void> => {
  const code = plainCode(typed);
  if (/^\d{6}$/.test(code)) return takeDeviceCode(em, user, sealer, code);
  const used = await em.nativeUpdate(
    RecoveryCode,
    { user: user.id, codeHash: tokenHash(code), usedAt: null },
    { usedAt: new Date() },
  );
  if (used === 0) throw new Problem('code-wrong');
  audit({ em, actor: { kind: 'user', id: user.id, role: user.role } }, 'account.recovery', user.id);
  await notify({ em }, user.id, 'recovery-used');
};
