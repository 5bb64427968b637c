import { Migration } from '@mikro-orm/migrations';

/** How long a clip's preparation took; unknown for those that are ready already. */
export class Migration20261202001000_prepared_seconds extends Migration {

  override up(): void {
    this.addSql(`alter table "clip" add column "prepared_seconds" double precision null;`);
  }

}
