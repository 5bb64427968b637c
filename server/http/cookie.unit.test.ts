import { describe, expect, it } from 'vitest';
import { cookieHeader, cookieIn, type CookieKind } from './cookie.ts';

const everywhere: CookieKind = { name: 'bird', path: '/', sameSite: 'lax' };
const oneAddress: CookieKind = { name: 'bird', path: '/api/nest', sameSite: 'strict' };
const given = { value: 'grey', maxAge: 60 };

describe('a cookie', () => {
  // RFC 6265bis, section 4.1.3: __Host- asks for Secure, Path=/ and no Domain; __Secure- for Secure
  it('is named so that a browser vouches for it', () => {
    expect(cookieHeader(everywhere, { ...given, secure: true })).toBe(
      '__Host-bird=grey; Max-Age=60; Path=/; HttpOnly; Secure; SameSite=Lax',
    );
    expect(cookieHeader(oneAddress, { ...given, secure: true })).toBe(
      '__Secure-bird=grey; Max-Age=60; Path=/api/nest; HttpOnly; Secure; SameSite=Strict',
    );
  });

  it('over plain http has a name that a browser keeps there', () => {
    expect(cookieHeader(everywhere, { ...given, secure: false })).toBe(
      'bird=grey; Max-Age=60; Path=/; HttpOnly; SameSite=Lax',
    );
  });

  it('is read under its own name alone', () => {
    const req = { headers: { cookie: 'bird=planted; __Secure-bird=other; __Host-bird=own' } };
    expect(cookieIn(req, everywhere, true)).toBe('own');
    expect(cookieIn(req, oneAddress, true)).toBe('other');
    expect(cookieIn(req, everywhere, false)).toBe('planted');
    expect(cookieIn({ headers: {} }, everywhere, true)).toBeUndefined();
  });
});
