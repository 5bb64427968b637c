import { randomUUID } from 'node:crypto';
import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type * as z from 'zod';
import type { joinBody, resetBody } from '#shared/contracts/mail-links.ts';
import { product } from '../../db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { endSessionsOf, openSession } from '../accounts/open-session.ts';
import { needHardToGuess } from '../accounts/guessable.ts';
import { notify } from '../accounts/notices.ts';
import { hashPassword } from '../accounts/password.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { Practice } from '../practice/practice.entity.ts';
import { liveMailLink, useUp } from './live-mail-link.ts';

type Door = Pick<Ground, 'orm' | 'inPractice' | 'sessions'>;

/**
 * Makes the account that a link invites to, and for a new practice the practice with it.
 * @throws Problem 'link-gone', 'invalid-input' or 'address-taken'
 */
export const join = async (
  ground: Door,
  { token, name, password }: z.output<typeof joinBody>,
  userAgent: string | undefined,
): Promise<OpenSession> => {
  const link = await liveMailLink(ground, token, ['invitation', 'start']);
  await needHardToGuess(password, [name, link.email, link.practice_name], 'password');
  const passwordHash = await hashPassword(password);
  const practiceId = link.practice_id ?? randomUUID();
  try {
    return await openSession(ground, practiceId, userAgent, async ({ em }) => {
      await useUp(em, token);
      if (link.practice_id === null) {
        em.create(Practice, { id: practiceId, name: link.practice_name });
        await em.flush();
      }
      const role = link.kind === 'start' ? 'owner' : (link.role ?? 'coach');
      const user = em.create(User, { email: link.email, name, role, passwordHash });
      const unit = { em, actor: { kind: 'user', id: user.id, role } } as const;
      if (link.kind === 'start') audit(unit, 'practice.start', practiceId);
      audit(unit, 'account.join', user.id, { as: role });
      await em.flush();
      return user.id;
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) throw new Problem('address-taken');
    throw error;
  }
};

/**
 * Sets a new password and ends every session: whoever had the old one is out.
 * @throws Problem 'link-gone' or 'invalid-input'
 */
export const resetPassword = async (
  ground: Door,
  { token, password }: z.output<typeof resetBody>,
): Promise<void> => {
  const {
    practice_id: practiceId,
    user_id: userId,
    email,
  } = await liveMailLink(ground, token, ['reset']);
  if (practiceId === null || userId === null) throw new Problem('link-gone');
  await needHardToGuess(password, [email], 'password');
  const passwordHash = await hashPassword(password);
  await ground.inPractice(product(practiceId), async (unit) => {
    await useUp(unit.em, token);
    await unit.em.nativeUpdate(User, { id: userId }, { passwordHash });
    await endSessionsOf(unit, userId);
    audit({ em: unit.em, actor: { kind: 'nobody' } }, 'account.reset-password', userId);
    await notify(unit, userId, 'password-changed');
  });
};
