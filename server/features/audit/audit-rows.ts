import type { EntityManager } from '@mikro-orm/postgresql';
import type { AuditEntry, AuditFilter } from '#shared/contracts/audit.ts';

export type AuditRow = {
  id: string;
  at: Date | string;
  actor: AuditEntry['actor'];
  by_user: string | null;
  by_name: string | null;
  role: AuditEntry['role'];
  action: AuditEntry['action'];
  athlete_id: string | null;
  athlete_name: string | null;
  subject: string;
  subject_id: string;
  subject_name: string | null;
  detail: AuditEntry['detail'];
  network: string | null;
  request_id: string | null;
};

const whereOf = ({ person, athlete, action, from, to }: AuditFilter) => {
  const parts = [
    { sql: 'e.by_user = ?', value: person },
    { sql: 'e.athlete_id = ?', value: athlete },
    { sql: 'e.action = ?', value: action },
    { sql: 'e.at >= ?', value: from },
    { sql: 'e.at < ?', value: to },
  ].flatMap(({ sql, value }) => (value === undefined ? [] : [{ sql, value }]));
  return {
    sql: parts.map(({ sql }) => sql).join(' and ') || 'true',
    params: parts.map(({ value }) => value),
  };
};

export const countAudit = async (em: EntityManager, filter: AuditFilter): Promise<number> => {
  const { sql, params } = whereOf(filter);
  const [row] = await em.execute<{ count: number }[]>(
    `select count(*)::int as count from audit_entry e where ${sql}`,
    params,
  );
  return row?.count ?? 0;
};

/** Newest first, with the names as they are now; what is gone has none. */
export const readAudit = (
  em: EntityManager,
  filter: AuditFilter,
  { limit, offset = 0 }: { readonly limit: number; readonly offset?: number },
): Promise<AuditRow[]> => {
  const { sql, params } = whereOf(filter);
  return em.execute<AuditRow[]>(
    `select e.id, e.at, e.actor, e.by_user, u.name as by_name, e.role, e.action, e.athlete_id,
       a.given_name || ' ' || a.family_name as athlete_name, e.subject, e.subject_id,
       coalesce(c.name, v.day::text, s.name, o.name) as subject_name, e.detail, e.network, e.request_id
     from (
       select * from audit_entry e where ${sql} order by e.at desc, e.id desc limit ? offset ?
     ) e
     left join account u on u.id = e.by_user
     left join athlete a on a.id = e.athlete_id
     left join clip c on e.subject = 'clip' and c.id = e.subject_id
     left join visit v on e.subject in ('visit', 'reading') and v.id = e.subject_id
     left join set_up s on e.subject = 'set-up' and s.id = e.subject_id
     left join account o on e.subject = 'account' and o.id = e.subject_id
     order by e.at desc, e.id desc`,
    [...params, limit, offset],
  );
};
