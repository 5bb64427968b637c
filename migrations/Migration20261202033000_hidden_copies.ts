import { Migration } from '@mikro-orm/migrations';

/** Copies with a hidden head that could not be made say so; those of ended links go. */
export class Migration20261202033000_hidden_copies extends Migration {

  override up(): void {
    this.addSql(`alter table "replay" add column "hide_tries" int not null default 0, add column "hide_failed" boolean not null default false;`);
    this.unfinished();
    this.ended();
  }

  /** As before, but not those that were given up until a person asks again. */
  private unfinished(): void {
    this.addSql(`create or replace function heads_to_hide() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id from public.replay r
        join public.rep e on e.id = r.rep_id
        join lateral (
          select h.id, h.looked_at from public.head h where h.clip_id = e.clip_id order by h.version desc limit 1
        ) h on h.looked_at is not null
        where r.hide_head and not r.hide_failed and r.revoked_at is null and r.expires_at > now()
          and r.hidden_head_id is distinct from h.id
        order by r.at
      $$;`);
  }

  /** Links that open nothing any more and still have a copy. */
  private ended(): void {
    this.addSql(`create function hidden_copies_to_remove() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select id, practice_id from public.replay
        where hidden_head_id is not null and (revoked_at is not null or expires_at <= now())
      $$;`);
    this.addSql(`revoke all on function hidden_copies_to_remove() from public;`);
    this.addSql(`grant execute on function hidden_copies_to_remove() to redshank_jobs;`);
  }

}
