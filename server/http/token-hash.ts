import { createHash, randomBytes } from 'node:crypto';

/** What is kept of a link's token: SHA-256, hex. A token has 256 random bits, so it needs no salt and no slowness. */
export const tokenHash = (token: string): string =>
  createHash('sha256').update(token).digest('hex');

/** 256 random bits, base64url. Kept nowhere but in the address that is handed out. */
export const newToken = (): string => randomBytes(32).toString('base64url');
