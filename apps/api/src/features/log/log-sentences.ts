import type { ActionKind } from '@wetside/db';
import type { Tx } from '../../platform/database/database.js';
import type { LogRepository } from './log.repository.js';
import { classWord, filmWords, inTheOrderOfALine, volumeWords } from './log-words.js';

/** What the log says of one action. */
export interface Said {
  sentence: string;
  codes: string[];
  flags: string[];
  voidsActionId?: string;
}

type Describe = (tx: Tx, darkroomId: string, ids: string[]) => Promise<Map<string, Said>>;

const said = (sentence: string, codes: string[] = [], flags: string[] = []): Said => ({
  sentence,
  codes,
  flags,
});
const byAction = <T extends { actionId: string }>(rows: T[], tell: (row: T) => Said): Map<string, Said> =>
  new Map(rows.map((row) => [row.actionId, tell(row)]));

/** How each kind of action is told; a kind without a teller does not compile. */
function tellers(repository: LogRepository): Record<ActionKind, Describe> {
  const holds: Describe = async (tx, darkroomId, ids) =>
    byAction(await repository.holds(tx, darkroomId, ids), (row) =>
      said(row.change === 'hold' ? `put on hold: ${row.reason}` : `released: ${row.reason}`, [row.code]),
    );
  const orders: Describe = async (tx, darkroomId, ids) =>
    byAction(await repository.orderChanges(tx, darkroomId, ids), (row) => said(orderWords(row)));
  return {
    mix: async (tx, darkroomId, ids) =>
      byAction(await repository.mixes(tx, darkroomId, ids), (row) =>
        said(`mixed ${volumeWords(row.volumeUl)} of ${row.name}`, [row.code]),
      ),
    load: (tx, darkroomId, ids) => tellLoads(repository, tx, darkroomId, ids),
    hold: holds,
    release: holds,
    discard: async (tx, darkroomId, ids) =>
      byAction(await repository.discards(tx, darkroomId, ids), (row) => said('discarded', [row.code])),
    receipt: (tx, darkroomId, ids) => tellReceipts(repository, tx, darkroomId, ids),
    decision: async (tx, darkroomId, ids) =>
      byAction(await repository.decisions(tx, darkroomId, ids), (row) =>
        said(`accepted a reported load: ${row.reason}`),
      ),
    'setting-change': async (tx, darkroomId, ids) =>
      byAction(await repository.settingChanges(tx, darkroomId, ids), (row) =>
        said(
          `changed ${settingWords[row.field] ?? row.field} from ${row.oldValue ?? 'nothing'} to ${row.newValue ?? 'nothing'}`,
        ),
      ),
    'order-draft': orders,
    'order-send': orders,
    'order-cancel': orders,
    void: (tx, darkroomId, ids) => tellVoids(repository, tx, darkroomId, ids),
  };
}

/** What is said of these actions, kind by kind. */
export async function tellAll(
  repository: LogRepository,
  tx: Tx,
  darkroomId: string,
  listed: readonly { id: string; kind: ActionKind }[],
): Promise<Map<string, Said>> {
  const told = new Map<string, Said>();
  const by = tellers(repository);
  for (const kind of new Set(listed.map((one) => one.kind))) {
    const ids = listed.filter((one) => one.kind === kind).map((one) => one.id);
    for (const [id, one] of await by[kind](tx, darkroomId, ids)) told.set(id, one);
  }
  return told;
}

/** A void says what it took back; what it took back is never a void. */
async function tellVoids(
  repository: LogRepository,
  tx: Tx,
  darkroomId: string,
  ids: string[],
): Promise<Map<string, Said>> {
  const rows = await repository.voids(tx, darkroomId, ids);
  const targets = rows.map(({ voidedActionId: id, voidedKind: kind }) => ({ id, kind }));
  const told = await tellAll(repository, tx, darkroomId, targets);
  return byAction(rows, ({ voidedActionId, reason }) => {
    const target = told.get(voidedActionId);
    const what = target ? `took back: ${target.sentence}` : 'took it back';
    return { ...said(reason ? `${what} (${reason})` : what, target?.codes), voidsActionId: voidedActionId };
  });
}

const settingWords: Record<string, string> = { outUntil: '“out until”' };

function orderWords(row: {
  change: string;
  number: number;
  supplier: string;
  reason: string | null;
}): string {
  const number = String(row.number).padStart(4, '0');
  const reason = row.reason ? `: ${row.reason}` : '';
  if (row.change === 'drafted') return `drafted order ${number} for ${row.supplier}`;
  if (row.change === 'sent') return `sent order ${number} to ${row.supplier}`;
  return `cancelled order ${number} to ${row.supplier}${reason}`;
}

async function tellLoads(
  repository: LogRepository,
  tx: Tx,
  darkroomId: string,
  ids: string[],
): Promise<Map<string, Said>> {
  const film = await repository.film(tx, darkroomId, ids);
  const steps = await repository.steps(tx, darkroomId, ids);
  const told = new Map<string, Said>();
  for (const row of film) {
    const words = `${filmWords(row)}, ${classWord(row.filmClass)}`;
    const before = told.get(row.actionId);
    if (before) before.sentence += `; ${words}`;
    else told.set(row.actionId, said(words, [], [...row.flags]));
  }
  for (const step of steps) {
    const load = told.get(step.actionId);
    if (!load) continue;
    load.codes.push(step.code);
    load.codes.sort(inTheOrderOfALine);
    for (const flag of step.flags) if (!load.flags.includes(flag)) load.flags.push(flag);
  }
  return told;
}

async function tellReceipts(
  repository: LogRepository,
  tx: Tx,
  darkroomId: string,
  ids: string[],
): Promise<Map<string, Said>> {
  const told = new Map<string, Said>();
  for (const row of await repository.deliveries(tx, darkroomId, ids)) {
    const words = `${row.count} × ${row.pack}, lot ${row.lotNumber}`;
    const before = told.get(row.actionId);
    if (before) before.sentence += `; ${words}`;
    else told.set(row.actionId, said(`received ${words}`));
  }
  return told;
}
