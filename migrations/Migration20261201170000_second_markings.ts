import { Migration } from '@mikro-orm/migrations';

const TABLES = ['second_marking', 'second_mark', 'second_mark_command'];

/** Child column → parent, each together with the practice, so that no row can point into another practice. */
const REFERENCES: readonly [table: string, column: string, parent: string, onDelete: string][] = [
  ['second_marking', 'rep_id', 'rep', 'cascade'],
  ['second_marking', 'marker_id', 'account', 'restrict'],
  ['second_marking', 'asked_by_id', 'account', 'restrict'],
  ['second_mark', 'second_marking_id', 'second_marking', 'cascade'],
  ['second_mark_command', 'second_marking_id', 'second_marking', 'cascade'],
];

/** Frames marked a second time, blind; and on each reading the marking error that it was made with. */
export class Migration20261201170000_second_markings extends Migration {

  override up(): void {
    this.addSql(`create table "second_marking" ("id" uuid not null, "practice_id" uuid not null, "rep_id" uuid not null, "marker_id" uuid not null, "asked_by_id" uuid not null, "asked_at" timestamptz(3) not null, "opened_at" timestamptz(3) null, "finished_at" timestamptz(3) null, "frames" jsonb not null, "first" jsonb not null, "phases" jsonb not null, "result" jsonb null, constraint "second_marking_pkey" primary key ("id"));`);
    this.addSql(`create table "second_mark" ("second_marking_id" uuid not null, "frame" int not null, "landmark" text not null, "practice_id" uuid not null, "present" boolean not null, "hidden" boolean not null, "u" double precision null, "v" double precision null, "picture_long_edge" int not null, "revision" int not null, "at" timestamptz(3) not null, constraint "second_mark_pkey" primary key ("second_marking_id", "frame", "landmark"));`);
    this.addSql(`create table "second_mark_command" ("second_marking_id" uuid not null, "id" uuid not null, "practice_id" uuid not null, "at" timestamptz(3) not null, constraint "second_mark_command_pkey" primary key ("second_marking_id", "id"));`);
    // readings so far were made with the assumed 3 px
    this.addSql(`alter table "reading" add column "mark_error_px" double precision not null default 3, add column "doubly_marked_frames" int not null default 0;`);
    this.addSql(`alter table "second_marking" add constraint "second_marking_in_practice" unique (practice_id, id);`);
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" add constraint "${table}_practice_fk" foreign key (practice_id) references practice (id);`);
    }
    for (const [table, column, parent, onDelete] of REFERENCES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") ` +
          `references "${parent}" (practice_id, id) on delete ${onDelete};`,
      );
    }
    for (const column of ['rep_id', 'marker_id', 'asked_by_id']) {
      this.addSql(`create index "second_marking_${column}_index" on "second_marking" ("${column}");`);
    }
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" enable row level security, force row level security;`);
      this.addSql(
        `create policy own_practice on "${table}" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`,
      );
      this.addSql(`grant select, insert, update, delete on "${table}" to redshank_app;`);
    }
  }

}
