import { Migration } from '@mikro-orm/migrations';

/** Child column → parent, each together with the practice, so that no row can point into another practice. */
const REFERENCES: readonly [table: string, column: string, parent: string, onDelete: string][] = [
  ['supervision', 'supervisor_id', 'account', 'cascade'],
  ['supervision', 'coach_id', 'account', 'cascade'],
  ['session', 'user_id', 'account', 'cascade'],
  ['athlete', 'coach_id', 'account', 'restrict'],
  ['consent', 'athlete_id', 'athlete', 'cascade'],
  ['consent', 'recorded_by_id', 'account', 'restrict'],
  ['consent', 'withdrawn_by_id', 'account', 'restrict'],
  ['set_up', 'saved_by_id', 'account', 'restrict'],
  ['visit', 'athlete_id', 'athlete', 'cascade'],
  ['visit', 'coach_id', 'account', 'restrict'],
  ['clip', 'visit_id', 'visit', 'cascade'],
  ['clip', 'uploaded_by_id', 'account', 'restrict'],
  ['upload', 'visit_id', 'visit', 'cascade'],
  ['upload', 'opened_by_id', 'account', 'restrict'],
  ['rep', 'clip_id', 'clip', 'cascade'],
  ['rep', 'created_by_id', 'account', 'restrict'],
  ['mark', 'rep_id', 'rep', 'cascade'],
  ['mark', 'by_user', 'account', 'restrict'],
  ['mark_command', 'rep_id', 'rep', 'cascade'],
  ['call', 'visit_id', 'visit', 'cascade'],
  ['call', 'by_id', 'account', 'restrict'],
  ['reading', 'visit_id', 'visit', 'cascade'],
  ['reading', 'by_id', 'account', 'restrict'],
  ['side_setting', 'visit_id', 'visit', 'cascade'],
  ['side_setting', 'reading_id', 'reading', 'set null (reading_id)'],
  ['comment', 'clip_id', 'clip', 'cascade'],
  ['comment', 'answer_to', 'comment', 'cascade'],
  ['comment', 'by_id', 'account', 'restrict'],
  ['comment', 'resolved_by_id', 'account', 'restrict'],
  ['replay', 'visit_id', 'visit', 'cascade'],
  ['replay', 'rep_id', 'rep', 'cascade'],
  ['replay', 'by_id', 'account', 'restrict'],
];

const TABLES = [
  'account', 'supervision', 'session', 'athlete', 'consent', 'set_up', 'visit', 'clip', 'upload', 'rep', 'mark',
  'mark_command', 'call', 'reading', 'side_setting', 'comment', 'replay', 'job_outbox', 'audit_entry',
];

/**
 * Without an index of their own: columns that begin a primary key or a unique constraint, and who placed a mark,
 * which nothing searches by while marks are written by the thousand.
 */
const NO_INDEX = [
  'mark.rep_id', 'mark.by_user', 'mark_command.rep_id', 'supervision.supervisor_id', 'reading.visit_id', 'side_setting.visit_id',
];

/** Foreign keys, row-level security, the append-only audit trail and the few functions that see past the wall. */
export class Migration20261201122100_walls extends Migration {
  override up(): void {
    this.foreignKeys();
    this.rowLevelSecurity();
    this.auditTrail();
    this.signInFunctions();
    this.jobFunctions();
  }

  private foreignKeys(): void {
    for (const parent of new Set(REFERENCES.map(([, , table]) => table))) {
      this.addSql(`alter table "${parent}" add constraint "${parent}_in_practice" unique (practice_id, id);`);
    }
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" add constraint "${table}_practice_fk" foreign key (practice_id) references practice (id);`);
    }
    for (const [table, column, parent, onDelete] of REFERENCES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") ` +
          `references "${parent}" (practice_id, id) on delete ${onDelete};`,
      );
      if (!NO_INDEX.includes(`${table}.${column}`)) {
        this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}");`);
      }
    }
  }

  private rowLevelSecurity(): void {
    // After a transaction that set it, the setting reads '' in the same connection: both mean no practice, no rows.
    this.addSql(`create function current_practice() returns uuid language sql stable parallel safe
      as $$ select nullif(current_setting('app.practice', true), '')::uuid $$;`);
    this.addSql(`revoke all on function current_practice() from public;`);
    this.addSql(`grant execute on function current_practice() to redshank_app;`);
    for (const [table, column] of [['practice', 'id'] as const, ...TABLES.map((name) => [name, 'practice_id'] as const)]) {
      const rights = { audit_entry: 'select, insert', practice: 'select, insert, update' }[table];
      this.addSql(`alter table "${table}" enable row level security, force row level security;`);
      this.addSql(
        `create policy own_practice on "${table}" to redshank_app using (${column} = current_practice()) with check (${column} = current_practice());`,
      );
      this.addSql(`grant ${rights ?? 'select, insert, update, delete'} on "${table}" to redshank_app;`);
    }
    // The owner runs the functions below and needs no more than they read and write.
    for (const table of [
      ...['practice', 'account', 'supervision', 'session', 'visit', 'consent', 'clip', 'replay', 'rep', 'job_outbox'],
    ]) {
      this.addSql(`create policy for_functions on "${table}" for select to redshank_owner using (true);`);
    }
    for (const table of ['session', 'job_outbox']) {
      this.addSql(`create policy for_functions_update on "${table}" for update to redshank_owner using (true);`);
    }
  }

  private auditTrail(): void {
    this.addSql(`create function refuse_change() returns trigger language plpgsql
      as $$ begin raise exception 'The audit trail is only added to.' using errcode = 'restrict_violation'; end $$;`);
    this.addSql(`create trigger audit_entry_only_added_to before update or delete on audit_entry
      for each row execute function refuse_change();`);
    this.addSql(`create trigger audit_entry_never_emptied before truncate on audit_entry
      for each statement execute function refuse_change();`);
  }

  /** Each finds one row by a secret or an address that only its holder knows. */
  private signInFunctions(): void {
    this.addSql(`create function find_sign_in(wanted_email text)
      returns table (user_id uuid, practice_id uuid, password_hash text)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select a.id, a.practice_id, a.password_hash from public.account a
        where a.email = wanted_email and a.disabled_at is null
      $$;`);
    this.addSql(`create function find_session(wanted uuid)
      returns table (session_id uuid, expires_at timestamptz, last_seen_at timestamptz, user_id uuid, user_name text,
        email text, role text, practice_id uuid, practice_name text, coach_ids uuid[])
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select s.id, s.expires_at, s.last_seen_at, a.id, a.name, a.email, a.role, p.id, p.name,
          coalesce((select array_agg(v.coach_id) from public.supervision v where v.supervisor_id = a.id), '{}')
        from public.session s
        join public.account a on a.id = s.user_id
        join public.practice p on p.id = s.practice_id
        where s.id = wanted and s.revoked_at is null and s.expires_at > now() and a.disabled_at is null
      $$;`);
    this.addSql(`create function touch_session(wanted uuid) returns void
      language sql security definer set search_path = pg_catalog, public, pg_temp
      as $$ update public.session set last_seen_at = now() where id = wanted $$;`);
    this.addSql(`create function find_replay(wanted_hash text)
      returns table (replay_id uuid, practice_id uuid, visit_id uuid, rep_id uuid, clip_id uuid, pass_phrase_hash text)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id, r.visit_id, r.rep_id, e.clip_id, r.pass_phrase_hash
        from public.replay r join public.rep e on e.id = r.rep_id join public.visit v on v.id = r.visit_id
        where r.token_hash = wanted_hash and r.revoked_at is null and r.expires_at > now() and exists (
          select from public.consent c where c.athlete_id = v.athlete_id and c.withdrawn_at is null
          and (now() at time zone 'utc')::date between c.valid_from and c.valid_until
          and 'sharing-by-link' = any (c.purposes))
      $$;`);
    for (const signature of ['find_sign_in(text)', 'find_session(uuid)', 'touch_session(uuid)', 'find_replay(text)']) {
      this.addSql(`revoke all on function ${signature} from public;`);
      this.addSql(`grant execute on function ${signature} to redshank_app;`);
    }
  }

  /** What the worker's pickup needs over all practices: ids and payloads, no names. */
  private jobFunctions(): void {
    this.addSql(`create function jobs_to_send(at_most int)
      returns table (id uuid, practice_id uuid, queue text, payload jsonb)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select o.id, o.practice_id, o.queue, o.payload from public.job_outbox o
        where o.sent_at is null order by o.created_at limit at_most
      $$;`);
    this.addSql(`create function jobs_were_sent(ids uuid[]) returns void
      language sql security definer set search_path = pg_catalog, public, pg_temp
      as $$ update public.job_outbox set sent_at = now() where id = any (ids) $$;`);
    this.addSql(`create function clips_to_prepare() returns table (clip_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$ select c.id, c.practice_id from public.clip c where c.state in ('waiting', 'preparing') order by c.uploaded_at $$;`);
    for (const signature of ['jobs_to_send(int)', 'jobs_were_sent(uuid[])', 'clips_to_prepare()']) {
      this.addSql(`revoke all on function ${signature} from public;`);
      this.addSql(`grant execute on function ${signature} to redshank_jobs;`);
    }
  }
}
