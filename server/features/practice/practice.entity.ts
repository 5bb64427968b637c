import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt } from '#server/db/columns.ts';

/** The organisation that every other row belongs to; `id` is what they call `practice_id`. */
export const Practice = defineEntity({
  name: 'Practice',
  properties: {
    id: p.uuid().primary(),
    name: p.text(),
    /** How an athlete reaches the practice; shown on the replay. */
    contact: p.text().default(''),
    /** Owners do nothing before they have set up one-time codes. */
    ownersNeedCode: p.boolean().default(false),
    /** An athlete is deleted so long after their last visit; null: nothing is deleted by itself. */
    keepMonths: p.integer().nullable(),
    /** So many days lie between the withdrawal of a consent to filming and the deletion. */
    withdrawalDays: p.integer().default(30),
    createdAt: madeAt(),
  },
});
export type Practice = InferEntity<typeof Practice>;
