import { LockMode } from '@mikro-orm/core';
import type { UserActor } from '#shared/access/actors.ts';
import type { AthletePlanItem, GivenPlan as Content } from '#shared/contracts/athlete-plan.ts';
import { ALWAYS_STOP } from '#shared/plan/cautions.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { sideLines } from '#shared/plan/sides.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { GivenPlan } from './given-plan.entity.ts';
import { lastSafetyOf, stateOf } from './last-safety.ts';
import { missingOf } from './missing.ts';
import { PlanItem } from './plan-item.entity.ts';
import { PlanPain } from './plan-answers.entity.ts';
import { planInSight } from './plan-in-sight.ts';
import { tellPlan } from './tell-plan.ts';

type Of = Unit<UserActor>;

/** The words of the library go along, so that what was given stays what it was. */
const asGiven = ({ exercise, stage, side, dose, cue }: PlanItem): AthletePlanItem => {
  const { id, side: rule, notWith: _, source: __, dose: ___, ...words } = exerciseOf(exercise);
  return {
    ...words,
    exercise: id,
    setUp: [...words.setUp],
    cues: [...words.cues],
    goOnWhen: [...words.goOnWhen],
    goBackWhen: [...words.goBackWhen],
    notWhen: [...words.notWhen],
    stage,
    side,
    dose,
    cue,
    sideLines: sideLines(rule, side),
  };
};

/** The last time that this plan was given or stopped. */
export const lastGiven = ({ em }: Pick<Of, 'em'>, planId: string): Promise<GivenPlan | null> =>
  em.findOne(GivenPlan, { plan: planId }, { orderBy: { number: 'desc' } });

const add = async (
  unit: Of,
  { plan }: Awaited<ReturnType<typeof planInSight>>,
  content: Content | null,
): Promise<number> => {
  const { em, actor } = unit;
  // two who give it at once give it one after the other
  await em.execute('select 1 from plan where id = ? for update', [plan.id]);
  const number = ((await lastGiven(unit, plan.id))?.number ?? 0) + 1;
  em.create(GivenPlan, {
    plan,
    number,
    content,
    planVersion: plan.version,
    by: em.getReference(User, actor.id),
  });
  return number;
};

/**
 * Gives the plan as it stands to the athlete, whose links show it from now on.
 * @throws Problem 'plan-not-ready' with everything that is still to be done
 */
export const givePlan = async (unit: Of, id: string, version: number): Promise<void> => {
  const { em } = unit;
  const sight = await planInSight(unit, id, 'plan.edit');
  const { plan, athlete } = sight;
  await em.lock(plan, LockMode.OPTIMISTIC, version);
  const items = await em.find(PlanItem, { plan: id }, { orderBy: { position: 'asc' } });
  const missing = missingOf(plan, items, stateOf(await lastSafetyOf(em, athlete.id)));
  const { retestOn } = plan;
  if (missing.length > 0 || !retestOn) throw new Problem('plan-not-ready', missing.join(' '));
  const number = await add(unit, sight, {
    items: items.map(asGiven),
    note: plan.note,
    retestOn,
    stop: ALWAYS_STOP,
  });
  audit(unit, 'plan.give', id, { athlete: athlete.id, version: number, rows: items.length });
  await em.flush();
  await tellPlan(unit, sight);
};

/** Stops what was given. A plan that was never given, or is stopped, is left as it is. */
export const stopPlan = async (unit: Of, id: string): Promise<void> => {
  const sight = await planInSight(unit, id, 'plan.edit');
  if (!(await lastGiven(unit, id))?.content) return;
  const number = await add(unit, sight, null);
  audit(unit, 'plan.stop', id, { athlete: sight.athlete.id, version: number });
  await unit.em.flush();
  await tellPlan(unit, sight);
};

/** Says that the answers about pain were looked at. */
export const seePain = async (unit: Of, id: string): Promise<void> => {
  const { em, actor } = unit;
  const sight = await planInSight(unit, id, 'plan.edit');
  const rows = await em.nativeUpdate(
    PlanPain,
    { plan: id, seenAt: null },
    { seenAt: new Date(), seenBy: em.getReference(User, actor.id) },
  );
  if (rows === 0) return;
  audit(unit, 'plan.see-pain', id, { athlete: sight.athlete.id, rows });
  await em.flush();
  await tellPlan(unit, sight);
};
