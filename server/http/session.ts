import type { EntityManager } from '@mikro-orm/postgresql';
import type { Request, RequestHandler, Response } from 'express';
import jwt from 'jsonwebtoken';
import * as z from 'zod';
import type { Role, UserActor } from '#shared/access/actors.ts';
import { askerNow } from './asker.ts';
import { cookieHeader, cookieIn, type CookieKind, cookieName } from './cookie.ts';
import { Problem } from './problem.ts';

const COOKIE: CookieKind = { name: 'redshank_session', path: '/', sameSite: 'lax' };
const TOKEN_MINUTES = 10;
/** A session that was not used for this long is over, whatever its last day. */
const IDLE_HOURS = 12;
const SEEN_EVERY_SECONDS = 60;

/** The name of the session's cookie; `secure` as the instance's address has it. */
export const sessionCookieName = (secure: boolean): string => cookieName(COOKIE, secure);

/** A session as the database confirms it on every request. */
export interface OpenSession {
  readonly id: string;
  readonly expiresAt: Date;
  readonly actor: UserActor;
  readonly user: {
    readonly id: string;
    readonly name: string;
    readonly email: string;
    readonly role: Role;
  };
  readonly practice: { readonly id: string; readonly name: string };
  /** An owner whose practice asks its owners for one-time codes, and who has none yet. */
  readonly codeMissing: boolean;
}

const claims = z.object({ sid: z.uuid(), exp: z.int() });

type SessionRow = {
  session_id: string;
  expires_at: string;
  last_seen_at: string;
  user_id: string;
  user_name: string;
  email: string;
  role: Role;
  practice_id: string;
  practice_name: string;
  coach_ids: string[];
  code_missing: boolean;
};

export interface SessionKeeper {
  /**
   * Refuses with 'sign-in-needed' where no session is open, and with 'codes-needed' where it may only set up
   * one-time codes; otherwise `staffOf` tells who it is.
   */
  readonly whoIs: RequestHandler;
  /** The same, for what is open before codes are set up. */
  readonly whoIsBeforeCodes: RequestHandler;
  /** The session of this request's cookie, or null. */
  readonly find: (req: Request, res: Response) => Promise<OpenSession | null>;
  /** The same without giving it more time. */
  readonly findAsItIs: (req: Request) => Promise<OpenSession | null>;
  readonly findById: (id: string) => Promise<OpenSession | null>;
  /** The value of a `Set-Cookie` header that carries this session. */
  readonly cookieFor: (sessionId: string) => string;
  readonly setCookie: (res: Response, sessionId: string) => void;
  readonly clearCookie: (res: Response) => void;
}

/**
 * The cookie holds a token of ten minutes that names the session; the session's row decides. A token past its
 * ten minutes is good for one thing only, a new token, and only while the session itself is neither revoked,
 * over, nor idle for too long.
 * @param db rows of the narrow look-up functions, outside any practice
 */
export const keepSessions = (options: {
  readonly db: () => EntityManager;
  readonly key: string;
  readonly secure: boolean;
}): SessionKeeper => {
  const { db, key, secure } = options;

  const cookieFor = (sessionId: string): string => {
    const token = jwt.sign({ sid: sessionId }, key, {
      algorithm: 'HS256',
      expiresIn: TOKEN_MINUTES * 60,
    });
    return cookieHeader(COOKIE, { value: token, maxAge: IDLE_HOURS * 3600, secure });
  };
  const setCookie = (res: Response, sessionId: string): void => {
    res.append('Set-Cookie', cookieFor(sessionId));
  };
  const clearCookie = (res: Response): void => {
    res.append('Set-Cookie', cookieHeader(COOKIE, { value: '', maxAge: 0, secure }));
  };

  const findById = async (id: string): Promise<OpenSession | null> => {
    const [row] = await db().execute<SessionRow[]>('select * from find_session(?)', [id]);
    if (!row) return null;
    const idle = Date.now() - new Date(row.last_seen_at).getTime();
    if (idle > IDLE_HOURS * 3_600_000) return null;
    if (idle > SEEN_EVERY_SECONDS * 1000) await db().execute('select touch_session(?)', [id]);
    return sessionOf(row);
  };

  const namedBy = (req: Request): z.infer<typeof claims> | null => {
    const token = cookieIn(req, COOKIE, secure);
    return token === undefined ? null : readToken(token, key);
  };
  const findAsItIs = async (req: Request): Promise<OpenSession | null> => {
    const named = namedBy(req);
    return named && findById(named.sid);
  };
  const find = async (req: Request, res: Response): Promise<OpenSession | null> => {
    const named = namedBy(req);
    if (!named) return null;
    const session = await findById(named.sid);
    // Half of its time is left for the requests that are already under way.
    const asker = askerNow();
    if (session && asker) asker.sessionId = session.id;
    if (session && named.exp - Date.now() / 1000 < (TOKEN_MINUTES * 60) / 2)
      setCookie(res, session.id);
    return session;
  };

  const whoIsBeforeCodes: RequestHandler = async (req, res, next) => {
    const session = await find(req, res);
    if (!session) throw new Problem('sign-in-needed');
    (res.locals as { session?: OpenSession }).session = session;
    next();
  };
  const whoIs: RequestHandler = (req, res, next) =>
    whoIsBeforeCodes(req, res, (error?: unknown) => {
      if (error !== undefined) return next(error);
      if (staffOf(res).codeMissing) throw new Problem('codes-needed');
      next();
    });

  return { whoIs, whoIsBeforeCodes, find, findAsItIs, findById, cookieFor, setCookie, clearCookie };
};

const readToken = (token: string, key: string): z.infer<typeof claims> | null => {
  try {
    const payload = jwt.verify(token, key, { algorithms: ['HS256'], ignoreExpiration: true });
    return claims.safeParse(payload).data ?? null;
  } catch {
    return null;
  }
};

const sessionOf = (row: SessionRow): OpenSession => ({
  id: row.session_id,
  expiresAt: new Date(row.expires_at),
  user: { id: row.user_id, name: row.user_name, email: row.email, role: row.role },
  practice: { id: row.practice_id, name: row.practice_name },
  codeMissing: row.code_missing,
  actor: {
    kind: 'user',
    id: row.user_id,
    practiceId: row.practice_id,
    role: row.role,
    coachIds: row.coach_ids,
  },
});

/** Who asks, behind `whoIs`. */
export const staffOf = (res: Response): OpenSession => {
  const { session } = res.locals as { session?: OpenSession };
  if (!session) throw new Problem('sign-in-needed');
  return session;
};
