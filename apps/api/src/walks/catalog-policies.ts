import type { Catalog } from './catalog-keys.js';

/** What a policy must say, as PostgreSQL writes it back. */
const OWN_DARKROOM = "(darkroom_id = (NULLIF(current_setting('app.darkroom'::text, true), ''::text))::uuid)";
const OWN_PERSON = "(person_id = (NULLIF(current_setting('app.person'::text, true), ''::text))::uuid)";
/** Where a table shows more than its darkroom's rows, and to whom. */
const SECOND_POLICIES: Readonly<Record<string, string>> = { memberships_own_person: OWN_PERSON };

interface TableRow {
  name: string;
  owner: string;
  belongs: boolean;
  enabled: boolean;
  forced: boolean;
}
interface PolicyRow {
  tableName: string;
  name: string;
  command: string;
  permissive: boolean;
  everybody: boolean;
  using: string | null;
  check: string | null;
}

/** Every table of the program's schema belongs to darkrooms, forces row security, and is the owner's. */
export async function tableComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<TableRow[]>`
    select c.relname as name, pg_get_userbyid(c.relowner) as owner, a.attnotnull is true as belongs,
      c.relrowsecurity as enabled, c.relforcerowsecurity as forced
    from pg_class c
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    left join pg_attribute a on a.attrelid = c.oid and a.attname = 'darkroom_id' and not a.attisdropped
    where c.relkind in ('r', 'p') order by 1`;
  if (rows.length === 0) return ['There are no tables.'];
  return rows.flatMap(({ name, owner, belongs, enabled, forced }) => [
    ...(belongs ? [] : [`Table ${name} has no darkroom_id that is always there.`]),
    ...(enabled && forced ? [] : [`Table ${name} does not force row security.`]),
    ...(owner === 'wetside_owner' ? [] : [`Table ${name} belongs to ${owner}.`]),
  ]);
}

/** Each table has the one policy for everything, and none beside it that shows more. */
export async function policyComplaints(root: Catalog): Promise<string[]> {
  const tables = await root<{ name: string }[]>`
    select c.relname as name from pg_class c
    join pg_namespace n on n.oid = c.relnamespace and n.nspname = 'public'
    where c.relkind in ('r', 'p') order by 1`;
  const policies = await root<PolicyRow[]>`
    select c.relname as "tableName", p.polname as name, p.polcmd as command, p.polpermissive as permissive,
      p.polroles = array[0::oid] as everybody,
      pg_get_expr(p.polqual, p.polrelid) as using, pg_get_expr(p.polwithcheck, p.polrelid) as check
    from pg_policy p join pg_class c on c.oid = p.polrelid order by 1, 2`;
  return [
    ...tables.flatMap(({ name }) =>
      policies.some((policy) => policy.tableName === name && holdsToDarkroom(policy))
        ? []
        : [`Table ${name} has no policy that holds it to its darkroom.`],
    ),
    ...policies.flatMap((policy) =>
      holdsToDarkroom(policy) || isSecond(policy) || !policy.permissive
        ? []
        : [`Policy ${policy.name} of ${policy.tableName} opens more than its darkroom.`],
    ),
  ];
}

function holdsToDarkroom({ command, permissive, everybody, using, check }: PolicyRow): boolean {
  return command === '*' && permissive && everybody && using === OWN_DARKROOM && check === OWN_DARKROOM;
}

function isSecond({ name, command, using }: PolicyRow): boolean {
  return command === 'r' && using !== null && SECOND_POLICIES[name] === using;
}

/** A view reads with its owner's eyes and a definer's function acts with its owner's hands: both pass row security by. */
export async function backDoorComplaints(root: Catalog): Promise<string[]> {
  const rows = await root<{ complaint: string }[]>`
    select format('View %s shows rows past row security.', c.relname) as complaint
    from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where c.relkind in ('v', 'm') and n.nspname in ('public', 'identity')
      and not coalesce(c.reloptions @> array['security_invoker=true'], false)
    union all
    select format('Function %s acts with its owner''s rights.', p.proname)
    from pg_proc p join pg_namespace n on n.oid = p.pronamespace
    where p.prosecdef and n.nspname in ('public', 'identity') order by 1`;
  return rows.map(({ complaint }) => complaint);
}
