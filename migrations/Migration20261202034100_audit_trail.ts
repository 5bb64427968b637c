import { Migration } from '@mikro-orm/migrations';

/** Who is concerned and from where it was asked; and the trail refuses change even where no row would be met. */
export class Migration20261202034100_audit_trail extends Migration {

  override up(): void {
    this.addSql(`alter table "audit_entry" add column "role" text check ("role" in ('owner', 'supervisor', 'coach')) null, add column "athlete_id" uuid null, add column "session_id" uuid null, add column "request_id" text null, add column "network" text null, add column "once_key" text null;`);
    this.addSql(`alter table "audit_entry" drop constraint "audit_entry_actor_check";`);
    this.addSql(`alter table "audit_entry" add constraint "audit_entry_actor_check" check ("actor" in ('user', 'link', 'product', 'nobody'));`);
    this.addSql(`alter table "audit_entry" add constraint "audit_entry_once_key_unique" unique ("once_key");`);
    this.addSql(`create index "audit_entry_practice_id_athlete_id_at_index" on "audit_entry" ("practice_id", "athlete_id", "at");`);
    this.addSql(`create index "audit_entry_practice_id_by_user_at_index" on "audit_entry" ("practice_id", "by_user", "at");`);
    this.addSql(`drop trigger audit_entry_only_added_to on audit_entry;`);
    this.addSql(`drop trigger audit_entry_never_emptied on audit_entry;`);
    this.athletesOfEarlierEntries();
    // a trigger for each row would stay silent where row-level security shows none
    this.addSql(`create trigger audit_entry_only_added_to before update or delete or truncate on audit_entry
      for each statement execute function refuse_change();`);
  }

  /** As far as the entry's own ids still lead to them. */
  private athletesOfEarlierEntries(): void {
    // the owner, too, is bound by the walls; for this one statement it sees every practice
    this.addSql(`alter table "audit_entry" no force row level security;`);
    this.addSql(`update audit_entry e set athlete_id = coalesce(
      case when e.subject = 'athlete' then e.subject_id end,
      (e.detail->>'athlete')::uuid,
      (select v.athlete_id from visit v where v.id = case when e.subject = 'visit' then e.subject_id else (e.detail->>'visit')::uuid end),
      (select v.athlete_id from clip c join visit v on v.id = c.visit_id
        where c.id = case when e.subject = 'clip' then e.subject_id else (e.detail->>'clip')::uuid end),
      (select v.athlete_id from rep r join clip c on c.id = r.clip_id join visit v on v.id = c.visit_id
        where r.id = case when e.subject = 'rep' then e.subject_id else (e.detail->>'repId')::uuid end),
      (select v.athlete_id from replay r join visit v on v.id = r.visit_id where e.subject = 'replay' and r.id = e.subject_id)
    );`);
    this.addSql(`alter table "audit_entry" force row level security;`);
  }

}
