import type { UserActor } from '#shared/access/actors.ts';
import type { PainPlace } from '#shared/contracts/athlete-plan.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import {
  answeredFor,
  AT_MOST,
  ATHLETE,
  type Named,
  type WaitingItem,
  whoAndWhen,
} from './scope.ts';

type PainRow = Named & { plan_id: string; side: Side; level: number; places: PainPlace[] };

/** Plans of which an athlete answered that something hurts, as long as nobody has looked; the worst first. */
export const painTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const scope = answeredFor(actor);
  const rows = await em.execute<PainRow[]>(
    `select ${ATHLETE}, worst.at, p.id as plan_id, p.side, worst.level, to_json(worst.places) as places
     from plan p join visit v on v.id = p.visit_id join athlete a on a.id = v.athlete_id
     join lateral (
       select n.at, n.level, n.places from plan_pain n
       where n.plan_id = p.id and n.level > 0 and n.seen_at is null
       order by n.level desc, n.at desc, n.id limit 1
     ) worst on true
     where ${scope.sql} and a.deletion_due is null
     order by worst.level desc, worst.at, p.id limit ${AT_MOST}`,
    [...scope.params],
  );
  return rows.map((row) => ({
    kind: 'pain-reported',
    planId: row.plan_id,
    side: row.side,
    level: row.level,
    places: row.places,
    ...whoAndWhen(row),
  }));
};
