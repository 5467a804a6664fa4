-- Run as superuser once the queue's own migration has run.
do $$ begin
  execute format('revoke create on database %I from wetside_jobs', current_database());
end $$;
