import { Migration } from '@mikro-orm/migrations';

/** Uploads that nobody comes back for are found and given up. */
export class Migration20261203082300_abandoned_uploads extends Migration {

  override up(): void {
    this.addSql(`create policy for_functions on "upload" for select to redshank_owner using (true);`);
    this.addSql(`create function uploads_to_give_up() returns table (upload_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select u.id, u.practice_id from public.upload u
        where u.opened_at < now() - interval '3 days' order by u.opened_at
      $$;`);
    this.addSql(`revoke all on function uploads_to_give_up() from public;`);
    this.addSql(`grant execute on function uploads_to_give_up() to redshank_jobs;`);
  }

}
