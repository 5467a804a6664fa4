-- Run as superuser, connected to a database that wetside_owner owns. Safe to repeat.
-- wetside_jobs may create its schema here only until its own migration has run: revoked by jobs-done.sql.
do $$ begin
  execute format('revoke all on database %I from public', current_database());
  execute format('grant connect, temporary on database %I to wetside_admin, wetside_jobs, wetside_app', current_database());
  execute format('grant create on database %I to wetside_jobs', current_database());
end $$;
alter schema public owner to wetside_owner;
revoke create on schema public from public;
grant usage on schema public to wetside_app;
