import { Migration } from '@mikro-orm/migrations';

/** Two clips of one rep: the rep of the side clip that shows the same moment, and a clap to tie their clocks by. */
export class Migration20261201173000_two_clips extends Migration {

  override up(): void {
    this.addSql(`alter table "rep" add column "lift_from" uuid null, add column "clap_frame" int null;`);
    this.addSql(
      `alter table "rep" add constraint "rep_lift_from_fk" foreign key (practice_id, "lift_from") ` +
        `references "rep" (practice_id, id) on delete set null (lift_from);`,
    );
    this.addSql(`create index "rep_lift_from_index" on "rep" ("lift_from");`);
  }

}
