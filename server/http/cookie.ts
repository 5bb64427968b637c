import { parseCookie, stringifySetCookie } from 'cookie';
import type { Request } from 'express';

/** A cookie for the server alone, out of reach for scripts. */
export interface CookieKind {
  readonly name: string;
  /** The only addresses that it is sent to. */
  readonly path: string;
  readonly sameSite: 'lax' | 'strict';
}

/**
 * The name by which a browser vouches for a cookie: one with `__Host-` was set by this very host, encrypted and for
 * all of its addresses; one with `__Secure-`, which may be meant for some of them, was at least set encrypted. A
 * neighbouring host, or somebody on the line, can plant neither (RFC 6265bis, section 4.1.3). Over plain http, which
 * only the machine itself uses, a browser would refuse both.
 */
export const cookieName = ({ name, path }: CookieKind, secure: boolean): string => {
  if (!secure) return name;
  return path === '/' ? `__Host-${name}` : `__Secure-${name}`;
};

/**
 * The value of a `Set-Cookie` header.
 * @param maxAge seconds; 0 takes the cookie away
 */
export const cookieHeader = (
  kind: CookieKind,
  { value, maxAge, secure }: { value: string; maxAge: number; secure: boolean },
): string =>
  stringifySetCookie(cookieName(kind, secure), value, {
    httpOnly: true,
    sameSite: kind.sameSite,
    path: kind.path,
    secure,
    maxAge,
  });

/** What the request brings under this name, and under no other. */
export const cookieIn = (
  req: Pick<Request, 'headers'>,
  kind: CookieKind,
  secure: boolean,
): string | undefined => parseCookie(req.headers.cookie ?? '')[cookieName(kind, secure)];
