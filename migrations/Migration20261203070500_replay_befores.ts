import { Migration } from '@mikro-orm/migrations';

/** Earlier reps that links show beside their own. */
export class Migration20261203070500_replay_befores extends Migration {

  override up(): void {
    this.addSql(`create table "replay_before" ("id" uuid not null, "practice_id" uuid not null, "replay_id" uuid not null, "rep_id" uuid not null, "from_frame" int not null, "to_frame" int not null, "hide_head" boolean not null, "hidden_head_id" uuid null, "hide_tries" int not null default 0, "hide_failed" boolean not null default false, constraint "replay_before_pkey" primary key ("id"));`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_replay_id_unique" unique ("replay_id");`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_span" check (0 <= from_frame and from_frame <= to_frame);`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_replay_id_fk" foreign key (practice_id, "replay_id") references "replay" (practice_id, id) on delete cascade;`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_rep_id_fk" foreign key (practice_id, "rep_id") references "rep" (practice_id, id) on delete cascade;`);
    this.addSql(`alter table "replay_before" add constraint "replay_before_hidden_head_id_fk" foreign key (practice_id, "hidden_head_id") references "head" (practice_id, id) on delete set null (hidden_head_id);`);
    this.addSql(`create index "replay_before_rep_id_index" on "replay_before" ("rep_id");`);
    this.addSql(`create index "replay_before_hidden_head_id_index" on "replay_before" ("hidden_head_id");`);
    this.addSql(`alter table "replay_before" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "replay_before" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`create policy for_functions on "replay_before" for select to redshank_owner using (true);`);
    this.addSql(`grant select, insert, delete, update (hidden_head_id, hide_tries, hide_failed) on "replay_before" to redshank_app;`);
    this.unfinished();
    this.ended();
  }

  /** As before, and the earlier reps of links: an id is that of either. */
  private unfinished(): void {
    this.addSql(`create or replace function heads_to_hide() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select s.id, s.practice_id from (
          select r.id, r.practice_id, r.rep_id, r.hide_head, r.hide_failed, r.hidden_head_id,
            r.revoked_at, r.expires_at, r.at
          from public.replay r
          union all
          select b.id, b.practice_id, b.rep_id, b.hide_head, b.hide_failed, b.hidden_head_id,
            r.revoked_at, r.expires_at, r.at
          from public.replay_before b join public.replay r on r.id = b.replay_id
        ) s
        join public.rep e on e.id = s.rep_id
        join lateral (
          select h.id, h.looked_at from public.head h where h.clip_id = e.clip_id order by h.version desc limit 1
        ) h on h.looked_at is not null
        where s.hide_head and not s.hide_failed and s.revoked_at is null and s.expires_at > now()
          and s.hidden_head_id is distinct from h.id
        order by s.at
      $$;`);
  }

  /** Links that open nothing any more and still have a copy or a film. */
  private ended(): void {
    this.addSql(`create or replace function hidden_copies_to_remove() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id from public.replay r
        where (r.revoked_at is not null or r.expires_at <= now())
          and (r.hidden_head_id is not null
            or exists (select from public.kept_film f where f.replay_id = r.id)
            or exists (select from public.replay_before b where b.replay_id = r.id and b.hidden_head_id is not null))
      $$;`);
  }

}
