import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { Account, nameBody, passwordBody } from '#shared/contracts/accounts.ts';
import type { Unit } from '../../db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { audit } from '../audit/audit.ts';
import { needHardToGuess } from './guessable.ts';
import { endSessionsOf } from './open-session.ts';
import { openEmailChange } from './open-email-change.ts';
import { hashPassword, passwordFits } from './password.ts';
import { notify } from './notices.ts';
import { RecoveryCode } from './recovery-code.entity.ts';
import { User } from './user.entity.ts';

type Of = Unit<UserActor>;
/** Opens units of work of this actor, see `serve`. */
export type Work = <T>(work: (unit: Of) => Promise<T>) => Promise<T>;

export const ownAccount = async (unit: Of): Promise<Account> => {
  const { id, name, email, codesSince } = await unit.em.findOneOrFail(User, {
    id: unit.actor.id,
  });
  return {
    name,
    email,
    emailChange: await openEmailChange(unit),
    codes: {
      since: codesSince?.toISOString() ?? null,
      recoveryLeft: await unit.em.count(RecoveryCode, { user: id, usedAt: null }),
    },
  };
};

export const changeName = async (
  unit: Of,
  { name }: z.output<typeof nameBody>,
): Promise<Account> => {
  const user = await unit.em.findOneOrFail(User, { id: unit.actor.id });
  unit.em.assign(user, { name });
  audit(unit, 'account.rename', user.id);
  await unit.em.flush();
  return ownAccount(unit);
};

/**
 * Asked before anything by which an account could be taken away; whose it is. It takes a third of a second, outside
 * of any transaction.
 * @throws Problem 'password-wrong'
 */
export const needPassword = async (work: Work, password: string): Promise<User> => {
  const user = await work(({ em, actor }) =>
    em.findOneOrFail(User, { id: actor.id }, { populate: ['passwordHash'] }),
  );
  if (!(await passwordFits(password, user.passwordHash.unwrap())))
    throw new Problem('password-wrong');
  return user;
};

/**
 * @param sessionId the session that goes on; every other ends
 * @throws Problem 'password-wrong' or 'invalid-input'
 */
export const changePassword = async (
  work: Work,
  { current, next }: z.output<typeof passwordBody>,
  sessionId: string,
): Promise<void> => {
  const { name, email } = await needPassword(work, current);
  await needHardToGuess(next, [name, email], 'next');
  const passwordHash = await hashPassword(next);
  await work(async (unit) => {
    const { id } = unit.actor;
    await unit.em.nativeUpdate(User, { id }, { passwordHash });
    await endSessionsOf(unit, id, sessionId);
    audit(unit, 'account.password', id);
    await notify(unit, id, 'password-changed');
  });
};
