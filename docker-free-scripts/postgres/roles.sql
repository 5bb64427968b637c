-- The three roles that Redshank signs in with, made or brought back to this shape at each start.
-- Read by psql after \set owner_password, app_password and jobs_password.
-- The superuser bypasses row-level security, so nothing of the product ever signs in as redshank_admin.

set log_statement = 'none';
set log_min_error_statement = 'panic';

select format('create role %I', name)
from (values ('redshank_owner'), ('redshank_app'), ('redshank_jobs')) as wanted(name)
where not exists (select from pg_roles where rolname = name)
\gexec

-- owns the schema and migrates it
alter role redshank_owner with login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password :'owner_password';
-- serves requests: owns nothing, row-level security holds for it
alter role redshank_app with login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password :'app_password';
-- owns the queue's schema
alter role redshank_jobs with login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password :'jobs_password';
