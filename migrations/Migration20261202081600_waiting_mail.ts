import { Migration } from '@mikro-orm/migrations';

/** About what each person is written to when it waits for them. */
export class Migration20261202081600_waiting_mail extends Migration {

  override up(): void {
    this.addSql(`create table "mail_choice" ("user_id" uuid not null, "kind" text check ("kind" in ('to-review', 'sent-back', 'comment', 'second-marking')) not null, "practice_id" uuid not null, "off" boolean not null default false, "asked_at" timestamptz(3) null, constraint "mail_choice_pkey" primary key ("user_id", "kind"));`);
    this.addSql(`alter table "mail_choice" add constraint "mail_choice_practice_fk" foreign key (practice_id) references practice (id);`);
    this.addSql(`alter table "mail_choice" add constraint "mail_choice_user_id_fk" foreign key (practice_id, "user_id") references "account" (practice_id, id) on delete cascade;`);
    this.addSql(`alter table "mail_choice" enable row level security, force row level security;`);
    this.addSql(`create policy own_practice on "mail_choice" to redshank_app using (practice_id = current_practice()) with check (practice_id = current_practice());`);
    this.addSql(`grant select, insert, update on "mail_choice" to redshank_app;`);
  }

}
