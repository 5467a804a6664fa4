import { isDeepStrictEqual } from 'node:util';
import {
  fold,
  LedgerOrderError,
  type BottleFact,
  type BottleTotals,
  type ChemistryDocument,
} from '@wetside/chemistry';
import { bottles, bottleTotals, chemistryVersions } from '@wetside/db';
import { and, asc, eq } from 'drizzle-orm';
import { BottleFactsRepository } from '../../features/bottles/bottle-facts.repository.js';
import { nextLook } from '../../features/bottles/bottle-ledger.js';
import type { Tx } from '../../platform/database/database.js';
import type { House } from '../../platform/house/house.repository.js';
import { show, type Found } from './found.js';

const AT_ONCE = 200;

interface Stored {
  id: string;
  code: string;
  document: ChemistryDocument;
  totals: BottleTotals | null;
  /** Null when the bottle has no row of totals at all. */
  inUse: boolean | null;
  volumeUl: number | null;
  nextLookAt: Date | null;
}

/** Folds every bottle of the darkroom anew and says where its stored totals differ. */
export async function checkBottles(tx: Tx, house: House, now: Date): Promise<Found> {
  const stored = await storedBottles(tx, house.darkroomId);
  const repository = new BottleFactsRepository();
  const differences: string[] = [];
  for (let at = 0; at < stored.length; at += AT_ONCE) {
    const some = stored.slice(at, at + AT_ONCE);
    const ids = some.map(({ id }) => id);
    const facts = await repository.standing(tx, house.darkroomId, ids);
    for (const bottle of some) {
      const found = differencesOf(bottle, facts.get(bottle.id) ?? [], house, now);
      differences.push(...found.map((what) => `${house.shortName}, ${bottle.code}: ${what}.`));
    }
  }
  return { checked: stored.length, differences };
}

async function storedBottles(tx: Tx, darkroomId: string): Promise<Stored[]> {
  return tx
    .select({
      id: bottles.id,
      code: bottles.code,
      document: chemistryVersions.document,
      totals: bottleTotals.totals,
      inUse: bottleTotals.inUse,
      volumeUl: bottleTotals.volumeUl,
      nextLookAt: bottleTotals.nextLookAt,
    })
    .from(bottles)
    .innerJoin(
      chemistryVersions,
      and(
        eq(chemistryVersions.darkroomId, bottles.darkroomId),
        eq(chemistryVersions.id, bottles.chemistryVersionId),
      ),
    )
    .leftJoin(
      bottleTotals,
      and(eq(bottleTotals.darkroomId, bottles.darkroomId), eq(bottleTotals.bottleId, bottles.id)),
    )
    .where(eq(bottles.darkroomId, darkroomId))
    .orderBy(asc(bottles.code));
}

function differencesOf(bottle: Stored, facts: readonly BottleFact[], house: House, now: Date): string[] {
  if (bottle.inUse === null) return ['it has no totals'];
  let folded: BottleTotals | null;
  try {
    folded = fold(bottle.document, facts);
  } catch (error) {
    if (error instanceof LedgerOrderError) return [`it cannot be folded: ${error.message}`];
    throw error;
  }
  return [
    ...totalsDifferences(bottle.totals, folded),
    ...sides('in use', bottle.inUse, folded !== null && folded.discardedAt === null),
    ...sides('the volume column', bottle.volumeUl, folded?.volumeUl ?? 0),
    ...lookDifferences(bottle, folded, house, now),
  ];
}

const sides = (what: string, stored: unknown, folded: unknown): string[] =>
  isDeepStrictEqual(stored, folded)
    ? []
    : [`${what} is stored as ${show(stored)} and folded as ${show(folded)}`];

function totalsDifferences(stored: BottleTotals | null, folded: BottleTotals | null): string[] {
  // What a document in the database cannot hold (a field that is undefined) is no difference.
  const [left, right] = [plain(stored), plain(folded)];
  if (!left || !right) return sides('its totals', left, right);
  const fields = [...new Set([...Object.keys(left), ...Object.keys(right)])].sort();
  return fields.flatMap((field) => sides(field, left[field], right[field]));
}

const plain = (totals: BottleTotals | null) =>
  JSON.parse(JSON.stringify(totals)) as Record<string, unknown> | null;

/**
 * The hint for the sweep. A moment that has gone by is the sweep's to mend; one still to come must be the moment at which
 * time alone changes what is said of the bottle, looked at now.
 */
function lookDifferences(bottle: Stored, folded: BottleTotals | null, house: House, now: Date): string[] {
  if (bottle.nextLookAt && bottle.nextLookAt <= now) return [];
  const expected = folded && nextLook(bottle.document, folded, house, now);
  return sides(
    'the next look',
    bottle.nextLookAt?.toISOString() ?? null,
    expected && new Date(expected).toISOString(),
  );
}
