import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { PlanBasis } from '#shared/contracts/plans.ts';
import { side } from '#shared/contracts/primitives.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Reading } from '../readings/reading.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** What to do after one side of a visit was tested: exercises, or a retest alone. One for each side. */
export const Plan = defineEntity({
  name: 'Plan',
  uniques: [{ properties: ['visit', 'side'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    basis: p.json<PlanBasis>(),
    /** The reading that it was made from; null: a call by eye. */
    reading: p.manyToOne(Reading).ref().nullable(),
    /** The rule that suggested its exercises; null: a retest without any. */
    rule: p.text().nullable(),
    because: p.text(),
    note: p.text().default(''),
    retestOn: p.date().nullable(),
    madeBy: p.manyToOne(User).ref(),
    madeAt: madeAt(),
    editedAt: moment().nullable(),
    version: p.integer().version(),
  },
});
export type Plan = InferEntity<typeof Plan>;
