import { Migration } from '@mikro-orm/migrations';

export class Migration20261201133912_stale_readings extends Migration {

  override async up(): Promise<void> {
    this.addSql(`alter table "side_setting" add column "stale" boolean not null default false;`);
  }

  override async down(): Promise<void> {
    this.addSql(`alter table "side_setting" drop column "stale";`);
  }

}
