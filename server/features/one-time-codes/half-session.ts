import { createHash } from 'node:crypto';
import { parseCookie, stringifySetCookie } from 'cookie';
import type { Request, Response } from 'express';
import * as z from 'zod';
import { cookieIsSecure } from '../../http/cookie-is-secure.ts';
import type { Ground } from '../../main/ground.ts';

const COOKIE = 'redshank_half';
/** The second step's address and nothing else. */
const PATH = '/api/sign-in/code';
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
  const cookie = stringifySetCookie(COOKIE, value, {
    httpOnly: true,
    sameSite: 'strict',
    path: PATH,
    secure: cookieIsSecure(config.publicUrl),
    maxAge,
  });
  res.append('Set-Cookie', cookie);
};

/** The password was right; for five minutes a code is asked for. It opens nothing else and names no session. */
export const setHalfSession = (
  res: Response,
  keys: Keys,
  given: Omit<HalfSession, 'until'>,
): void => {
  const until = Date.now() + LASTS_SECONDS * 1000;
  const sealed = keys.sealer.seal(Buffer.from(JSON.stringify({ ...given, until })), COOKIE);
  put(res, keys, sealed, LASTS_SECONDS);
};

export const clearHalfSession = (res: Response, keys: Keys): void => put(res, keys, '', 0);

/** Null where there is none, it is over, or it was not made here. */
export const readHalfSession = (req: Request, { sealer }: Keys): HalfSession | null => {
  const sealed = parseCookie(req.headers.cookie ?? '')[COOKIE];
  if (sealed === undefined) return null;
  try {
    const read = half.parse(JSON.parse(sealer.open(sealed, COOKIE).toString()));
    return read.until > Date.now() ? read : null;
  } catch {
    return null;
  }
};
