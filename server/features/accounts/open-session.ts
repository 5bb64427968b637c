import type { ProductActor, Unit } from '../../db/in-practice.ts';
import { product } from '../../db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { found } from '../../http/need.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { audit } from '../audit/audit.ts';
import { deviceName } from './device.ts';
import { Session } from './session.entity.ts';
import { User } from './user.entity.ts';

/** The last day of a session, however much it is used. */
const SESSION_DAYS = 30;

/**
 * Opens a session in the transaction that proves who it is for.
 * @param prove gives the account's id, or throws
 */
export const openSession = async (
  { inPractice, sessions }: Pick<Ground, 'inPractice' | 'sessions'>,
  practiceId: string,
  userAgent: string | undefined,
  prove: (unit: Unit<ProductActor>) => Promise<string>,
): Promise<OpenSession> => {
  const id = await inPractice(product(practiceId), async (unit) => {
    const { em } = unit;
    const user = await em.findOneOrFail(User, { id: await prove(unit) });
    const session = em.create(Session, {
      user,
      device: deviceName(userAgent),
      expiresAt: new Date(Date.now() + SESSION_DAYS * 86_400_000),
    });
    const actor = { kind: 'user', id: user.id, role: user.role } as const;
    audit({ em, actor }, 'account.sign-in', user.id, { session: session.id });
    await em.flush();
    return session.id;
  });
  return found(await sessions.findById(id));
};

/**
 * Ends the sessions of an account.
 * @param exceptId the session that goes on
 */
export const endSessionsOf = async (
  unit: Unit<{ readonly practiceId: string }>,
  userId: string,
  exceptId?: string,
): Promise<void> => {
  const open = { user: userId, revokedAt: null, ...(exceptId ? { id: { $ne: exceptId } } : {}) };
  const ended = await unit.em.find(Session, open, { fields: ['id'] });
  await unit.em.nativeUpdate(Session, open, { revokedAt: new Date() });
  for (const { id } of ended) await tell(unit, { sessionId: id }, { type: 'signed-out' });
};
