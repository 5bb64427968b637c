import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { PAIN_TIMES, type PainPlace } from '#shared/contracts/athlete-plan.ts';
import type { ExerciseId } from '#shared/plan/library.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Plan } from './plan.entity.ts';

/** Said by a link: an exercise was done on a day, or that was a slip. Only added to; the last said of a day holds. */
export const PlanTick = defineEntity({
  name: 'PlanTick',
  indexes: [{ properties: ['plan', 'day'] }],
  properties: {
    ...ownedRow(),
    plan: p.manyToOne(Plan).ref(),
    exercise: p.text().$type<ExerciseId>(),
    day: p.date(),
    done: p.boolean(),
    at: madeAt(),
  },
});
export type PlanTick = InferEntity<typeof PlanTick>;

/** Said by a link: how much something hurts and where. What was said is never changed. */
export const PlanPain = defineEntity({
  name: 'PlanPain',
  indexes: [{ properties: ['plan', 'at'] }],
  properties: {
    ...ownedRow(),
    plan: p.manyToOne(Plan).ref(),
    day: p.date(),
    /** 0: none. */
    level: p.integer(),
    places: p.array<PainPlace>((value) => value as PainPlace),
    which: p.enum(['left', 'right', 'both']).nullable(),
    time: p.enum([...PAIN_TIMES]).nullable(),
    exercise: p.text().$type<ExerciseId>().nullable(),
    at: madeAt(),
    seenBy: p.manyToOne(User).ref().nullable(),
    seenAt: moment().nullable(),
  },
});
export type PlanPain = InferEntity<typeof PlanPain>;
