import type { UserActor } from '#shared/access/actors.ts';
import type { PlanRow } from '#shared/contracts/plans.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { athleteInSight } from '../athletes/athlete-in-sight.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import { planStateOf } from './plans.presenter.ts';

type Row = {
  id: string;
  visit_id: string;
  day: string;
  side: Side;
  retest_on: string | null;
  rule: string | null;
  version: number;
  given_version: number | null;
  stopped: boolean;
  exercises: number;
  pain: number;
  ticks: number;
};

const LIST = `
  select p.id, v.id as visit_id, v.day::text, p.side, p.retest_on::text, p.rule,
    p.version, g.plan_version as given_version, g.content is null as stopped,
    (select count(*)::int from plan_item i where i.plan_id = p.id) as exercises,
    (select count(*)::int from plan_pain n where n.plan_id = p.id and n.level > 0 and n.seen_at is null) as pain,
    (select count(*)::int from (
      select distinct on (exercise, day) done from plan_tick t
      where t.plan_id = p.id and t.day > current_date - 7 order by exercise, day, at desc, id desc
    ) last where done) as ticks
  from plan p
  join visit v on v.id = p.visit_id
  left join lateral (
    select content, plan_version from given_plan where plan_id = p.id order by number desc limit 1
  ) g on true
  where v.athlete_id = ?
  order by v.day desc, v.created_at desc, p.side`;

/** The plans of an athlete, newest visit first. */
export const listPlans = async (unit: Unit<UserActor>, athleteId: string): Promise<PlanRow[]> => {
  const athlete = await athleteInSight(unit, athleteId, 'athlete.read');
  await needOpen(unit, athlete, 'athlete.read');
  const rows = await unit.em.execute<Row[]>(LIST, [athleteId]);
  return rows.map((row) => ({
    id: row.id,
    visit: { id: row.visit_id, day: row.day },
    side: row.side,
    state: planStateOf(
      row.version,
      row.given_version === null ? null : { planVersion: row.given_version, stopped: row.stopped },
    ),
    exercises: row.exercises,
    retest: row.rule === null,
    retestOn: row.retest_on,
    painUnseen: row.pain,
    ticksThisWeek: row.ticks,
  }));
};
