import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** A practice's saved way of filming; lengths in millimetres. */
export const SetUp = defineEntity({
  name: 'SetUp',
  properties: {
    ...ownedRow(),
    name: p.text(),
    distanceMm: p.double(),
    lensHeightMm: p.double().nullable(),
    rodMm: p.double().nullable(),
    beltPointerMm: p.double().nullable(),
    thighPointerMm: p.double().nullable(),
    lastUsed: p.date().nullable(),
    savedBy: p.manyToOne(User).ref(),
  },
});
export type SetUp = InferEntity<typeof SetUp>;
