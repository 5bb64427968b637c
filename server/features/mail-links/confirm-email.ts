import { UniqueConstraintViolationException } from '@mikro-orm/core';
import { product } from '../../db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { Ground } from '../../main/ground.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { liveMailLink, useUp } from './live-mail-link.ts';
import { MailLink } from './mail-link.entity.ts';

/**
 * Confirms a change of address from one of its two letters; with the second it holds.
 * @throws Problem 'link-gone' or, where the address was taken meanwhile, 'address-taken'
 */
export const confirmEmail = async (
  ground: Pick<Ground, 'orm' | 'inPractice'>,
  token: string,
): Promise<{ done: boolean }> => {
  const link = await liveMailLink(ground, token, ['email-from', 'email-to']);
  const { practice_id: practiceId, user_id: userId, new_email: email } = link;
  if (practiceId === null || userId === null || email === null) throw new Problem('link-gone');
  try {
    return await ground.inPractice(product(practiceId), async ({ em }) => {
      // both at once: one waits here, and finds the other confirmed
      await em.execute('select 1 from account where id = ? for update', [userId]);
      await useUp(em, token);
      const open = { changeId: link.change_id, usedAt: null };
      if ((await em.count(MailLink, open)) > 0) return { done: false };
      await em.nativeUpdate(User, { id: userId }, { email });
      audit({ em, actor: { kind: 'product' } }, 'account.email', userId);
      return { done: true };
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) throw new Problem('address-taken');
    throw error;
  }
};
