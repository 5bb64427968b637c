import { Migration } from '@mikro-orm/migrations';

/** Version 1 of every practice's wording. From us, no source; a practice has it read by whoever knows its law. */
const STANDARD = `{"intro": "We film how you stand on one leg and lift the other knee. You can say yes to each of the following by itself, and take any yes back at any time, without a reason and without being treated differently.", "assessment": "Your clips are kept in this practice. Your coach and the owner of the practice look at them, mark points of the body on them and write down what they see.", "supervision": "An experienced colleague who is assigned to your coach looks at your clips, your marks and what was read from them.", "teaching": "Your clips are shown to others who learn, never with the face and never with your name.", "sharing-by-link": "You get a link that opens one clip with what was seen on it. Whoever has the link can open it until it ends.", "minors": "A guardian says yes, and the young person is asked in words that fit their age. Without their own yes nothing is filmed.", "withdrawal": "Tell your coach, or the practice, and it holds from that moment: links end, clips are closed, and they are deleted after the time that the practice names."}`;
const FIRST_NOTE = 'The wording that Redshank comes with. From us, no source: have it read by somebody who knows your law.';

/** Consent as a life: wording in versions, purposes withdrawn one by one, a scan of the paper, and what a withdrawal schedules. */
export class Migration20261202041200_consent_life extends Migration {

  override up(): void {
    this.wording();
    this.consents();
    this.schedule();
    this.links();
  }

  private wording(): void {
    this.addSql(`create table "consent_wording" ("id" uuid not null, "practice_id" uuid not null, "version" int not null, "texts" jsonb not null, "by_id" uuid null, "at" timestamptz(3) not null, "note" text not null, constraint "consent_wording_pkey" primary key ("id"));`);
    this.addSql(`alter table "consent_wording" add constraint "consent_wording_practice_id_version_unique" unique ("practice_id", "version");`);
    this.addSql(`alter table "consent_wording" add constraint "consent_wording_in_practice" unique (practice_id, id);`);
    this.addSql(`alter table "consent_wording" add constraint "consent_wording_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "consent_wording" add constraint "consent_wording_by_id_fk" foreign key (practice_id, "by_id") references "account" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "consent_wording_by_id_index" on "consent_wording" ("by_id");`);
    this.addSql(`insert into consent_wording (id, practice_id, version, texts, by_id, at, note)
      select gen_random_uuid(), id, 1, '${STANDARD}'::jsonb, null, now(), '${FIRST_NOTE}' from practice;`);
    this.addSql(`create function first_consent_wording() returns trigger language plpgsql
      as $$ begin
        insert into consent_wording (id, practice_id, version, texts, by_id, at, note)
          values (gen_random_uuid(), new.id, 1, '${STANDARD}'::jsonb, null, new.created_at, '${FIRST_NOTE}');
        return new;
      end $$;`);
    this.addSql(`create trigger practice_has_a_consent_wording after insert on practice for each row execute function first_consent_wording();`);
    this.addSql(`alter table "consent_wording" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "consent_wording" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`grant select, insert on "consent_wording" to redshank_app;`);
    this.addSql(`create function refuse_wording_change() returns trigger language plpgsql
      as $$ begin raise exception 'A consent wording is only added to.' using errcode = 'restrict_violation'; end $$;`);
    this.addSql(`create trigger consent_wording_only_added_to before update or delete on consent_wording
      for each row execute function refuse_wording_change();`);
    this.addSql(`create trigger consent_wording_never_emptied before truncate on consent_wording
      for each statement execute function refuse_wording_change();`);
  }

  private consents(): void {
    this.addSql(`alter table "consent" add column "held" text[] not null default '{}', add column "withdrawals" jsonb not null default '[]', add column "wording_id" uuid null, add column "scan" jsonb null;`);
    // the owner, too, is bound by the walls; for this one statement it sees every practice
    this.addSql(`alter table "consent" no force row level security;`);
    this.addSql(`update consent set held = case when withdrawn_at is null then purposes else '{}' end;`);
    this.addSql(`alter table "consent" force row level security;`);
    this.addSql(`alter table "consent" alter column "held" drop default;`);
    this.addSql(`alter table "consent" add constraint "consent_wording_id_fk" foreign key (practice_id, "wording_id") references "consent_wording" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "consent_wording_id_index" on "consent" ("wording_id");`);
  }

  /** Those whose consent to filming was withdrawn before there was a term get the whole term from today on. */
  private schedule(): void {
    this.addSql(`alter table "practice" add column "keep_months" int null, add column "withdrawal_days" int not null default 30;`);
    this.addSql(`alter table "practice" add constraint "practice_keep_months" check (keep_months between 1 and 600), add constraint "practice_withdrawal_days" check (withdrawal_days between 0 and 365);`);
    this.addSql(`alter table "athlete" add column "deletion_due" date null;`);
    for (const table of ['athlete', 'consent']) this.addSql(`alter table "${table}" no force row level security;`);
    this.addSql(`update athlete a set deletion_due = (now() at time zone 'utc')::date + 30
      where exists (select from consent c where c.athlete_id = a.id and c.withdrawn_at is not null and 'assessment' = any (c.purposes))
      and not exists (select from consent c where c.athlete_id = a.id and c.withdrawn_at is null and 'assessment' = any (c.purposes));`);
    for (const table of ['athlete', 'consent']) this.addSql(`alter table "${table}" force row level security;`);
    this.addSql(`create policy for_functions on "athlete" for select to redshank_owner using (true);`);
  }

  /** A link lives while its purpose is held, by a minor with their own yes, and not after filming was withdrawn. */
  private links(): void {
    this.addSql(`drop function find_replay(text);`);
    this.addSql(`create function find_replay(wanted_hash text)
      returns table (replay_id uuid, practice_id uuid, visit_id uuid, rep_id uuid, clip_id uuid, pass_phrase_hash text)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id, r.visit_id, r.rep_id, e.clip_id, r.pass_phrase_hash
        from public.replay r join public.rep e on e.id = r.rep_id join public.visit v on v.id = r.visit_id
        join public.athlete a on a.id = v.athlete_id
        where r.token_hash = wanted_hash and r.revoked_at is null and r.expires_at > now() and a.deletion_due is null
        and exists (
          select from public.consent c where c.athlete_id = a.id and c.withdrawn_at is null
          and (now() at time zone 'utc')::date between c.valid_from and c.valid_until
          and (c.assent or a.birth_date <= (now() at time zone 'utc')::date - interval '18 years')
          and 'sharing-by-link' = any (c.held))
      $$;`);
    this.addSql(`revoke all on function find_replay(text) from public;`);
    this.addSql(`grant execute on function find_replay(text) to redshank_app;`);
  }

}
