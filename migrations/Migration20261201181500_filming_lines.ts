import { Migration } from '@mikro-orm/migrations';

/** The floor line and the shutter of a clip, unknown where a clip was there before they were asked for. */
export class Migration20261201181500_filming_lines extends Migration {

  override up(): void {
    // the owner too is held by row-level security, and a migration belongs to no practice
    this.addSql(`alter table "clip" no force row level security;`);
    this.addSql(`update "clip" set geometry = '{"floorLine": null, "shutter": null}'::jsonb || geometry;`);
    this.addSql(`alter table "clip" force row level security;`);
  }

}
