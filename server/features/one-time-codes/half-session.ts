import { createHash } from 'node:crypto';
import type { Request, Response } from 'express';
import * as z from 'zod';
import { cookieIsSecure } from '../../http/cookie-is-secure.ts';
import { cookieHeader, cookieIn, type CookieKind } from '../../http/cookie.ts';
import type { Ground } from '../../main/ground.ts';

/** Sent to the second step's address and to no other. */
const COOKIE: CookieKind = { name: 'redshank_half', path: '/api/sign-in/code', sameSite: 'strict' };
const LASTS_SECONDS = 5 * 60;

const half = z.object({
  userId: z.uuid(),
  practiceId: z.uuid(),
  /** Of the password that was given: one changed meanwhile ends the half way. */
  mark: z.string(),
  until: z.int(),
});
export type HalfSession = z.infer<typeof half>;

export const markOf = (passwordHash: string): string =>
  createHash('sha256').update(passwordHash).digest('base64url').slice(0, 16);

type Keys = Pick<Ground, 'config' | 'sealer'>;

const put = (res: Response, { config }: Keys, value: string, maxAge: number): void => {
  const secure = cookieIsSecure(config.publicUrl);
  res.append('Set-Cookie', cookieHeader(COOKIE, { value, maxAge, secure }));
};

/** The password was right; for five minutes a code is asked for. It opens nothing else and names no session. */
export const setHalfSession = (
  res: Response,
  keys: Keys,
  given: Omit<HalfSession, 'until'>,
): void => {
  const until = Date.now() + LASTS_SECONDS * 1000;
  const sealed = keys.sealer.seal(Buffer.from(JSON.stringify({ ...given, until })), COOKIE.name);
  put(res, keys, sealed, LASTS_SECONDS);
};

export const clearHalfSession = (res: Response, keys: Keys): void => put(res, keys, '', 0);

/** Null where there is none, it is over, or it was not made here. */
export const readHalfSession = (req: Request, { config, sealer }: Keys): HalfSession | null => {
  const sealed = cookieIn(req, COOKIE, cookieIsSecure(config.publicUrl));
  if (sealed === undefined) return null;
  try {
    const read = half.parse(JSON.parse(sealer.open(sealed, COOKIE.name).toString()));
    return read.until > Date.now() ? read : null;
  } catch {
    return null;
  }
};
