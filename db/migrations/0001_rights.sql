-- What drizzle-kit does not write: forced row security, and what the application's login may do.
-- Things that happened may be read and added to, nothing else; only running totals and states may be changed.
do $$
declare t text;
begin
  for t in
    select c.oid::regclass::text from pg_class c
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    join pg_attribute a on a.attrelid = c.oid and a.attname = 'darkroom_id' and not a.attisdropped
    where c.relkind = 'r'
  loop
    execute format('alter table %s enable row level security', t);
    execute format('alter table %s force row level security', t);
    execute format('grant select, insert on %s to wetside_app', t);
  end loop;
end $$;
--> statement-breakpoint
grant update on bottle_totals, lots, opened_packs, counters, orders, order_lines, events, mails, placements to wetside_app;
--> statement-breakpoint
grant update on memberships, darkroom_settings, chemistries, packs, suppliers, supplier_packs to wetside_app;
--> statement-breakpoint
grant usage on schema identity to wetside_app;
--> statement-breakpoint
grant select, insert, update on identity.darkrooms, identity.people, identity.credentials, identity.sessions, identity.refresh_tokens, identity.one_time_codes to wetside_app;
--> statement-breakpoint
grant select, insert, update, delete on identity.rate_counters to wetside_app;
