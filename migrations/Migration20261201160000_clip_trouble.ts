import { Migration } from '@mikro-orm/migrations';

/** What a change of a function's answer takes: it is made anew, with the same rights. */
const JOBS_TO_SEND = 'jobs_to_send(int)';

export class Migration20261201160000_clip_trouble extends Migration {

  override up(): void {
    this.addSql(`alter table "job_outbox" add column "start_after" timestamptz(3) null;`);
    this.addSql(`alter table "clip" add column "tries" int not null default 0, add column "trouble" text check ("trouble" in ('no-space', 'tool-missing', 'interrupted', 'machine')) null, add column "next_try_at" timestamptz(3) null;`);
    this.addSql(`drop function ${JOBS_TO_SEND};`);
    this.addSql(`create function jobs_to_send(at_most int)
      returns table (id uuid, practice_id uuid, queue text, payload jsonb, priority int, start_after timestamptz)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select o.id, o.practice_id, o.queue, o.payload, o.priority, o.start_after from public.job_outbox o
        where o.sent_at is null order by o.priority desc, o.created_at limit at_most
      $$;`);
    this.addSql(`revoke all on function ${JOBS_TO_SEND} from public;`);
    this.addSql(`grant execute on function ${JOBS_TO_SEND} to redshank_jobs;`);
    // not those whose tries have ended: they wait for a person
    this.addSql(`create or replace function clips_to_prepare() returns table (clip_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select c.id, c.practice_id from public.clip c
        where c.state = 'preparing' or c.state = 'waiting' and (c.trouble is null or c.next_try_at is not null)
        order by c.uploaded_at
      $$;`);
  }

}
