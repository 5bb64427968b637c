import type { EntityManager } from '@mikro-orm/postgresql';
import { tell } from '../../events/tell.ts';
import type { PlanInSight } from './plan-in-sight.ts';

/** Tells the tabs of those who see the athlete that a plan, or an answer to it, has changed. */
export const tellPlan = (
  unit: { readonly em: EntityManager; readonly actor: { readonly practiceId: string } },
  { plan, athlete }: Pick<PlanInSight, 'plan' | 'athlete'>,
): Promise<void> =>
  tell(
    unit,
    { coachId: athlete.coach.id },
    { type: 'plan', planId: plan.id, visitId: plan.visit.id },
  );
