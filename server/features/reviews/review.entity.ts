import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { reviewStep } from '#shared/contracts/reviews.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Call } from '../calls/call.entity.ts';
import { Reading } from '../readings/reading.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** One step of a side's review: handed in, signed off, sent back. Only added to. */
export const Review = defineEntity({
  name: 'Review',
  indexes: [{ properties: ['visit', 'side', 'at'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    step: p.enum(reviewStep.shape.step.options),
    /** What it is about: one of the two. */
    reading: p.manyToOne(Reading).ref().nullable(),
    call: p.manyToOne(Call).ref().nullable(),
    reason: p.text(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type Review = InferEntity<typeof Review>;
