import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt, moment, ownedRow, ownPractice } from '#server/db/columns.ts';

/** A job that is committed with the state it belongs to and relayed to the queue under the same id. */
export const JobOutbox = defineEntity({
  name: 'JobOutbox',
  indexes: [{ properties: ['sentAt', 'createdAt'] }],
  properties: {
    ...ownedRow(),
    /** Null for what belongs to no practice, such as the letter to who forgot a password. */
    practiceId: ownPractice().nullable(),
    queue: p.text(),
    payload: p.json<Record<string, unknown>>(),
    /** Larger comes first among the jobs of one queue. */
    priority: p.integer().default(0),
    /** Not before this moment; null is at once. */
    startAfter: moment().nullable(),
    createdAt: madeAt(),
    sentAt: moment().nullable(),
  },
});
export type JobOutbox = InferEntity<typeof JobOutbox>;
