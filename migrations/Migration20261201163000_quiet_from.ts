import { Migration } from '@mikro-orm/migrations';

/** A rep may take its quiet stance from another rep; who took it has its own again when that rep is deleted. */
export class Migration20261201163000_quiet_from extends Migration {

  override up(): void {
    this.addSql(`alter table "rep" add column "quiet_from" uuid null;`);
    this.addSql(
      `alter table "rep" add constraint "rep_quiet_from_fk" foreign key (practice_id, "quiet_from") ` +
        `references "rep" (practice_id, id) on delete set null (quiet_from);`,
    );
    this.addSql(`create index "rep_quiet_from_index" on "rep" ("quiet_from");`);
  }

}
