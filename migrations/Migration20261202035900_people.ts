import { Migration } from '@mikro-orm/migrations';

const DEFINER = 'security definer set search_path = pg_catalog, public, pg_temp';
const REFERENCES: readonly [table: string, column: string, onDelete: string][] = [
  ['recovery_code', 'user_id', 'cascade'],
  ['mail_link', 'user_id', 'cascade'],
  ['mail_link', 'by_id', 'restrict'],
];

/** Links in letters, one-time codes, and jobs that belong to no practice. */
export class Migration20261202035900_people extends Migration {

  override up(): void {
    this.tables();
    this.walls();
    this.signIn();
    this.links();
    this.jobs();
    this.unsentLinks();
  }

  private tables(): void {
    this.addSql(`create table "recovery_code" ("id" uuid not null, "practice_id" uuid not null, "user_id" uuid not null, "code_hash" text not null, "used_at" timestamptz(3) null, constraint "recovery_code_pkey" primary key ("id"));`);
    this.addSql(`create table "mail_link" ("id" uuid not null, "practice_id" uuid null, "kind" text check ("kind" in ('invitation', 'start', 'reset', 'email-from', 'email-to')) not null, "token_hash" text null, "email" text not null, "person_name" text not null default '', "practice_name" text not null default '', "role" text check ("role" in ('owner', 'supervisor', 'coach')) null, "user_id" uuid null, "change_id" uuid null, "new_email" text null, "by_id" uuid null, "created_at" timestamptz(3) not null, "expires_at" timestamptz(3) not null, "sent_at" timestamptz(3) null, "used_at" timestamptz(3) null, "revoked_at" timestamptz(3) null, constraint "mail_link_pkey" primary key ("id"));`);
    this.addSql(`alter table "mail_link" add constraint "mail_link_token_hash_unique" unique ("token_hash");`);
    this.addSql(`alter table "mail_link" add constraint "mail_link_belongs" check ((practice_id is null) = (kind in ('start', 'reset')));`);
    this.addSql(`create index "mail_link_practice_index" on "mail_link" (practice_id);`);
    this.addSql(`create index "mail_link_email_index" on "mail_link" (email) where kind = 'reset';`);
    this.addSql(`alter table "practice" add column "owners_need_code" boolean not null default false;`);
    this.addSql(`alter table "account" add column "code_secret" text null, add column "codes_since" timestamptz(3) null, add column "last_code_step" int null;`);
    this.addSql(`alter table "job_outbox" alter column "practice_id" drop not null;`);
    for (const table of ['recovery_code', 'mail_link']) {
      this.addSql(`alter table "${table}" add constraint "${table}_practice_fk" foreign key (practice_id) references practice (id);`);
    }
    for (const [table, column, onDelete] of REFERENCES) {
      this.addSql(`alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") references "account" (practice_id, id) on delete ${onDelete};`);
      this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}");`);
    }
  }

  private walls(): void {
    for (const table of ['recovery_code', 'mail_link']) {
      this.addSql(`alter table "${table}" enable row level security, force row level security;`);
      this.addSql(`create policy own_practice on "${table}" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
      this.addSql(`grant select, insert, update, delete on "${table}" to redshank_app;`);
    }
    this.addSql(`create policy for_functions on "mail_link" to redshank_owner using (true) with check (true);`);
    this.addSql(`create policy for_functions_insert on "job_outbox" for insert to redshank_owner with check (true);`);
  }

  private signIn(): void {
    this.addSql(`drop function find_sign_in(text);`);
    this.define('find_sign_in(wanted_email text)', 'find_sign_in(text)', `
      returns table (user_id uuid, practice_id uuid, password_hash text, asks_code boolean) language sql stable ${DEFINER} as $$
        select a.id, a.practice_id, a.password_hash, a.codes_since is not null from public.account a
        where a.email = wanted_email and a.disabled_at is null
      $$`);
    this.addSql(`drop function find_session(uuid);`);
    this.define('find_session(wanted uuid)', 'find_session(uuid)', `
      returns table (session_id uuid, expires_at timestamptz, last_seen_at timestamptz, user_id uuid, user_name text,
        email text, role text, practice_id uuid, practice_name text, coach_ids uuid[], code_missing boolean)
      language sql stable ${DEFINER} as $$
        select s.id, s.expires_at, s.last_seen_at, a.id, a.name, a.email, a.role, p.id, p.name,
          coalesce((select array_agg(v.coach_id) from public.supervision v where v.supervisor_id = a.id), '{}'),
          a.role = 'owner' and p.owners_need_code and a.codes_since is null
        from public.session s
        join public.account a on a.id = s.user_id
        join public.practice p on p.id = s.practice_id
        where s.id = wanted and s.revoked_at is null and s.expires_at > now() and a.disabled_at is null
      $$`);
  }

  private links(): void {
    // the same work for every address: whether it is known is looked at by the job that writes the letter
    this.define(
      'ask_mail_link(link_id uuid, job_id uuid, wanted_kind text, to_email text, person text, practice text, until timestamptz)',
      'ask_mail_link(uuid, uuid, text, text, text, text, timestamptz)',
      `returns void language sql ${DEFINER} as $$
        delete from public.mail_link where expires_at < now() - interval '30 days' and practice_id is null;
        insert into public.mail_link (id, kind, email, person_name, practice_name, created_at, expires_at)
          select link_id, wanted_kind, to_email, person, practice, now(), until where wanted_kind in ('start', 'reset');
        insert into public.job_outbox (id, queue, payload, priority, created_at)
          values (job_id, 'send-mail-link', jsonb_build_object('linkId', link_id), 0, now());
        select pg_notify('redshank_outbox', '');
      $$`,
    );
    this.define('arm_mail_link(wanted uuid, new_hash text)', 'arm_mail_link(uuid, text)', `
      returns table (kind text, email text, person_name text, practice_name text, role text, by_name text, new_email text,
        expires_at timestamptz, address_known boolean)
      language sql ${DEFINER} as $$
        with armed as (
          update public.mail_link l set token_hash = new_hash
          where l.id = wanted and l.used_at is null and l.revoked_at is null and l.expires_at > now() returning l.*)
        select l.kind, l.email, l.person_name, coalesce(p.name, l.practice_name), l.role, b.name, l.new_email, l.expires_at,
          exists (select from public.account a where a.email = l.email and (l.kind <> 'reset' or a.disabled_at is null))
        from armed l left join public.practice p on p.id = l.practice_id left join public.account b on b.id = l.by_id
      $$`);
    this.define('mail_link_was_sent(wanted uuid)', 'mail_link_was_sent(uuid)',
      `returns void language sql ${DEFINER} as $$ update public.mail_link set sent_at = now() where id = wanted $$`);
    this.define('see_mail_link(wanted_hash text)', 'see_mail_link(text)', `
      returns table (link_id uuid, kind text, practice_id uuid, practice_name text, email text, person_name text, role text,
        user_id uuid, change_id uuid, new_email text)
      language sql stable ${DEFINER} as $$
        select l.id, l.kind, coalesce(l.practice_id, a.practice_id), coalesce(p.name, l.practice_name), l.email,
          l.person_name, l.role, coalesce(l.user_id, a.id), l.change_id, l.new_email
        from public.mail_link l
        left join public.account a on a.disabled_at is null and ((l.kind = 'reset' and a.email = l.email) or a.id = l.user_id)
        left join public.practice p on p.id = l.practice_id
        where l.token_hash = wanted_hash and l.used_at is null and l.revoked_at is null and l.expires_at > now()
          and (l.kind in ('invitation', 'start') or a.id is not null)
      $$`);
    // the row stays locked until its transaction ends: of two who use it at once one finds it used
    this.define('use_mail_link(wanted_hash text)', 'use_mail_link(text)', `
      returns table (link_id uuid) language sql ${DEFINER} as $$
        with used as (
          update public.mail_link l set used_at = now()
          where l.token_hash = wanted_hash and l.used_at is null and l.revoked_at is null and l.expires_at > now()
          returning l.id, l.kind, l.email),
        others as (
          update public.mail_link o set revoked_at = now() from used u
          where o.kind = 'reset' and u.kind = 'reset' and o.email = u.email and o.id <> u.id and o.used_at is null)
        select id from used
      $$`);
    this.define('address_taken(wanted text)', 'address_taken(text)',
      `returns boolean language sql stable ${DEFINER} as $$ select exists (select from public.account where email = wanted) $$`);
  }

  private jobs(): void {
    this.addSql(`create or replace function jobs_to_send(at_most int)
      returns table (id uuid, practice_id uuid, queue text, payload jsonb, priority int, start_after timestamptz)
      language sql stable ${DEFINER}
      as $$
        select o.id, coalesce(o.practice_id, '00000000-0000-0000-0000-000000000000'), o.queue, o.payload, o.priority,
          o.start_after from public.job_outbox o
        where o.sent_at is null order by o.priority desc, o.created_at limit at_most
      $$;`);
  }

  private unsentLinks(): void {
    this.addSql(`create function mail_links_to_send() returns table (link_id uuid, practice_id uuid) language sql stable ${DEFINER} as $$
      select id, coalesce(practice_id, '00000000-0000-0000-0000-000000000000') from public.mail_link
      where sent_at is null and used_at is null and revoked_at is null and expires_at > now()
    $$;`);
    this.addSql(`revoke all on function mail_links_to_send() from public;`);
    this.addSql(`grant execute on function mail_links_to_send() to redshank_jobs;`);
  }

  /** A function that sees past the walls, for the app alone. */
  private define(head: string, signature: string, body: string): void {
    this.addSql(`create function ${head} ${body};`);
    this.addSql(`revoke all on function ${signature} from public;`);
    this.addSql(`grant execute on function ${signature} to redshank_app;`);
  }

}
