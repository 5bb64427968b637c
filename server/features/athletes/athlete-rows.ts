import type { EntityManager } from '@mikro-orm/postgresql';
import type { Purpose } from '#shared/contracts/consents.ts';
import { counting } from './consent-check.ts';

/** An athlete with what is known about them at a glance. */
export type AthleteRow = {
  id: string;
  given_name: string;
  family_name: string;
  birth_date: string;
  height_mm: number | null;
  sport: string;
  cautions: string;
  contact_email: string | null;
  coach_id: string;
  coach_name: string;
  version: number;
  created_at: Date | string;
  consented_to: Purpose[] | null;
  consent_until: string | null;
  /** A consent to filming would be valid, had the child's own yes been recorded. */
  assent_missing: boolean;
  /** Since the consent to filming was withdrawn: the day of the deletion. */
  deletion_due: string | null;
  last_visit: string | null;
  visit_count: number;
};

export interface Where {
  readonly sql: string;
  readonly params: readonly unknown[];
}

/** One athlete can have several consents at once. @param counts that a consent counts today */
const select = (counts: string): string => `
  select a.id, a.given_name, a.family_name, a.birth_date::text, a.height_mm, a.sport, a.cautions, a.contact_email,
    a.coach_id, coach.name as coach_name, a.version, a.created_at, a.deletion_due::text,
    c.consented_to, c.consent_until::text, m.assent_missing, v.last_visit::text, v.visit_count
  from athlete a
  join account coach on coach.id = a.coach_id
  left join lateral (
    select array_agg(distinct purpose) as consented_to, max(valid_until) as consent_until
    from consent x cross join unnest(x.held) as purpose
    where x.athlete_id = a.id and ${counts}
  ) c on true
  left join lateral (
    select exists (
      select from consent x where x.athlete_id = a.id and x.withdrawn_at is null and not x.assent
        and ?::date between x.valid_from and x.valid_until and 'assessment' = any (x.held)
    ) as assent_missing
  ) m on true
  left join lateral (
    select max(day) as last_visit, count(*)::int as visit_count from visit where visit.athlete_id = a.id
  ) v on true`;

export const readAthletes = (
  em: EntityManager,
  today: string,
  where: Where,
  order = 'a.id',
  page: { readonly limit: number; readonly offset: number } = { limit: 1, offset: 0 },
): Promise<AthleteRow[]> => {
  const counts = counting(today);
  return em.execute<AthleteRow[]>(
    `${select(counts.sql)} where ${where.sql} order by ${order} limit ? offset ?`,
    [...counts.params, today, ...where.params, page.limit, page.offset],
  );
};

export type CoachRow = { id: string; name: string };

/** The coaches who have an athlete among these, by name. @param where on `a` alone */
export const readCoaches = (em: EntityManager, where: Where): Promise<CoachRow[]> =>
  em.execute<CoachRow[]>(
    `select coach.id, coach.name from account coach
    where exists (select from athlete a where a.coach_id = coach.id and ${where.sql})
    order by lower(coach.name), coach.id`,
    [...where.params],
  );

/** @param where on `a` alone */
export const countAthletes = async (em: EntityManager, where: Where): Promise<number> => {
  const [row] = await em.execute<{ total: number }[]>(
    `select count(*)::int as total from athlete a where ${where.sql}`,
    [...where.params],
  );
  return row?.total ?? 0;
};
