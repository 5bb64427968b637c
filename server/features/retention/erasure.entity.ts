import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { erasureReason } from '#shared/contracts/retention.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/**
 * What is left of an athlete who was erased: that it was done, when, why and how much. The rows are gone when this one
 * is there; `prefixes` and `uploads` name the files that still have to go, and are emptied at the end.
 */
export const Erasure = defineEntity({
  name: 'Erasure',
  indexes: [{ properties: ['practiceId', 'askedAt'] }],
  properties: {
    ...ownedRow(),
    /** No foreign key: the athlete is gone. */
    athleteId: p.uuid(),
    why: p.enum(erasureReason.options),
    /** Null where the product itself did it. */
    askedBy: p.manyToOne(User).ref().nullable(),
    askedAt: madeAt(),
    visits: p.integer(),
    clips: p.integer(),
    bytes: p.bigint('number'),
    /** Everything in storage under these. */
    prefixes: p.array<string>((value) => value),
    /** Uploads that were under way, by their names among what comes in. */
    uploads: p.array<string>((value) => value),
    doneAt: moment().nullable(),
  },
});
export type Erasure = InferEntity<typeof Erasure>;
