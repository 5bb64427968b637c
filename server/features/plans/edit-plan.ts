import { LockMode } from '@mikro-orm/core';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { planEdit, planItemBody } from '#shared/contracts/plans.ts';
import { heldBackBy, type SafetyState, whyNotAllTheSame } from '#shared/plan/held-back.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { lastSafetyOf, stateOf } from './last-safety.ts';
import { type Decision, PlanItem } from './plan-item.entity.ts';
import type { Plan } from './plan.entity.ts';
import { planInSight } from './plan-in-sight.ts';
import { tellPlan } from './tell-plan.ts';

type Of = Unit<UserActor>;
type ItemBody = z.output<typeof planItemBody>;

const WHY_NOT = {
  'ask-first': 'Ask the safety questions of this athlete first: what was not answered is not a no.',
  'needs-clearance':
    'Whoever treats this athlete has set a limit. Write down with the safety questions who cleared it; until then this exercise stays out.',
} as const;

/** @throws Problem 'held-back' where no coach may decide it */
const decide = (
  { exercise, despite }: ItemBody,
  before: Decision | null,
  safety: SafetyState,
  by: Decision['by'],
): Decision | null => {
  if (despite === undefined) return before;
  if (despite === null) return null;
  const answers = heldBackBy(exerciseOf(exercise), safety.answers);
  if (answers.length === 0) return null;
  const mayNot = whyNotAllTheSame(answers, safety);
  if (mayNot !== null) throw new Problem('held-back', WHY_NOT[mayNot]);
  return { reason: despite, answers, by, at: new Date().toISOString() };
};

/** Makes the stored list the one that was sent: an exercise that stays keeps its row. */
const replaceItems = async (
  { em, actor }: Of,
  plan: Plan,
  athleteId: string,
  items: readonly ItemBody[],
): Promise<void> => {
  if (plan.rule === null && items.length > 0)
    throw new Problem('retest-first', `${plan.because} Base the plan on another finding first.`);
  const safety = stateOf(await lastSafetyOf(em, athleteId));
  const { id, name } = await em.findOneOrFail(User, { id: actor.id });
  const stored = await em.find(PlanItem, { plan: plan.id });
  for (const item of stored)
    if (!items.some(({ exercise }) => exercise === item.exercise)) em.remove(item);
  for (const [position, body] of items.entries()) {
    const { exercise, stage, side, sideConfirmed, dose, cue } = body;
    const known = stored.find((item) => item.exercise === exercise);
    const decision = decide(body, known?.decision ?? null, safety, { id, name });
    const columns = { position, stage, side, sideConfirmed, dose, cue, decision };
    if (known) em.assign(known, columns);
    else em.create(PlanItem, { plan, exercise, ...columns });
  }
};

/** Changes a plan; what the athlete has got stays as it was until it is given anew. */
export const editPlan = async (
  unit: Of,
  id: string,
  { version, items, note, retestOn }: z.output<typeof planEdit>,
): Promise<void> => {
  const { em } = unit;
  const sight = await planInSight(unit, id, 'plan.edit');
  const { plan, athlete } = sight;
  await em.lock(plan, LockMode.OPTIMISTIC, version);
  if (items !== undefined) await replaceItems(unit, plan, athlete.id, items);
  if (note !== undefined) plan.note = note;
  if (retestOn !== undefined) plan.retestOn = retestOn;
  // a change of its exercises alone is a change of the plan
  plan.editedAt = new Date();
  const fields = Object.entries({ items, note, retestOn }).filter(([, v]) => v !== undefined);
  audit(unit, 'plan.edit', id, {
    athlete: athlete.id,
    fields: fields.map(([name]) => name).join(' '),
    ...(items === undefined ? {} : { rows: items.length }),
  });
  await em.flush();
  await tellPlan(unit, sight);
};
