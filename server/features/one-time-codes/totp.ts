import { createHmac, timingSafeEqual } from 'node:crypto';

export type Algorithm = 'sha1' | 'sha256' | 'sha512';

/** Seconds that one code holds (RFC 6238, section 5.2). */
export const STEP_SECONDS = 30;
/** A clock may be one step off, either way. */
const STEPS_OFF = 1;
const DIGITS = 6;

/** A code by counter, RFC 4226, section 5.3. */
export const hotp = (
  secret: Buffer,
  counter: number,
  digits = DIGITS,
  algorithm: Algorithm = 'sha1',
): string => {
  const message = Buffer.alloc(8);
  message.writeBigUInt64BE(BigInt(counter));
  const mac = createHmac(algorithm, secret).update(message).digest();
  const offset = (mac.at(-1) ?? 0) & 0xf;
  const number = mac.readUInt32BE(offset) & 0x7fff_ffff;
  return String(number % 10 ** digits).padStart(digits, '0');
};

export const stepAt = (unixSeconds: number): number => Math.floor(unixSeconds / STEP_SECONDS);

/** A code by time, RFC 6238, section 4.2. */
export const totp = (
  secret: Buffer,
  unixSeconds: number,
  digits = DIGITS,
  algorithm: Algorithm = 'sha1',
): string => hotp(secret, stepAt(unixSeconds), digits, algorithm);

/**
 * The step that a code belongs to, if it holds now and is newer than the last one taken; null otherwise. A code
 * is taken once (RFC 6238, section 5.2).
 */
export const stepOfCode = (
  secret: Buffer,
  code: string,
  unixSeconds: number,
  lastStep: number | null,
): number | null => {
  const now = stepAt(unixSeconds);
  let taken: number | null = null;
  for (let step = now - STEPS_OFF; step <= now + STEPS_OFF; step += 1) {
    const fits =
      code.length === DIGITS && timingSafeEqual(Buffer.from(hotp(secret, step)), ascii(code));
    if (fits && step > (lastStep ?? -1)) taken = step;
  }
  return taken;
};

const ascii = (code: string): Buffer => Buffer.from(code.replace(/\D/g, ' '), 'latin1');
