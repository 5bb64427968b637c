import { randomBytes } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import { tokenHash } from '../../http/token-hash.ts';
import { RecoveryCode } from '../accounts/recovery-code.entity.ts';
import { base32 } from './base32.ts';
import { plainCode } from './take-code.ts';

const COUNT = 10;
/** 120 bits: a plain hash of so many cannot be searched (above the 112 that ASVS 5.0 asks for). */
const BYTES = 15;

/** Random, in six groups that can be read out. */
const newCode = (): string =>
  (base32(randomBytes(BYTES)).match(/.{4}/g) ?? []).join('-').toLowerCase();

/** Makes recovery codes in place of those before. Their hashes are kept; the codes are shown now or never. */
export const makeRecoveryCodes = async (em: EntityManager, userId: string): Promise<string[]> => {
  await em.nativeDelete(RecoveryCode, { user: userId });
  const codes = Array.from({ length: COUNT }, newCode);
  for (const code of codes)
    em.create(RecoveryCode, { user: userId, codeHash: tokenHash(plainCode(code)) });
  return codes;
};
