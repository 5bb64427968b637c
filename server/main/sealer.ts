import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';

/** Keeps what must be read again, such as the secret of one-time codes, unreadable in the database and its copies. */
export interface Sealer {
  /** @param of what it belongs to: sealed for one thing, it does not open for another */
  readonly seal: (plain: Buffer, of: string) => string;
  /** Throws where it was changed, or sealed for another thing or under another key. */
  readonly open: (sealed: string, of: string) => Buffer;
}

const CIPHER = 'aes-256-gcm';
const KEY = 32;
const NONCE = 12;
const TAG = 16;

/**
 * AES-256-GCM under a key derived from a secret of the instance (HKDF, RFC 5869). The nonces are random: for one
 * key that is sound up to some billions of messages, far more than people sign in.
 */
export const sealWith = (secret: string): Sealer => {
  const key = Buffer.from(hkdfSync('sha256', secret, '', 'redshank sealer', KEY));
  return {
    seal: (plain, of) => {
      const nonce = randomBytes(NONCE);
      const cipher = createCipheriv(CIPHER, key, nonce, { authTagLength: TAG }).setAAD(
        Buffer.from(of),
      );
      const body = Buffer.concat([cipher.update(plain), cipher.final()]);
      return Buffer.concat([nonce, cipher.getAuthTag(), body]).toString('base64url');
    },
    open: (sealed, of) => {
      const bytes = Buffer.from(sealed, 'base64url');
      const decipher = createDecipheriv(CIPHER, key, bytes.subarray(0, NONCE), {
        authTagLength: TAG,
      })
        .setAAD(Buffer.from(of))
        .setAuthTag(bytes.subarray(NONCE, NONCE + TAG));
      return Buffer.concat([decipher.update(bytes.subarray(NONCE + TAG)), decipher.final()]);
    },
  };
};
