import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { GivenPlan as Content } from '#shared/contracts/athlete-plan.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Plan } from './plan.entity.ts';

/** What the athlete got on one day, or that it was stopped. Only added to; the newest holds. */
export const GivenPlan = defineEntity({
  name: 'GivenPlan',
  uniques: [{ properties: ['plan', 'number'] }],
  properties: {
    ...ownedRow(),
    plan: p.manyToOne(Plan).ref(),
    /** From 1. */
    number: p.integer(),
    /** Null: it was stopped. */
    content: p.json<Content>().nullable(),
    /** The version of the plan that was given. */
    planVersion: p.integer(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type GivenPlan = InferEntity<typeof GivenPlan>;
