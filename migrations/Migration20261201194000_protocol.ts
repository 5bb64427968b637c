import { Migration } from '@mikro-orm/migrations';

/** The figures of version 1 of every practice: those of every reading so far. */
const STANDARD = `{"gateFrom": 60, "gateTo": 90, "fromBelow": 12, "fromAbove": 10, "toBelow": 12, "toAbove": 16, "liftShort": 85, "early": 0.95, "before": 0.975, "turnIn": 0.95, "flat": 0.8, "thighTurnsLittle": false, "setUpId": null, "reps": 3, "framesPerSecond": 60}`;
const FIRST_NOTE = 'The figures that the study was made with.';

/** A practice's protocol in versions, which are only added to; and on readings and calls which of them they go by. */
export class Migration20261201194000_protocol extends Migration {

  override up(): void {
    this.versions();
    this.namedByReadings();
    this.walls();
  }

  private versions(): void {
    this.addSql(`create table "protocol_version" ("id" uuid not null, "practice_id" uuid not null, "version" int not null, "values" jsonb not null, "by_id" uuid null, "at" timestamptz(3) not null, "note" text not null, constraint "protocol_version_pkey" primary key ("id"));`);
    this.addSql(`alter table "protocol_version" add constraint "protocol_version_practice_id_version_unique" unique ("practice_id", "version");`);
    this.addSql(`alter table "protocol_version" add constraint "protocol_version_in_practice" unique (practice_id, id);`);
    this.addSql(`alter table "protocol_version" add constraint "protocol_version_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "protocol_version" add constraint "protocol_version_by_id_fk" foreign key (practice_id, "by_id") references "account" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "protocol_version_by_id_index" on "protocol_version" ("by_id");`);
    this.addSql(`insert into protocol_version (id, practice_id, version, "values", by_id, at, note)
      select gen_random_uuid(), id, 1, '${STANDARD}'::jsonb, null, created_at, '${FIRST_NOTE}' from practice;`);
    this.addSql(`create function first_protocol() returns trigger language plpgsql
      as $$ begin
        insert into protocol_version (id, practice_id, version, "values", by_id, at, note)
          values (gen_random_uuid(), new.id, 1, '${STANDARD}'::jsonb, null, new.created_at, '${FIRST_NOTE}');
        return new;
      end $$;`);
    this.addSql(`create trigger practice_has_a_protocol after insert on practice for each row execute function first_protocol();`);
  }

  private namedByReadings(): void {
    this.addSql(`alter table "reading" add column "protocol_id" uuid null, add column "gate_from" double precision not null default 60, add column "gate_to" double precision not null default 90;`);
    // the owner, too, is bound by the walls; for this one statement it sees every practice
    this.addSql(`alter table "reading" no force row level security;`);
    this.addSql(`update reading set protocol_id = v.id from protocol_version v where v.practice_id = reading.practice_id and v.version = 1;`);
    this.addSql(`alter table "reading" force row level security;`);
    this.addSql(`alter table "reading" alter column "protocol_id" set not null;`);
    this.addSql(`alter table "reading" add constraint "reading_protocol_id_fk" foreign key (practice_id, "protocol_id") references "protocol_version" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "reading_protocol_id_index" on "reading" ("protocol_id");`);
    this.addSql(`alter table "call" add column "gate_from" double precision not null default 60, add column "gate_to" double precision not null default 90;`);
  }

  private walls(): void {
    this.addSql(`alter table "protocol_version" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "protocol_version" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`grant select, insert on "protocol_version" to redshank_app;`);
    this.addSql(`create function refuse_protocol_change() returns trigger language plpgsql
      as $$ begin raise exception 'A protocol is only added to.' using errcode = 'restrict_violation'; end $$;`);
    this.addSql(`create trigger protocol_version_only_added_to before update or delete on protocol_version
      for each row execute function refuse_protocol_change();`);
    this.addSql(`create trigger protocol_version_never_emptied before truncate on protocol_version
      for each statement execute function refuse_protocol_change();`);
  }

}
