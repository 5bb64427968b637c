import type { EntityManager } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { LinkActor } from '#shared/access/actors.ts';
import type { AthletePlan, painBody, Tick, tickBody } from '#shared/contracts/athlete-plan.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { daysLater, today } from '../athletes/days.ts';
import { audit } from '../audit/audit.ts';
import { Replay } from '../replays/replay.entity.ts';
import { writeOf } from '../waiting-mail/mail-choices.ts';
import type { GivenPlan } from './given-plan.entity.ts';
import { lastGiven } from './give-plan.ts';
import { PlanPain, PlanTick } from './plan-answers.entity.ts';
import { Plan } from './plan.entity.ts';
import { ticksOf } from './plan-page.ts';
import { tellPlan } from './tell-plan.ts';

type Of = Unit<LinkActor>;

/** A link says what was done today, or in the days before; its clock may be a day ahead. */
const DAYS_BACK = 7;
/** Of one plan in a day, from whichever links: enough for every honest hand. */
const TICKS_A_DAY = 200;
const PAINS_A_DAY = 20;

/** When this athlete was given another plan for this side after that one, which still runs. */
const newerGivenAt = async (em: EntityManager, planId: string, than: Date) => {
  const rows = await em.execute<{ at: string | null }[]>(
    `select max(last.at) as at from plan own
     join visit v on v.id = own.visit_id
     join visit w on w.athlete_id = v.athlete_id and w.id <> v.id
     join plan other on other.visit_id = w.id and other.side = own.side
     join lateral (
       select g.at, g.content from given_plan g where g.plan_id = other.id order by g.number desc limit 1
     ) last on last.content is not null
     where own.id = ? and last.at > ?`,
    [planId, than],
  );
  const at = rows[0]?.at;
  return at ? new Date(at).toISOString() : null;
};

/** The plan that the links of this side show: that of their own visit. Null where none was given yet. */
export const athletePlanOf = async (
  em: EntityManager,
  visitId: string,
  side: Side,
): Promise<AthletePlan | null> => {
  const plan = await em.findOne(Plan, { visit: visitId, side });
  const given = plan && (await lastGiven({ em }, plan.id));
  if (!given) return null;
  return {
    givenAt: given.at.toISOString(),
    plan: given.content ?? null,
    ticks: given.content ? await ticksOf({ em }, plan.id) : [],
    newerGivenAt: await newerGivenAt(em, plan.id, given.at),
  };
};

/** @throws Problem 'plan-not-running' where nothing was given, or it was stopped */
const runningPlan = async ({ em, actor }: Of) => {
  const { practiceId, replayId } = actor;
  need(actor, 'replay.answer', { kind: 'replay', practiceId, replayId });
  const replay = found(await em.findOne(Replay, { id: replayId }, { populate: ['visit.athlete'] }));
  const plan = await em.findOne(Plan, { visit: replay.visit.id, side: replay.side });
  const content = plan && (await lastGiven({ em }, plan.id))?.content;
  if (!plan || !content) throw new Problem('plan-not-running');
  return { plan, content, athlete: replay.visit.unwrap().athlete.unwrap() as Athlete };
};

const needDay = (day: string): void => {
  if (day > daysLater(today(), 1) || day < daysLater(today(), -DAYS_BACK))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.day', message: `Choose today or one of the last ${DAYS_BACK} days.` },
    ]);
};

const needExercise = (content: NonNullable<GivenPlan['content']>, exercise: string | null) => {
  if (exercise !== null && !content.items.some((item) => item.exercise === exercise))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.exercise', message: 'Choose an exercise of the plan.' },
    ]);
};

const sinceYesterday = (planId: string) => ({
  plan: planId,
  at: { $gt: new Date(Date.now() - 86_400_000) },
});

const needRoom = (count: number, atMost: number): void => {
  if (count >= atMost) throw new Problem('too-many-tries');
};

/** Adds that an exercise was done on a day, or that this was a slip. */
export const tickExercise = async (
  unit: Of,
  { exercise, day, done }: z.output<typeof tickBody>,
): Promise<Tick[]> => {
  const { em } = unit;
  const { plan, content, athlete } = await runningPlan(unit);
  needDay(day);
  needExercise(content, exercise);
  needRoom(await em.count(PlanTick, sinceYesterday(plan.id)), TICKS_A_DAY);
  em.create(PlanTick, { plan, exercise, day, done });
  await em.flush();
  await tellPlan(unit, { plan, athlete });
  return ticksOf(unit, plan.id);
};

/** Adds how much something hurts; who works with the athlete is told at once, the coach by a letter too. */
export const answerPain = async (unit: Of, body: z.output<typeof painBody>): Promise<void> => {
  const { em } = unit;
  const { plan, content, athlete } = await runningPlan(unit);
  needDay(body.day);
  needExercise(content, body.exercise);
  needRoom(await em.count(PlanPain, sinceYesterday(plan.id)), PAINS_A_DAY);
  em.create(PlanPain, { plan, ...body, places: [...new Set(body.places)] });
  audit(unit, 'plan.pain', plan.id, { athlete: athlete.id });
  if (body.level > 0)
    await writeOf(unit, [athlete.coach.id], {
      kind: 'pain',
      aboutId: plan.id,
      path: `/plans/${plan.id}#pain`,
    });
  await em.flush();
  await tellPlan(unit, { plan, athlete });
};
