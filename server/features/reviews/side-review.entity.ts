import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { moment, ownedRow } from '#server/db/columns.ts';
import { Visit } from '../visits/visit.entity.ts';
import { Review } from './review.entity.ts';

/** Where the review of one side stands: the queue and every list read it here. */
export const SideReview = defineEntity({
  name: 'SideReview',
  uniques: [{ properties: ['visit', 'side'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    /** The latest step. */
    last: p.manyToOne(Review).ref(),
    /** Handed in and waiting for a word since then; null where nothing waits. */
    waitsSince: moment().nullable(),
    /** It was sent back at some time. */
    sentBack: p.boolean().default(false),
  },
});
export type SideReview = InferEntity<typeof SideReview>;
