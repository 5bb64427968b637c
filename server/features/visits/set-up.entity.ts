import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { ownedRow, real } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** A practice's saved way of filming; lengths in millimetres. */
export const SetUp = defineEntity({
  name: 'SetUp',
  properties: {
    ...ownedRow(),
    name: p.text(),
    distanceMm: real(),
    lensHeightMm: real().nullable(),
    rodMm: real().nullable(),
    beltPointerMm: real().nullable(),
    thighPointerMm: real().nullable(),
    lastUsed: p.date().nullable(),
    savedBy: p.manyToOne(User).ref(),
  },
});
export type SetUp = InferEntity<typeof SetUp>;
