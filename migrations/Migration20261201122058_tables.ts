import { Migration } from '@mikro-orm/migrations';

export class Migration20261201122058_tables extends Migration {

  override async up(): Promise<void> {
    this.addSql(`create table "audit_entry" ("id" uuid not null, "practice_id" uuid not null, "at" timestamptz(3) not null, "by_user" uuid null, "actor" text check ("actor" in ('user', 'link', 'product')) not null, "action" text not null, "subject" text not null, "subject_id" uuid not null, "detail" jsonb null, constraint "audit_entry_pkey" primary key ("id"));`);
    this.addSql(`create index "audit_entry_practice_id_at_index" on "audit_entry" ("practice_id", "at");`);

    this.addSql(`create table "job_outbox" ("id" uuid not null, "practice_id" uuid not null, "queue" text not null, "payload" jsonb not null, "created_at" timestamptz(3) not null, "sent_at" timestamptz(3) null, constraint "job_outbox_pkey" primary key ("id"));`);
    this.addSql(`create index "job_outbox_sent_at_created_at_index" on "job_outbox" ("sent_at", "created_at");`);

    this.addSql(`create table "mark" ("rep_id" uuid not null, "frame" int not null, "landmark" text not null, "practice_id" uuid not null, "present" boolean not null, "hidden" boolean not null, "u" double precision null, "v" double precision null, "source" text check ("source" in ('hand', 'tracked')) not null, "looked" boolean not null, "confidence" double precision null, "picture_long_edge" int not null, "revision" int not null, "by_user" uuid not null, "at" timestamptz(3) not null, constraint "mark_pkey" primary key ("rep_id", "frame", "landmark"));`);

    this.addSql(`create table "mark_command" ("rep_id" uuid not null, "id" uuid not null, "practice_id" uuid not null, "frame" int not null, "landmark" text not null, "revision" int not null, "at" timestamptz(3) not null, constraint "mark_command_pkey" primary key ("rep_id", "id"));`);

    this.addSql(`create table "practice" ("id" uuid not null, "name" text not null, "contact" text not null default '', "created_at" timestamptz(3) not null, constraint "practice_pkey" primary key ("id"));`);

    this.addSql(`create table "account" ("id" uuid not null, "practice_id" uuid not null, "email" text not null, "name" text not null, "role" text check ("role" in ('owner', 'supervisor', 'coach')) not null, "password_hash" text not null, "disabled_at" timestamptz(3) null, "created_at" timestamptz(3) not null, constraint "account_pkey" primary key ("id"));`);
    this.addSql(`alter table "account" add constraint "account_email_unique" unique ("email");`);

    this.addSql(`create table "supervision" ("id" uuid not null, "practice_id" uuid not null, "supervisor_id" uuid not null, "coach_id" uuid not null, constraint "supervision_pkey" primary key ("id"));`);
    this.addSql(`alter table "supervision" add constraint "supervision_supervisor_id_coach_id_unique" unique ("supervisor_id", "coach_id");`);

    this.addSql(`create table "set_up" ("id" uuid not null, "practice_id" uuid not null, "name" text not null, "distance_mm" double precision not null, "lens_height_mm" double precision null, "rod_mm" double precision null, "belt_pointer_mm" double precision null, "thigh_pointer_mm" double precision null, "last_used" date null, "saved_by_id" uuid not null, constraint "set_up_pkey" primary key ("id"));`);

    this.addSql(`create table "session" ("id" uuid not null, "practice_id" uuid not null, "user_id" uuid not null, "device" text not null, "created_at" timestamptz(3) not null, "last_seen_at" timestamptz(3) not null, "expires_at" timestamptz(3) not null, "revoked_at" timestamptz(3) null, constraint "session_pkey" primary key ("id"));`);

    this.addSql(`create table "athlete" ("id" uuid not null, "practice_id" uuid not null, "coach_id" uuid not null, "given_name" text not null, "family_name" text not null, "birth_date" date not null, "height_mm" double precision null, "sport" text not null default '', "cautions" text not null default '', "contact_email" text null, "created_at" timestamptz(3) not null, "version" int not null default 1, constraint "athlete_pkey" primary key ("id"));`);
    this.addSql(`create index "athlete_practice_id_family_name_given_name_index" on "athlete" ("practice_id", "family_name", "given_name");`);

    this.addSql(`create table "consent" ("id" uuid not null, "practice_id" uuid not null, "athlete_id" uuid not null, "given_by" text check ("given_by" in ('athlete', 'guardian')) not null, "guardian_name" text null, "guardian_relation" text null, "assent" boolean not null, "purposes" text[] not null, "valid_from" date not null, "valid_until" date not null, "how" text not null, "recorded_by_id" uuid not null, "recorded_at" timestamptz(3) not null, "withdrawn_at" timestamptz(3) null, "withdrawn_by_id" uuid null, constraint "consent_pkey" primary key ("id"));`);

    this.addSql(`create table "visit" ("id" uuid not null, "practice_id" uuid not null, "athlete_id" uuid not null, "coach_id" uuid not null, "day" date not null, "note" text not null, "safety" jsonb null, "filming" jsonb not null, "set_up_name" text null, "created_at" timestamptz(3) not null, "version" int not null default 1, constraint "visit_pkey" primary key ("id"));`);

    this.addSql(`create table "upload" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "name" text not null, "bytes" bigint not null, "received" bigint not null default 0, "view" text check ("view" in ('front', 'back', 'lifted-side', 'support-side')) not null, "support_side" text check ("support_side" in ('left', 'right')) null, "mirrored" boolean not null, "opened_by_id" uuid not null, "opened_at" timestamptz(3) not null, "last_byte_at" timestamptz(3) not null, constraint "upload_pkey" primary key ("id"));`);

    this.addSql(`create table "reading" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "engine" int not null, "input_hash" text not null, "seed" bigint not null, "inputs" jsonb not null, "result" jsonb not null, "code" text check ("code" in ('early-turn-out', 'expected-turn-in', 'holds-still', 'cannot-tell', 'lift-stops-short', 'not-measurable')) not null, "before60" boolean not null, "change" double precision null, "u" double precision null, "p_early" double precision null, "smallest_found" double precision null, "provisional" boolean not null, "assumption" boolean not null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "reading_pkey" primary key ("id"));`);
    this.addSql(`alter table "reading" add constraint "reading_visit_id_side_input_hash_unique" unique ("visit_id", "side", "input_hash");`);

    this.addSql(`create table "side_setting" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "assumption" boolean not null default false, "figures_shown_at" timestamptz(3) null, "reading_id" uuid null, constraint "side_setting_pkey" primary key ("id"));`);
    this.addSql(`alter table "side_setting" add constraint "side_setting_visit_id_side_unique" unique ("visit_id", "side");`);

    this.addSql(`create table "clip" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "name" text not null, "state" text check ("state" in ('waiting', 'preparing', 'ready', 'refused')) not null, "refusal_code" text null, "refusal_figures" jsonb null, "view" text check ("view" in ('front', 'back', 'lifted-side', 'support-side')) not null, "camera_stood" text check ("camera_stood" in ('front', 'back', 'athlete-left', 'athlete-right')) not null, "support_side" text check ("support_side" in ('left', 'right')) null, "mirrored" boolean not null, "bytes" bigint not null, "files" jsonb not null, "width" int null, "height" int null, "duration_seconds" double precision null, "frame_rate" jsonb null, "frame_count" int null, "frames" jsonb null, "facts" jsonb null, "copies" jsonb null, "origin" jsonb null, "part" jsonb null, "accept_remains" boolean not null default false, "geometry" jsonb not null, "progress" double precision null, "seconds_left" double precision null, "uploaded_by_id" uuid not null, "uploaded_at" timestamptz(3) not null, "version" int not null default 1, constraint "clip_pkey" primary key ("id"));`);
    this.addSql(`create index "clip_practice_id_uploaded_at_index" on "clip" ("practice_id", "uploaded_at");`);

    this.addSql(`create table "rep" ("id" uuid not null, "practice_id" uuid not null, "clip_id" uuid not null, "support_side" text check ("support_side" in ('left', 'right')) not null, "start_frame" int not null, "end_frame" int not null, "hand_boundaries" jsonb not null, "excluded" text check ("excluded" in ('touched-support', 'hopped', 'foot-pivoted', 'lost-balance', 'pain', 'another-drill', 'other')) null, "excluded_note" text not null default '', "created_by_id" uuid not null, "created_at" timestamptz(3) not null, "version" int not null default 1, constraint "rep_pkey" primary key ("id"));`);

    this.addSql(`create table "replay" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "rep_id" uuid not null, "from_frame" int not null, "to_frame" int not null, "show_reading" boolean not null, "show_call" boolean not null, "message" text not null, "token_hash" text not null, "pass_phrase_hash" text null, "expires_at" timestamptz(3) not null, "revoked_at" timestamptz(3) null, "openings" int not null default 0, "last_opened_at" timestamptz(3) null, "by_id" uuid not null, "at" timestamptz(3) not null, constraint "replay_pkey" primary key ("id"));`);
    this.addSql(`alter table "replay" add constraint "replay_token_hash_unique" unique ("token_hash");`);

    this.addSql(`create table "comment" ("id" uuid not null, "practice_id" uuid not null, "clip_id" uuid not null, "answer_to" uuid null, "body" text not null, "from_frame" int not null, "to_frame" int not null, "shape" jsonb null, "shared" boolean not null, "by_id" uuid not null, "at" timestamptz(3) not null, "edited_at" timestamptz(3) null, "resolved_by_id" uuid null, "resolved_at" timestamptz(3) null, constraint "comment_pkey" primary key ("id"));`);

    this.addSql(`create table "call" ("id" uuid not null, "practice_id" uuid not null, "visit_id" uuid not null, "side" text check ("side" in ('left', 'right')) not null, "seen" text check ("seen" in ('early', 'on-time', 'still', 'unsure')) not null, "substitutions" text[] not null, "confidence" text check ("confidence" in ('guess', 'fairly-sure', 'sure')) not null, "hands_felt" text not null, "by_id" uuid not null, "at" timestamptz(3) not null, "before_figures" boolean not null, constraint "call_pkey" primary key ("id"));`);
  }

}
