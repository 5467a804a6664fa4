-- Years of loads, made by SQL, in every darkroom of the database: loads_each loads of three steps each, through bottles
-- that are long discarded. Shapes, keys and spread are as the program writes them; only the foreign keys are not asked
-- again for each row (session_replication_role). Run as superuser: psql -v loads_each=52 -f history.sql
\set ON_ERROR_STOP on
set session_replication_role = replica;
set synchronous_commit = off;
set maintenance_work_mem = '512MB';

-- A load in a hundred or so per bottle, as a litre of fixer takes.
\set loads_per_bottle 24

-- Version 7 in shape: rising with the number, so that new rows come at the right end of an index, as they do in use.
create function pg_temp.id(kind int, darkroom int, n int) returns uuid language sql immutable parallel safe as $$
  select (lpad(to_hex(1600000000000 + n::bigint * 1000), 12, '0') || '7' || lpad(to_hex(kind), 3, '0') || '8'
    || lpad(to_hex(darkroom), 3, '0') || substr(md5(n::text || ' ' || darkroom || ' ' || kind), 1, 12))::uuid
$$;

create temp table rooms as
  select row_number() over (order by b.darkroom_id)::int as k, b.darkroom_id, a.membership_id,
    array_agg(b.chemistry_version_id order by b.code) as versions,
    (array_agg(t.totals order by b.code))[1] as totals
  from bottles b
  join bottle_totals t on t.darkroom_id = b.darkroom_id and t.bottle_id = b.id
  join actions a on a.darkroom_id = b.darkroom_id and a.id = b.made_by_action_id
  where t.in_use
  group by b.darkroom_id, a.membership_id;
analyze rooms;

-- Three old bottles for every so many loads, each with the action that made it.
create temp table old as
  select r.k, r.darkroom_id, r.membership_id, g.n, s.s,
    pg_temp.id(s.s, r.k, g.n) as id, pg_temp.id(8 + s.s, r.k, g.n) as action_id, r.versions[s.s] as version,
    jsonb_set(r.totals, '{discardedAt}', '"2025-01-01T00:00:00.000Z"') as totals
  from rooms r
  cross join generate_series(0, (:loads_each - 1) / :loads_per_bottle) g(n)
  cross join generate_series(1, 3) s(s);
analyze old;

insert into actions (darkroom_id, id, kind, v, happened_at, happened_on, recorded_at, membership_id, request_hash, queued)
  select darkroom_id, action_id, 'mix', 1, at, at::date, at, membership_id, repeat('0', 64), false
  from (select o.*, timestamptz '2010-01-01 00:00Z' + n * interval '1 day' as at from old o) x
  order by darkroom_id, n;
insert into bottles (darkroom_id, id, code, chemistry_version_id, material, made_by_action_id)
  select darkroom_id, id, (array['FX', 'SB', 'WA'])[s] || '-' || (100 + n), version, 'film', action_id
  from old order by darkroom_id, n, s;
insert into bottle_totals (darkroom_id, bottle_id, totals, in_use, volume_ul, next_look_at)
  select darkroom_id, id, totals, false, 0, null from old order by darkroom_id, n, s;

create temp table told as
  select r.k, r.darkroom_id, r.membership_id, g.n, pg_temp.id(16, r.k, g.n) as id,
    timestamptz '2010-01-02 00:00Z' + g.n * (interval '5500 days' / :loads_each) as at
  from rooms r cross join generate_series(0, :loads_each - 1) g(n);
analyze told;

insert into actions (darkroom_id, id, kind, v, happened_at, happened_on, recorded_at, membership_id, request_hash, queued)
  select darkroom_id, id, 'load', 1, at, at::date, at, membership_id, md5(id::text) || md5(id::text), false
  from told order by darkroom_id, n;
insert into loads (darkroom_id, action_id, flags) select darkroom_id, id, '{}' from told order by darkroom_id, n;
insert into load_film (darkroom_id, action_id, ordinal, format, count, film_class, owner_membership_id)
  select darkroom_id, id, 0, '135-36', 1, 'conventional', membership_id from told order by darkroom_id, n;
-- Built anew afterwards: many times faster than row by row, and the same in the end.
alter table load_steps drop constraint load_steps_pk;
drop index load_steps_by_bottle;
insert into load_steps
    (darkroom_id, action_id, bottle_id, material, nominal_e4, factor_e4, counted_e4, taken_ul, flags)
  select t.darkroom_id, t.id, pg_temp.id(s.s, t.k, t.n / :loads_per_bottle), 'film', 10000, 10000, 10000, 0, '{}'
  from told t cross join generate_series(1, 3) s(s)
  order by t.darkroom_id, t.n, s.s;
alter table load_steps add constraint load_steps_pk primary key (darkroom_id, action_id, bottle_id);
create index load_steps_by_bottle on load_steps (darkroom_id, bottle_id, action_id);

reset session_replication_role;
-- Each step's bottle and load are there: what the foreign keys would have asked.
do $$ begin
  if exists (select from load_steps s where not exists
      (select from bottles b where b.darkroom_id = s.darkroom_id and b.id = s.bottle_id)) then
    raise exception 'a step without its bottle';
  end if;
end $$;
vacuum (analyze);
checkpoint;
select count(*) from load_steps;
