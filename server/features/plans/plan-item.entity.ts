import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { Dose } from '#shared/contracts/athlete-plan.ts';
import { side } from '#shared/contracts/primitives.ts';
import type { SafetyAnswer } from '#shared/plan/cautions.ts';
import type { ExerciseId } from '#shared/plan/library.ts';
import { ownedRow } from '#server/db/columns.ts';
import { Plan } from './plan.entity.ts';

/** Why an exercise is used although answers of the safety check stand against it. */
export interface Decision {
  readonly reason: string;
  /** What stood against it when that was decided. */
  readonly answers: readonly SafetyAnswer[];
  readonly by: { readonly id: string; readonly name: string };
  /** ISO 8601. */
  readonly at: string;
}

/** One exercise of a plan as it stands now; what was given to the athlete is kept apart. */
export const PlanItem = defineEntity({
  name: 'PlanItem',
  uniques: [{ properties: ['plan', 'exercise'] }],
  properties: {
    ...ownedRow(),
    plan: p.manyToOne(Plan).ref(),
    exercise: p.text().$type<ExerciseId>(),
    /** From 0. */
    position: p.integer(),
    /** From 1. */
    stage: p.integer(),
    side: p.enum(side.options),
    sideConfirmed: p.boolean().default(false),
    dose: p.json<Dose>(),
    cue: p.text().default(''),
    decision: p.json<Decision>().nullable(),
  },
});
export type PlanItem = InferEntity<typeof PlanItem>;
