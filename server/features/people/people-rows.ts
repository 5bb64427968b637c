import type { EntityManager } from '@mikro-orm/postgresql';
import type { Role } from '#shared/access/actors.ts';

export type PersonRow = {
  id: string;
  name: string;
  email: string;
  role: Role;
  disabled_at: string | null;
  last_seen_at: string | null;
  athletes: number;
  coach_ids: string[];
  codes: boolean;
};

/** Everybody of the practice, who is gone last. */
export const personRows = (em: EntityManager, practiceId: string): Promise<PersonRow[]> =>
  em.execute<PersonRow[]>(
    `select a.id, a.name, a.email, a.role, a.disabled_at, a.codes_since is not null as codes,
       (select max(s.last_seen_at) from session s where s.user_id = a.id) as last_seen_at,
       (select count(*)::int from athlete t where t.coach_id = a.id) as athletes,
       coalesce((select array_agg(v.coach_id order by v.coach_id) from supervision v where v.supervisor_id = a.id), '{}')
         as coach_ids
     from account a where a.practice_id = ?
     order by a.disabled_at is not null, lower(a.name), a.id`,
    [practiceId],
  );
