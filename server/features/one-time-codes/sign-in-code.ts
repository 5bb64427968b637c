import { product } from '../../db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { openSession } from '../accounts/open-session.ts';
import { audit } from '../audit/audit.ts';
import { type HalfSession, markOf } from './half-session.ts';
import { lockedUser, takeCode } from './take-code.ts';

/**
 * The second step of a sign-in: it opens a new session, whose id nobody knew before.
 * @throws Problem 'half-gone' or 'code-wrong'
 */
export const signInWithCode = async (
  ground: Pick<Ground, 'inPractice' | 'sessions' | 'sealer'>,
  half: HalfSession | null,
  code: string,
  userAgent: string | undefined,
): Promise<OpenSession> => {
  if (!half) throw new Problem('half-gone');
  const { practiceId, userId, mark } = half;
  try {
    return await openSession(ground, practiceId, userAgent, async ({ em }) => {
      const user = await lockedUser(em, userId);
      if (!user?.codesSince || markOf(user.passwordHash.unwrap() ?? '') !== mark)
        throw new Problem('half-gone');
      await takeCode(em, user, ground.sealer, code);
      return user.id;
    });
  } catch (error) {
    if (error instanceof Problem && error.code === 'code-wrong')
      await ground.inPractice(product(practiceId), ({ em }) => {
        audit({ em, actor: { kind: 'nobody' } }, 'account.code-refused', userId);
        return Promise.resolve();
      });
    throw error;
  }
};
