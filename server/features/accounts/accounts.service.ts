import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '../../db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { Problem } from '../../http/problem.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { audit } from '../audit/audit.ts';
import { type HalfSession, markOf } from '../one-time-codes/half-session.ts';
import { openSession } from './open-session.ts';
import { passwordFits } from './password.ts';
import { Session } from './session.entity.ts';

type SignInRow = {
  user_id: string;
  practice_id: string;
  password_hash: string;
  asks_code: boolean;
};

/** Signed in, or only half: the account asks for a code too. */
export type SignedIn =
  { readonly session: OpenSession } | { readonly half: Omit<HalfSession, 'until'> };

/**
 * Opens a session, or the second step of a sign-in. An unknown address, a closed account and a wrong password give
 * the same answer after the same time.
 * @throws Problem 'sign-in-refused'
 */
export const signIn = async (
  { orm, inPractice, sessions, log }: Pick<Ground, 'orm' | 'inPractice' | 'sessions' | 'log'>,
  { email, password }: { email: string; password: string },
  userAgent: string | undefined,
): Promise<SignedIn> => {
  const [row] = await orm.em.fork().execute<SignInRow[]>('select * from find_sign_in(?)', [email]);
  const fits = await passwordFits(password, row?.password_hash);
  if (row && !fits) {
    // not waited for: the answer must take as long for an address that nobody has
    inPractice({ practiceId: row.practice_id }, ({ em }) => {
      audit({ em, actor: { kind: 'nobody' } }, 'account.sign-in-refused', row.user_id);
      return Promise.resolve();
    }).catch((error: unknown) => {
      log.error({ err: error }, 'a refused sign-in was not written down');
    });
  }
  if (!row || !fits) throw new Problem('sign-in-refused');
  const { user_id: userId, practice_id: practiceId } = row;
  if (row.asks_code) return { half: { userId, practiceId, mark: markOf(row.password_hash) } };
  const session = await openSession({ inPractice, sessions }, practiceId, userAgent, () =>
    Promise.resolve(userId),
  );
  return { session };
};

/** Ends the session that asks. */
export const signOut = async (unit: Unit<UserActor>, id: string): Promise<void> => {
  if (await endOwn(unit, id)) audit(unit, 'account.sign-out', unit.actor.id);
};

/** Ends one session of the actor's own; fine where it has ended already. */
export const endSession = async (unit: Unit<UserActor>, id: string): Promise<void> => {
  if (await endOwn(unit, id)) audit(unit, 'session.end', id);
};

const endOwn = async (unit: Unit<UserActor>, id: string): Promise<boolean> => {
  const ended = await unit.em.nativeUpdate(
    Session,
    { id, user: unit.actor.id, revokedAt: null },
    { revokedAt: new Date() },
  );
  if (ended > 0) await tell(unit, { sessionId: id }, { type: 'signed-out' });
  return ended > 0;
};

/** Ends every session of the actor. */
export const signOutEverywhere = async (unit: Unit<UserActor>): Promise<void> => {
  const { em, actor } = unit;
  const open = { user: actor.id, revokedAt: null };
  const sessions = await em.nativeUpdate(Session, open, { revokedAt: new Date() });
  audit(unit, 'account.sign-out-everywhere', actor.id, { sessions });
  await tell(unit, { userId: actor.id }, { type: 'signed-out' });
};

/** The actor's open sessions, last used first. */
export const openSessions = ({ em, actor }: Unit<UserActor>): Promise<Session[]> =>
  em.find(
    Session,
    { user: actor.id, revokedAt: null, expiresAt: { $gt: new Date() } },
    { orderBy: { lastSeenAt: 'desc' } },
  );
