import type { UserActor } from '#shared/access/actors.ts';
import type { FirstSteps } from '#shared/contracts/today.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { inSightSql } from '../athletes/caseload.ts';
import { counting } from '../athletes/consent-check.ts';
import { today } from '../athletes/days.ts';

/** What of a practice's beginning is done, as the rows stand now; of the athletes in this person's sight. */
export const firstSteps = async ({ em, actor }: Unit<UserActor>): Promise<FirstSteps> => {
  const inSight = inSightSql(actor, 'a.coach_id');
  const counts = counting(today());
  const [row] = await em.execute<{ [K in keyof FirstSteps]: FirstSteps[K] }[]>(
    `with seen as (select a.id, a.birth_date, a.created_at from athlete a where ${inSight.sql})
     select
       (select p.contact <> '' from practice p) as contact,
       exists (
         select from consent x join seen a on a.id = x.athlete_id
         where ${counts.sql} and 'assessment' = any (x.purposes)
       ) as consent,
       exists (
         select from clip c join visit v on v.id = c.visit_id join seen on seen.id = v.athlete_id
         where c.state <> 'refused'
       ) as clip,
       exists (
         select from call k join visit v on v.id = k.visit_id join seen on seen.id = v.athlete_id
       ) as call,
       (select id from seen order by created_at, id limit 1) as "athleteId"`,
    [...inSight.params, ...counts.params],
  );
  if (!row) throw new Error('A query without a table has one row.');
  return row;
};
