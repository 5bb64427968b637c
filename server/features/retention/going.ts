import type { EntityManager } from '@mikro-orm/postgresql';
import type { GoingAthlete } from '#shared/contracts/retention.ts';

type Row = {
  id: string;
  name: string;
  why: 'withdrawn' | 'term';
  on: string;
  visits: number;
  clips: number;
  bytes: string;
};

/**
 * Who goes on which day up to this one, soonest first: the preview and the daily job ask here and nowhere else. The
 * term counts from the day of the last visit, of an athlete without any from the day they were added.
 * @param keepMonths null: nobody goes by time alone
 * @param until inclusive
 */
export const goingUntil = async (
  em: EntityManager,
  keepMonths: number | null,
  until: string,
): Promise<GoingAthlete[]> => {
  const rows = await em.execute<Row[]>(
    `select a.id, a.given_name || ' ' || a.family_name as name, g.why, g."on"::text as "on",
       count(distinct v.id)::int as visits, count(c.id)::int as clips, coalesce(sum(c.bytes), 0)::text as bytes
     from athlete a
     cross join lateral (
       select 'withdrawn' as why, a.deletion_due as "on" where a.deletion_due is not null
       union all
       select 'term', (coalesce((select max(day) from visit where athlete_id = a.id),
           (a.created_at at time zone 'utc')::date) + make_interval(months => ?::int))::date
         where ?::int is not null
       order by "on", why desc limit 1
     ) g
     left join visit v on v.athlete_id = a.id
     left join clip c on c.visit_id = v.id
     where g."on" <= ?::date
     group by a.id, g.why, g."on" order by g."on", a.id`,
    [keepMonths, keepMonths, until],
  );
  return rows.map(({ id, name, bytes, ...row }) => ({
    ...row,
    athlete: { id, name },
    bytes: Number(bytes),
  }));
};
