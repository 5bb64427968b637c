import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '../../db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { audit } from '../practice/audit.ts';
import { deviceName } from './device.ts';
import { passwordFits } from './password.ts';
import { Session } from './session.entity.ts';
import { User } from './user.entity.ts';

/** The last day of a session, however much it is used. */
const SESSION_DAYS = 30;

type SignInRow = { user_id: string; practice_id: string; password_hash: string };

/**
 * Opens a session. An unknown address, a closed account and a wrong password give the same answer after the same
 * time.
 * @throws Problem 'sign-in-refused'
 */
export const signIn = async (
  { orm, inPractice, sessions }: Pick<Ground, 'orm' | 'inPractice' | 'sessions'>,
  { email, password }: { email: string; password: string },
  userAgent: string | undefined,
): Promise<OpenSession> => {
  const [row] = await orm.em.fork().execute<SignInRow[]>('select * from find_sign_in(?)', [email]);
  const fits = await passwordFits(password, row?.password_hash);
  if (!row || !fits) throw new Problem('sign-in-refused');
  const id = await inPractice({ practiceId: row.practice_id }, async ({ em }) => {
    const session = em.create(Session, {
      user: em.getReference(User, row.user_id),
      device: deviceName(userAgent),
      expiresAt: new Date(Date.now() + SESSION_DAYS * 86_400_000),
    });
    audit({ em, actor: { kind: 'user', id: row.user_id } }, 'account.sign-in', row.user_id, {
      session: session.id,
    });
    await em.flush();
    return session.id;
  });
  return found(await sessions.findById(id));
};

/** Ends one session of the actor's own; fine where it has ended already. */
export const endSession = async (unit: Unit<UserActor>, id: string): Promise<void> => {
  const ended = await unit.em.nativeUpdate(
    Session,
    { id, user: unit.actor.id, revokedAt: null },
    { revokedAt: new Date() },
  );
  if (ended > 0) await tell(unit, { sessionId: id }, { type: 'signed-out' });
};

/** Ends every session of the actor. */
export const signOutEverywhere = async (unit: Unit<UserActor>): Promise<void> => {
  const { em, actor } = unit;
  await em.nativeUpdate(Session, { user: actor.id, revokedAt: null }, { revokedAt: new Date() });
  await tell(unit, { userId: actor.id }, { type: 'signed-out' });
};

/** The actor's open sessions, last used first. */
export const openSessions = ({ em, actor }: Unit<UserActor>): Promise<Session[]> =>
  em.find(
    Session,
    { user: actor.id, revokedAt: null, expiresAt: { $gt: new Date() } },
    { orderBy: { lastSeenAt: 'desc' } },
  );
