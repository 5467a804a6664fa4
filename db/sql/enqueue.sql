-- The one door to the queue for the application's login. Owned by wetside_jobs; takes a delay, never an instant.
create or replace function graphile_worker.enqueue(task text, payload json, delay interval default '0') returns void
  language sql security definer set search_path = pg_catalog, pg_temp
  as $$ select graphile_worker.add_job(task, payload, run_at := now() + delay) $$;
revoke all on function graphile_worker.enqueue(text, json, interval) from public;
grant usage on schema graphile_worker to wetside_app;
grant execute on function graphile_worker.enqueue(text, json, interval) to wetside_app;
