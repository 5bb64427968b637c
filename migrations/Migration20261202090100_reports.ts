import { Migration } from '@mikro-orm/migrations';

/** Visits on paper: what was asked for, what it says, and whether it is made. */
export class Migration20261202090100_reports extends Migration {

  override up(): void {
    this.addSql(`create table "report" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "number" int not null, "state" text check ("state" in ('asked', 'ready', 'failed')) not null default 'asked', "content" jsonb not null, "tries" int not null default 0, "pages" int null, "bytes" int null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "report_pkey" primary key ("id"));`);
    this.addSql(`alter table "report" add constraint "report_visit_id_number_unique" unique ("visit_id", "number");`);
    this.addSql(`alter table "report" add constraint "report_ready_is_whole" check (state <> 'ready' or (pages > 0 and bytes > 0));`);
    this.addSql(`alter table "report" add constraint "report_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "report" add constraint "report_visit_id_fk" foreign key (practice_id, "visit_id") references "visit" (practice_id, id) on delete cascade;`);
    this.addSql(`alter table "report" add constraint "report_by_id_fk" foreign key (practice_id, "by_id") references "account" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "report_by_id_index" on "report" ("by_id");`);
    this.addSql(`create index "report_to_make" on "report" (at) where state = 'asked';`);
    this.addSql(`alter table "report" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "report" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`create policy for_functions on "report" for select to redshank_owner using (true);`);
    // what was said stays said
    this.addSql(`grant select, insert, update (state, tries, pages, bytes) on "report" to redshank_app;`);
    this.unfinished();
  }

  /** Asked for and neither made nor given up. */
  private unfinished(): void {
    this.addSql(`create function reports_to_make() returns table (report_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$ select id, practice_id from public.report where state = 'asked' order by at $$;`);
    this.addSql(`revoke all on function reports_to_make() from public;`);
    this.addSql(`grant execute on function reports_to_make() to redshank_jobs;`);
  }

}
