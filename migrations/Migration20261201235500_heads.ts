import { Migration } from '@mikro-orm/migrations';

/** Child column → parent, each together with the practice, so that no row can point into another practice. */
const REFERENCES: readonly [table: string, column: string, parent: string, onDelete: string][] = [
  ['head', 'clip_id', 'clip', 'cascade'],
  ['head', 'by_id', 'account', 'restrict'],
  ['head', 'looked_by_id', 'account', 'restrict'],
  ['replay', 'hidden_head_id', 'head', 'set null (hidden_head_id)'],
];

/** The box around the head of a clip, in versions; and replays that show only a copy on which the head is hidden. */
export class Migration20261201235500_heads extends Migration {

  override up(): void {
    this.addSql(`create table "head" ("id" uuid not null, "practice_id" uuid not null, "clip_id" uuid not null, "version" int not null, "from_frame" int not null, "to_frame" int not null, "drawn" jsonb not null, "followed" jsonb not null, "growth" double precision not null, "by_id" uuid not null, "at" timestamptz(3) not null, "looked_by_id" uuid null, "looked_at" timestamptz(3) null, constraint "head_pkey" primary key ("id"));`);
    this.addSql(`alter table "head" add constraint "head_clip_id_version_unique" unique ("clip_id", "version");`);
    this.addSql(`alter table "head" add constraint "head_in_practice" unique (practice_id, id);`);
    this.addSql(`alter table "head" add constraint "head_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "replay" add column "hide_head" boolean not null default false, add column "hidden_head_id" uuid null;`);
    for (const [table, column, parent, onDelete] of REFERENCES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") ` +
          `references "${parent}" (practice_id, id) on delete ${onDelete};`,
      );
      // the clip begins a unique constraint
      if (column !== 'clip_id') this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}");`);
    }
    this.walls();
    this.unfinished();
  }

  /** A version is added and looked at; what it says is never changed. It goes with its clip. */
  private walls(): void {
    this.addSql(`alter table "head" enable row level security, force row level security;`);
    this.addSql(
      `create policy own_practice on "head" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`,
    );
    this.addSql(`grant select, insert, update (looked_by_id, looked_at) on "head" to redshank_app;`);
    this.addSql(`create policy for_functions on "head" for select to redshank_owner using (true);`);
  }

  /** Replays whose copy is missing, or was made by an older box than the one that somebody looked at last. */
  private unfinished(): void {
    this.addSql(`create function heads_to_hide() returns table (replay_id uuid, practice_id uuid)
      language sql stable security definer set search_path = pg_catalog, public, pg_temp
      as $$
        select r.id, r.practice_id from public.replay r
        join public.rep e on e.id = r.rep_id
        join lateral (
          select h.id, h.looked_at from public.head h where h.clip_id = e.clip_id order by h.version desc limit 1
        ) h on h.looked_at is not null
        where r.hide_head and r.revoked_at is null and r.expires_at > now() and r.hidden_head_id is distinct from h.id
        order by r.at
      $$;`);
    this.addSql(`revoke all on function heads_to_hide() from public;`);
    this.addSql(`grant execute on function heads_to_hide() to redshank_jobs;`);
  }

}
