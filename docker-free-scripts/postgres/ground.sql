-- What a new database needs before the migrations: who owns which schema. Plain SQL; may run again.

set client_min_messages = warning;

do $$
begin
  execute format('revoke all on database %I from public', current_database());
  execute format('grant connect, temporary on database %I to redshank_app, redshank_jobs', current_database());
  -- The queue says 'create schema if not exists', for which PostgreSQL wants this right even where the schema exists.
  execute format('grant create on database %I to redshank_jobs', current_database());
end
$$;

alter schema public owner to redshank_owner;
revoke all on schema public from public;
grant usage on schema public to redshank_app, redshank_jobs;

create schema if not exists pgboss authorization redshank_jobs;
