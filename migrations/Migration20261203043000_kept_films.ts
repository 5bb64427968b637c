import { Migration } from '@mikro-orm/migrations';

/** Films with drawing and reading in the picture, for an athlete to keep. */
export class Migration20261203043000_kept_films extends Migration {

  override up(): void {
    this.addSql(`alter table "replay" add constraint "replay_in_practice" unique (practice_id, id);`);
    this.addSql(`create table "kept_film" ("id" uuid not null, "practice_id" uuid not null, "replay_id" uuid not null, "state" text check ("state" in ('asked', 'ready', 'failed')) not null default 'asked', "tries" int not null default 0, "head_id" uuid null, "bytes" int null, "made_at" timestamptz(3) null, "taken" int not null default 0, "last_taken_at" timestamptz(3) null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "kept_film_pkey" primary key ("id"));`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_replay_id_unique" unique ("replay_id");`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_ready_is_whole" check (state <> 'ready' or (bytes > 0 and made_at is not null));`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_replay_id_fk" foreign key (practice_id, "replay_id") references "replay" (practice_id, id) on delete cascade;`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_head_id_fk" foreign key (practice_id, "head_id") references "head" (practice_id, id) on delete set null (head_id);`);
    this.addSql(`alter table "kept_film" add constraint "kept_film_by_id_fk" foreign key (practice_id, "by_id") references "account" (practice_id, id) on delete restrict;`);
    this.addSql(`create index "kept_film_by_id_index" on "kept_film" ("by_id");`);
    this.addSql(`create index "kept_film_head_id_index" on "kept_film" ("head_id");`);
    this.addSql(`create index "kept_film_to_make" on "kept_film" (at) where state = 'asked';`);
    this.addSql(`alter table "kept_film" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "kept_film" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`create policy for_functions on "kept_film" for select to redshank_owner using (true);`);
    this.addSql(`grant select, insert, delete, update (state, tries, head_id, bytes, made_at, taken, last_taken_at, by_id, at) on "kept_film" to redshank_app;`);
    this.unfinished();
    this.ended();
  }

  /** Asked for and neither made nor given up, of links that still open. */
  private unfinished(): void {
    this.addSql(`create function films_to_make() returns table (film_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select f.id, f.practice_id from public.kept_film f join public.replay r on r.id = f.replay_id
        where f.state = 'asked' and r.revoked_at is null and r.expires_at > now() order by f.at
      $$;`);
    this.addSql(`revoke all on function films_to_make() from public;`);
    this.addSql(`grant execute on function films_to_make() to redshank_jobs;`);
  }

  /** Links that open nothing any more and still have a copy or a film. */
  private ended(): void {
    this.addSql(`create or replace function hidden_copies_to_remove() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id from public.replay r
        where (r.revoked_at is not null or r.expires_at <= now())
          and (r.hidden_head_id is not null or exists (select from public.kept_film f where f.replay_id = r.id))
      $$;`);
  }

}
