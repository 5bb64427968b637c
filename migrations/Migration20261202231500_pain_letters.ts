import { Migration } from '@mikro-orm/migrations';

/** Somebody can be written to when an athlete says that something hurts. */
export class Migration20261202231500_pain_letters extends Migration {

  override up(): void {
    this.addSql(`alter table "mail_choice" drop constraint "mail_choice_kind_check";`);
    this.addSql(`alter table "mail_choice" add constraint "mail_choice_kind_check" check ("kind" in ('to-review', 'sent-back', 'comment', 'second-marking', 'pain'));`);
  }

}
