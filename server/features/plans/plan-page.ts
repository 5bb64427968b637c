import type { UserActor } from '#shared/access/actors.ts';
import type { Tick } from '#shared/contracts/athlete-plan.ts';
import type { Plan as PlanShape, PlanStart } from '#shared/contracts/plans.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Replay } from '../replays/replay.entity.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { visitInSight } from '../visits/visit-in-sight.ts';
import { findingsOf, type FindingOfSide } from './findings.ts';
import { GivenPlan } from './given-plan.entity.ts';
import { lastSafetyOf } from './last-safety.ts';
import { PlanPain } from './plan-answers.entity.ts';
import { PlanItem } from './plan-item.entity.ts';
import { Plan } from './plan.entity.ts';
import { planInSight } from './plan-in-sight.ts';
import { presentFinding, presentPlan } from './plans.presenter.ts';
import { signOffsOf } from './signed-off.ts';

type Of = Unit<UserActor>;

/** How far back a page shows what was done and what was said. */
const TICK_DAYS = 84;
const ANSWERS = 50;

/** What was done: the last that was said of a day holds. */
export const ticksOf = ({ em }: Pick<Of, 'em'>, planId: string): Promise<Tick[]> =>
  em.execute<Tick[]>(
    `select exercise, day::text from (
       select distinct on (exercise, day) exercise, day, done from plan_tick
       where plan_id = ? and day > current_date - ${TICK_DAYS} order by exercise, day, at desc, id desc
     ) last where done order by day, exercise`,
    [planId],
  );

const ofVisit = async ({ em }: Of, visit: Visit, athlete: Athlete, side: Side) => ({
  visit: { id: visit.id, day: visit.day },
  athlete: {
    id: athlete.id,
    name: `${athlete.givenName} ${athlete.familyName}`,
    cautions: athlete.cautions,
  },
  coachId: athlete.coach.id,
  side,
  safety: await lastSafetyOf(em, athlete.id),
});

/** What a plan of this side could start from. */
export const planStart = async (unit: Of, visitId: string, side: Side): Promise<PlanStart> => {
  const { visit, athlete } = await visitInSight(unit, visitId, 'athlete.read');
  const findings = await findingsOf(unit.em, visitId, side);
  const plan = await unit.em.findOne(Plan, { visit: visitId, side });
  return {
    ...(await ofVisit(unit, visit, athlete, side)),
    planId: plan?.id ?? null,
    findings: findings.map(presentFinding),
  };
};

/** One plan with what the athlete answered. */
export const planPage = async (unit: Of, id: string): Promise<PlanShape> => {
  const { em } = unit;
  const { plan, visit, athlete } = await planInSight(unit, id, 'athlete.read');
  const which = { plan: id };
  const items = await em.find(PlanItem, which, { orderBy: { position: 'asc' } });
  const given = await em.find(GivenPlan, which, {
    populate: ['by'],
    orderBy: { number: 'desc' },
  });
  const pain = await em.find(PlanPain, which, {
    populate: ['seenBy'],
    orderBy: { at: 'desc', id: 'desc' },
    limit: ANSWERS,
  });
  const liveLinks = await em.count(Replay, {
    visit: visit.id,
    side: plan.side,
    revokedAt: null,
    expiresAt: { $gt: new Date() },
  });
  // another finding than the one that it was made from
  const found = await findingsOf(em, visit.id, plan.side);
  const isItsOwn = ({ basis, reading }: FindingOfSide) =>
    basis.kind === 'reading'
      ? reading?.id === plan.reading?.id
      : plan.basis.kind === 'call' && plan.basis.seen === basis.seen;
  // the reading that it stands on may have been signed off before marks changed and made another
  const signedOff = plan.reading
    ? (await signOffsOf(em, visit.id, plan.side))(plan.reading.id)
    : (found.find(isItsOwn)?.signedOff ?? null);
  return presentPlan({
    plan,
    ofVisit: await ofVisit(unit, visit, athlete, plan.side),
    items,
    given,
    pain,
    ticks: await ticksOf(unit, id),
    liveLinks,
    signedOff,
    findings: found.filter((finding) => !isItsOwn(finding)),
  });
};
