import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { ownedRow } from '#server/db/columns.ts';
import { User } from './user.entity.ts';

/** A supervisor sees the athletes of the coaches assigned to them. */
export const Supervision = defineEntity({
  name: 'Supervision',
  uniques: [{ properties: ['supervisor', 'coach'] }],
  properties: {
    ...ownedRow(),
    supervisor: p.manyToOne(User).ref(),
    coach: p.manyToOne(User).ref(),
  },
});
export type Supervision = InferEntity<typeof Supervision>;
