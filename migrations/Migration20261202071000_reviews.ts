import { Migration } from '@mikro-orm/migrations';

const TABLES = ['review', 'side_review'];

/** Child column → parent, each together with the practice, so that no row can point into another practice. */
const REFERENCES: readonly [table: string, column: string, parent: string, onDelete: string][] = [
  ['review', 'visit_id', 'visit', 'cascade'],
  ['review', 'reading_id', 'reading', 'cascade'],
  ['review', 'call_id', 'call', 'cascade'],
  ['review', 'by_id', 'account', 'restrict'],
  ['side_review', 'visit_id', 'visit', 'cascade'],
  ['side_review', 'last_id', 'review', 'cascade'],
];

/** The supervisor's word on a reading or a call by eye; and that a reading is never changed, by the database itself. */
export class Migration20261202071000_reviews extends Migration {

  override up(): void {
    this.addSql(`create table "review" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "step" text check ("step" in ('handed-in', 'signed-off', 'sent-back')) not null, "reading_id" uuid null, "call_id" uuid null, "reason" text not null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "review_pkey" primary key ("id"));`);
    this.addSql(`create index "review_visit_id_side_at_index" on "review" ("visit_id", "side", "at");`);
    this.addSql(`alter table "review" add constraint "review_about_one" check ((reading_id is null) <> (call_id is null));`);
    this.addSql(`alter table "review" add constraint "review_sent_back_says_why" check (step <> 'sent-back' or reason <> '');`);
    this.addSql(`create table "side_review" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "last_id" uuid not null, "waits_since" timestamptz(3) null, "sent_back" boolean not null default false, constraint "side_review_pkey" primary key ("id"));`);
    this.addSql(`alter table "side_review" add constraint "side_review_visit_id_side_unique" unique ("visit_id", "side");`);
    this.addSql(`create index "side_review_waiting" on "side_review" (practice_id, waits_since) where waits_since is not null;`);
    this.addSql(`alter table "call" add constraint "call_in_practice" unique (practice_id, id);`);
    this.addSql(`alter table "review" add constraint "review_in_practice" unique (practice_id, id);`);
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" add constraint "${table}_practice_fk" foreign key (practice_id) references practice (id);`);
    }
    for (const [table, column, parent, onDelete] of REFERENCES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") ` +
          `references "${parent}" (practice_id, id) on delete ${onDelete};`,
      );
    }
    for (const [table, column] of REFERENCES) {
      if (column !== 'visit_id') this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}");`);
    }
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" enable row level security, force row level security;`);
      this.addSql(
        `create policy own_practice on "${table}" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`,
      );
    }
    this.addSql(`grant select, insert on "review" to redshank_app;`);
    this.addSql(`grant select, insert, update on "side_review" to redshank_app;`);
    // a reading stays as it was made: other marks make another row
    this.addSql(`revoke update, delete on "reading" from redshank_app;`);
  }

}
