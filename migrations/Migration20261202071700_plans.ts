import { Migration } from '@mikro-orm/migrations';

/** Child column → parent, each together with the practice, so that no row can point into another practice. */
const REFERENCES: readonly [table: string, column: string, parent: string, onDelete: string][] = [
  ['plan', 'visit_id', 'visit', 'cascade'],
  ['plan', 'reading_id', 'reading', 'set null (reading_id)'],
  ['plan', 'made_by_id', 'account', 'restrict'],
  ['plan_item', 'plan_id', 'plan', 'cascade'],
  ['given_plan', 'plan_id', 'plan', 'cascade'],
  ['given_plan', 'by_id', 'account', 'restrict'],
  ['plan_tick', 'plan_id', 'plan', 'cascade'],
  ['plan_pain', 'plan_id', 'plan', 'cascade'],
  ['plan_pain', 'seen_by_id', 'account', 'restrict'],
];

/** What was given and what a link answered is only added to; it goes with its plan. */
const RIGHTS: readonly [table: string, rights: string][] = [
  ['plan', 'select, insert, update, delete'],
  ['plan_item', 'select, insert, update, delete'],
  ['given_plan', 'select, insert'],
  ['plan_tick', 'select, insert'],
  ['plan_pain', 'select, insert, update (seen_by_id, seen_at)'],
];

/** Begin a unique constraint or another index. */
const INDEXED = ['plan.visit_id', 'plan_item.plan_id', 'given_plan.plan_id', 'plan_tick.plan_id', 'plan_pain.plan_id'];

/** Plans with their exercises, what of them was given to the athlete, and what the athlete answered. */
export class Migration20261202071700_plans extends Migration {

  override up(): void {
    this.tables();
    this.walls();
  }

  private tables(): void {
    this.addSql(`create table "plan" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "basis" jsonb not null, "reading_id" uuid null, "rule" text null, "because" text not null, "note" text not null default '', "retest_on" date null, "made_by_id" uuid not null, "made_at" timestamptz(3) not null, "edited_at" timestamptz(3) null, "version" int not null default 1, constraint "plan_pkey" primary key ("id"));`);
    this.addSql(`alter table "plan" add constraint "plan_visit_id_side_unique" unique ("visit_id", "side");`);
    this.addSql(`alter table "plan" add constraint "plan_in_practice" unique (practice_id, id);`);
    this.addSql(`create table "plan_item" ("id" uuid not null, "practice_id" uuid not null, "plan_id" uuid not null, "exercise" text not null, "position" int not null, "stage" int not null, "side" text check ("side" in ('left', 'right')) not null, "side_confirmed" boolean not null default false, "dose" jsonb not null, "cue" text not null default '', "decision" jsonb null, constraint "plan_item_pkey" primary key ("id"));`);
    this.addSql(`alter table "plan_item" add constraint "plan_item_plan_id_exercise_unique" unique ("plan_id", "exercise");`);
    this.addSql(`create table "given_plan" ("id" uuid not null, "practice_id" uuid not null, "plan_id" uuid not null, "number" int not null, "content" jsonb null, "plan_version" int not null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "given_plan_pkey" primary key ("id"));`);
    this.addSql(`alter table "given_plan" add constraint "given_plan_plan_id_number_unique" unique ("plan_id", "number");`);
    this.addSql(`create table "plan_tick" ("id" uuid not null, "practice_id" uuid not null, "plan_id" uuid not null, "exercise" text not null, "day" date not null, "done" boolean not null, "at" timestamptz(3) not null, constraint "plan_tick_pkey" primary key ("id"));`);
    this.addSql(`create index "plan_tick_plan_id_day_index" on "plan_tick" ("plan_id", "day");`);
    this.addSql(`create table "plan_pain" ("id" uuid not null, "practice_id" uuid not null, "plan_id" uuid not null, "day" date not null, "level" int not null, "places" text[] not null, "which" text check ("which" in ('left', 'right', 'both')) null, "time" text check ("time" in ('while-doing-it', 'afterwards', 'next-day', 'always')) null, "exercise" text null, "at" timestamptz(3) not null, "seen_by_id" uuid null, "seen_at" timestamptz(3) null, constraint "plan_pain_pkey" primary key ("id"));`);
    this.addSql(`create index "plan_pain_plan_id_at_index" on "plan_pain" ("plan_id", "at");`);
    this.addSql(`alter table "plan_pain" add constraint "plan_pain_level" check (level between 0 and 10);`);
    this.addSql(`create index "plan_retest_on_index" on "plan" ("retest_on") where retest_on is not null;`);
    this.addSql(`create index "plan_pain_unseen_index" on "plan_pain" ("plan_id") where seen_at is null and level > 0;`);
  }

  private walls(): void {
    for (const [table, rights] of RIGHTS) {
      this.addSql(`alter table "${table}" add constraint "${table}_practice_fk" foreign key (practice_id) references practice (id);`);
      this.addSql(`alter table "${table}" enable row level security, force row level security;`);
      this.addSql(`create policy own_practice on "${table}" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
      this.addSql(`grant ${rights} on "${table}" to redshank_app;`);
    }
    for (const [table, column, parent, onDelete] of REFERENCES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_fk" foreign key (practice_id, "${column}") ` +
          `references "${parent}" (practice_id, id) on delete ${onDelete};`,
      );
      if (!INDEXED.includes(`${table}.${column}`))
        this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}");`);
    }
  }

}
