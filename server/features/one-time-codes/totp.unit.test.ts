import { describe, expect, it } from 'vitest';
import { base32 } from './base32.ts';
import { type Algorithm, hotp, stepAt, stepOfCode, totp } from './totp.ts';

const ascii = (text: string, bytes: number): Buffer =>
  Buffer.from(text.repeat(Math.ceil(bytes / text.length)).slice(0, bytes), 'ascii');
const SEED = '1234567890';
const SECRET = ascii(SEED, 20);

describe('RFC 4226, appendix D', () => {
  it.each(
    [
      '755224',
      '287082',
      '359152',
      '969429',
      '338314',
      '254676',
      '287922',
      '162583',
      '399871',
      '520489',
    ].map((code, counter) => ({ code, counter })),
  )('counter $counter: $code', ({ code, counter }) => {
    expect(hotp(SECRET, counter)).toBe(code);
  });
});

describe('RFC 6238, appendix B', () => {
  // the seeds have the length of each algorithm's answer, as in the program of appendix A
  const secrets: Record<Algorithm, Buffer> = {
    sha1: SECRET,
    sha256: ascii(SEED, 32),
    sha512: ascii(SEED, 64),
  };
  it.each([
    [59, '94287082', '46119246', '90693936'],
    [1111111109, '07081804', '68084774', '25091201'],
    [1111111111, '14050471', '67062674', '99943326'],
    [1234567890, '89005924', '91819424', '93441116'],
    [2000000000, '69279037', '90698825', '38618901'],
    [20000000000, '65353130', '77737706', '47863826'],
  ])('at %i s', (seconds, sha1, sha256, sha512) => {
    expect(totp(secrets.sha1, seconds, 8, 'sha1')).toBe(sha1);
    expect(totp(secrets.sha256, seconds, 8, 'sha256')).toBe(sha256);
    expect(totp(secrets.sha512, seconds, 8, 'sha512')).toBe(sha512);
  });
});

describe('RFC 4648, section 10', () => {
  it.each([
    ['', ''],
    ['f', 'MY'],
    ['fo', 'MZXQ'],
    ['foo', 'MZXW6'],
    ['foob', 'MZXW6YQ'],
    ['fooba', 'MZXW6YTB'],
    ['foobar', 'MZXW6YTBOI'],
  ])('%s in base 32, without padding, is %s', (plain, coded) => {
    expect(base32(Buffer.from(plain))).toBe(coded);
  });
});

describe('a code', () => {
  const now = 1_800_000_010;
  const codeAt = (seconds: number) => totp(SECRET, seconds);

  it('holds in its step and one step to either side', () => {
    for (const off of [-30, 0, 30])
      expect(stepOfCode(SECRET, codeAt(now + off), now, null)).toBe(stepAt(now + off));
    for (const off of [-60, 60])
      expect(stepOfCode(SECRET, codeAt(now + off), now, null)).toBeNull();
  });

  it('is taken once, and with it every older one', () => {
    const step = stepOfCode(SECRET, codeAt(now), now, null);
    expect(stepOfCode(SECRET, codeAt(now), now, step)).toBeNull();
    expect(stepOfCode(SECRET, codeAt(now - 30), now, step)).toBeNull();
    expect(stepOfCode(SECRET, codeAt(now + 30), now, step)).toBe(stepAt(now) + 1);
  });

  it.each(['', '12345', '1234567', 'abcdef', '１２３４５６', '      '])('is not %j', (code) => {
    expect(stepOfCode(SECRET, code, now, null)).toBeNull();
  });
});
