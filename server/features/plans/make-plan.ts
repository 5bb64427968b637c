import { LockMode } from '@mikro-orm/core';
import { ref } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { planAgain as planAgainBody, planMake } from '#shared/contracts/plans.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { sideOf } from '#shared/plan/sides.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { visitInSight } from '../visits/visit-in-sight.ts';
import { findingsOf, type FindingOfSide } from './findings.ts';
import { PlanItem } from './plan-item.entity.ts';
import { Plan } from './plan.entity.ts';
import { planInSight } from './plan-in-sight.ts';
import { tellPlan } from './tell-plan.ts';

type Of = Unit<UserActor>;

/** @throws Problem 'reading-not-final' where it is not there, or still rests on what nobody has looked at */
const chosen = (findings: readonly FindingOfSide[], from: 'reading' | 'call'): FindingOfSide => {
  const finding = findings.find(({ basis }) => basis.kind === from);
  if (!finding) throw new Problem('reading-not-final', 'Nothing is measured on this side yet.');
  if (finding.hindrance !== null) throw new Problem('reading-not-final');
  return finding;
};

const columnsOf = ({ basis, reading, suggestion }: FindingOfSide) => ({
  basis,
  reading: reading ? ref(reading) : null,
  rule: suggestion.kind === 'plan' ? suggestion.rule : null,
  because: suggestion.because,
});

/** The exercises that were suggested, each on the leg that its rule names, still to be confirmed. */
const addSuggested = ({ em }: Of, plan: Plan, { suggestion }: FindingOfSide): number => {
  if (suggestion.kind === 'retest') return 0;
  for (const [position, { exercise, stage }] of suggestion.exercises.entries()) {
    const { side, dose } = exerciseOf(exercise);
    em.create(PlanItem, {
      plan,
      exercise,
      position,
      stage,
      side: sideOf(side.stands, plan.side),
      dose,
    });
  }
  return suggestion.exercises.length;
};

/** Makes the plan of one side by the rule that fits; what is not known leads to a retest without exercises. */
export const makePlan = async (
  unit: Of,
  visitId: string,
  side: Side,
  { from }: z.output<typeof planMake>,
): Promise<string> => {
  const { em, actor } = unit;
  const { visit, athlete } = await visitInSight(unit, visitId, 'plan.edit');
  // two who make it at once make it one after the other
  await em.execute('select 1 from visit where id = ? for update', [visitId]);
  if ((await em.count(Plan, { visit: visitId, side })) > 0) throw new Problem('plan-there-already');
  const finding = chosen(await findingsOf(em, visitId, side), from);
  const plan = em.create(Plan, {
    visit,
    side,
    ...columnsOf(finding),
    madeBy: em.getReference(User, actor.id),
  });
  const rows = addSuggested(unit, plan, finding);
  audit(unit, 'plan.make', plan.id, { athlete: athlete.id, visit: visitId, side, as: from, rows });
  await em.flush();
  await tellPlan(unit, { plan, athlete });
  return plan.id;
};

/** Bases a plan on what is found now. What was given before, ticks and answers stay. */
export const planAgain = async (
  unit: Of,
  id: string,
  { from, version }: z.output<typeof planAgainBody>,
): Promise<void> => {
  const { em } = unit;
  const sight = await planInSight(unit, id, 'plan.edit');
  const { plan, athlete } = sight;
  await em.lock(plan, LockMode.OPTIMISTIC, version);
  const finding = chosen(await findingsOf(em, plan.visit.id, plan.side), from);
  await em.nativeDelete(PlanItem, { plan: id });
  em.assign(plan, { ...columnsOf(finding), editedAt: new Date() });
  const rows = addSuggested(unit, plan, finding);
  audit(unit, 'plan.again', id, { athlete: athlete.id, as: from, rows });
  await em.flush();
  await tellPlan(unit, sight);
};
