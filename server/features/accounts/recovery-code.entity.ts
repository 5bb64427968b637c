import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { moment, ownedRow } from '#server/db/columns.ts';
import { User } from './user.entity.ts';

/** Signs in once in place of a one-time code, where the device that makes them is lost. */
export const RecoveryCode = defineEntity({
  name: 'RecoveryCode',
  properties: {
    ...ownedRow(),
    user: p.manyToOne(User).ref(),
    /** SHA-256, hex: 80 random bits need no salt and no slowness. */
    codeHash: p.text(),
    usedAt: moment().nullable(),
  },
});
export type RecoveryCode = InferEntity<typeof RecoveryCode>;
