import { heldBackBy, isCovered, type SafetyState } from '#shared/plan/held-back.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import type { PlanItem } from './plan-item.entity.ts';
import type { Plan } from './plan.entity.ts';

/** Whether somebody still has to decide about an exercise that is held back. */
export const isUndecided = (
  { exercise, decision }: Pick<PlanItem, 'exercise' | 'decision'>,
  { answers }: SafetyState,
): boolean => !isCovered(heldBackBy(exerciseOf(exercise), answers), decision?.answers ?? null);

/** What still keeps a plan from being given to the athlete, in words; empty where nothing does. */
export const missingOf = (
  { rule, retestOn }: Pick<Plan, 'rule' | 'retestOn'>,
  items: readonly PlanItem[],
  safety: SafetyState,
): string[] => {
  const name = ({ exercise }: PlanItem) => exerciseOf(exercise).name;
  const unconfirmed = items.filter(({ sideConfirmed }) => !sideConfirmed).map(name);
  const undecided = items.filter((item) => isUndecided(item, safety)).map(name);
  return [
    ...(rule !== null && items.length === 0 ? ['Add an exercise.'] : []),
    ...(undecided.length > 0
      ? [`Decide about what is held back, or take it out: ${undecided.join(', ')}.`]
      : []),
    ...(unconfirmed.length > 0 ? [`Confirm the side: ${unconfirmed.join(', ')}.`] : []),
    ...(retestOn ? [] : ['Set the day of the retest.']),
  ];
};
