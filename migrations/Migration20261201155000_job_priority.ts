import { Migration } from '@mikro-orm/migrations';

/** What a change of a function's answer takes: it is made anew, with the same rights. */
const JOBS_TO_SEND = 'jobs_to_send(int)';

export class Migration20261201155000_job_priority extends Migration {

  override up(): void {
    this.addSql(`alter table "job_outbox" add column "priority" int not null default 0;`);
    this.addSql(`drop function ${JOBS_TO_SEND};`);
    this.addSql(`create function jobs_to_send(at_most int)
      returns table (id uuid, practice_id uuid, queue text, payload jsonb, priority int)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select o.id, o.practice_id, o.queue, o.payload, o.priority from public.job_outbox o
        where o.sent_at is null order by o.priority desc, o.created_at limit at_most
      $$;`);
    this.addSql(`revoke all on function ${JOBS_TO_SEND} from public;`);
    this.addSql(`grant execute on function ${JOBS_TO_SEND} to redshank_jobs;`);
  }

}
