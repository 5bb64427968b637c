import type { Request, Response } from 'express';
import type { OpenSession } from '../../http/session.ts';
import type { Ground } from '../../main/ground.ts';
import { signOut } from './accounts.service.ts';

/**
 * Hands the browser its new session. The one it had until now ends: left open, it would be in nobody's hands, and
 * good for whoever had copied it.
 */
export const enter = async (
  { sessions, inPractice }: Pick<Ground, 'sessions' | 'inPractice'>,
  req: Request,
  res: Response,
  session: OpenSession,
): Promise<void> => {
  const before = await sessions.findAsItIs(req);
  if (before) await inPractice(before.actor, (unit) => signOut(unit, before.id));
  sessions.setCookie(res, session.id);
};
