import { Migration } from '@mikro-orm/migrations';

/** What is left of an athlete who was erased, and which practices have somebody to erase today. */
export class Migration20261202043400_erasures extends Migration {

  override up(): void {
    this.addSql(`create table "erasure" ("id" uuid not null, "practice_id" uuid not null, "athlete_id" uuid not null, "why" text check ("why" in ('asked', 'withdrawn', 'term')) not null, "asked_by_id" uuid null, "asked_at" timestamptz(3) not null, "visits" int not null, "clips" int not null, "bytes" bigint not null, "prefixes" text[] not null, "uploads" text[] not null, "done_at" timestamptz(3) null, constraint "erasure_pkey" primary key ("id"));`);
    this.addSql(`create index "erasure_practice_id_asked_at_index" on "erasure" ("practice_id", "asked_at");`);
    this.addSql(`alter table "erasure" add constraint "erasure_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "erasure" add constraint "erasure_asked_by_id_fk" foreign key (practice_id, "asked_by_id") references "account" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "erasure_asked_by_id_index" on "erasure" ("asked_by_id");`);
    this.addSql(`alter table "erasure" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "erasure" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`grant select, insert, update on "erasure" to redshank_app;`);
    this.addSql(`create policy for_functions on "erasure" for select to redshank_owner using (true);`);
    this.functions();
  }

  private functions(): void {
    this.addSql(`create function erasures_unfinished() returns table (erasure_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$ select e.id, e.practice_id from public.erasure e where e.done_at is null order by e.asked_at $$;`);
    this.addSql(`create function practices_to_tidy() returns table (practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select p.id from public.practice p where exists (
          select from public.athlete a where a.practice_id = p.id and (
            a.deletion_due <= (now() at time zone 'utc')::date
            or p.keep_months is not null and (
              coalesce((select max(v.day) from public.visit v where v.athlete_id = a.id), (a.created_at at time zone 'utc')::date)
              + make_interval(months => p.keep_months)
            )::date <= (now() at time zone 'utc')::date))
      $$;`);
    for (const signature of ['erasures_unfinished()', 'practices_to_tidy()']) {
      this.addSql(`revoke all on function ${signature} from public;`);
      this.addSql(`grant execute on function ${signature} to redshank_jobs;`);
    }
  }

}
