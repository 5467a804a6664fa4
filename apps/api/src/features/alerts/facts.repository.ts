import { Injectable } from '@nestjs/common';
import { sql, type SQL } from 'drizzle-orm';
import type { Tx } from '../../platform/database/database.js';
import { ActionsRepository } from '../../platform/ledger/actions.repository.js';
import { withHolders } from '../../platform/ledger/holders.js';
import type { Touched } from '../../platform/ledger/void-handlers.js';
import { ChemistryDocuments } from '../chemistries/chemistry-documents.js';
import type { AlertFacts, BottleFacts } from './alert-facts.js';

/** One array, however many there are: the statement stays the same, and its plan is kept. */
const anyOf = (ids: readonly string[]): SQL => sql`any(${sql.param([...ids])}::uuid[])`;

/** What is not asked for is not looked for. */
const orNone = (ids: readonly string[], query: (ids: SQL) => SQL): SQL =>
  ids.length === 0 ? sql`'[]'::json` : sql`coalesce((${query(anyOf(ids))}), '[]'::json)`;

const bottlesOf =
  (darkroomId: string) =>
  (ids: SQL): SQL => sql`
  select json_agg(json_build_object(
    'id', b.id, 'code', b.code, 'chemistryVersionId', b.chemistry_version_id, 'totals', t.totals))
  from bottles b
  join bottle_totals t on t.darkroom_id = b.darkroom_id and t.bottle_id = b.id
  where b.darkroom_id = ${darkroomId} and b.id = ${ids}`;

const packsOf =
  (darkroomId: string) =>
  (ids: SQL): SQL => sql`
  select json_agg(json_build_object(
    'id', p.id, 'name', p.name,
    'reorderPoint', case when p.archived_at is null then p.reorder_point end,
    'unopened', (select coalesce(sum(l.unopened), 0) from lots l
      where l.darkroom_id = p.darkroom_id and l.pack_id = p.id),
    'onOrder', (select coalesce(sum(greatest(o.count - o.received - o.cancelled, 0)), 0)
      from supplier_packs s
      join order_lines o on o.darkroom_id = s.darkroom_id and o.supplier_pack_id = s.id
      join orders r on r.darkroom_id = o.darkroom_id and r.id = o.order_id and r.state = 'sent'
      where s.darkroom_id = p.darkroom_id and s.pack_id = p.id)))
  from packs p
  where p.darkroom_id = ${darkroomId} and p.id = ${ids}`;

const loadsOf =
  (darkroomId: string) =>
  (ids: SQL): SQL => sql`
  select json_agg(json_build_object(
    'id', a.id, 'by', m.display_name, 'happenedOn', a.happened_on,
    'voided', exists (select from voids w where w.darkroom_id = a.darkroom_id and w.voided_action_id = a.id),
    'decided', exists (select from decisions d
      where d.darkroom_id = a.darkroom_id and d.load_action_id = a.id and not exists (select from voids w
        where w.darkroom_id = d.darkroom_id and w.voided_action_id = d.action_id)),
    'steps', (select coalesce(json_agg(json_build_object('code', b.code, 'flags', s.flags) order by b.code), '[]')
      from load_steps s join bottles b on b.darkroom_id = s.darkroom_id and b.id = s.bottle_id
      where s.darkroom_id = a.darkroom_id and s.action_id = a.id),
    'film', (select coalesce(json_agg(json_build_object(
        'format', f.format, 'count', f.count, 'widthMm', f.width_mm, 'heightMm', f.height_mm) order by f.ordinal), '[]')
      from load_film f where f.darkroom_id = a.darkroom_id and f.action_id = a.id)))
  from actions a
  join memberships m on m.darkroom_id = a.darkroom_id and m.id = a.membership_id
  where a.darkroom_id = ${darkroomId} and a.kind = 'load' and a.id = ${ids}`;

const eventsOf =
  (darkroomId: string) =>
  (ids: SQL): SQL => sql`
  select json_agg(e) from (
    select distinct on (subject_id, kind)
      id, kind, subject_id as "subjectId", crossing, ended_by as "endedBy"
    from events where darkroom_id = ${darkroomId} and subject_id = ${ids}
    order by subject_id, kind, crossing desc) e`;

type FoundBottle = Omit<BottleFacts, 'document' | 'holdBy'> & { chemistryVersionId: string };
type FoundFacts = Omit<AlertFacts, 'bottles'> & { bottles: FoundBottle[] };

@Injectable()
export class FactsRepository {
  constructor(
    private readonly documents: ChemistryDocuments,
    private readonly actions: ActionsRepository,
  ) {}

  /** Everything that warnings about these subjects are judged by, in one statement. Unknown ids are left out. */
  async read(
    tx: Tx,
    darkroomId: string,
    { bottleIds, packIds, loadActionIds }: Touched,
  ): Promise<AlertFacts> {
    const all = [...bottleIds, ...packIds, ...loadActionIds];
    const [row] = await tx.execute<Record<string, unknown> & FoundFacts>(sql`select
      ${orNone(bottleIds, bottlesOf(darkroomId))} as bottles,
      ${orNone(packIds, packsOf(darkroomId))} as packs,
      ${orNone(loadActionIds, loadsOf(darkroomId))} as loads,
      ${orNone(all, eventsOf(darkroomId))} as events`);
    if (!row) throw new Error('A select without a from gave no row.');
    const named = await withHolders(this.actions, tx, darkroomId, row.bottles);
    return { ...row, bottles: await this.documents.with(tx, darkroomId, named) };
  }
}
