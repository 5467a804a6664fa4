import { Injectable } from '@nestjs/common';
import {
  apply,
  assess,
  fold,
  isNewest,
  localDate,
  type BottleFact,
  type BottleTotals,
  type ChemistryDocument,
} from '@wetside/chemistry';
import type { Tx } from '../../platform/database/database.js';
import { problem } from '../../platform/errors/problem.js';
import { HouseRepository, type House } from '../../platform/house/house.repository.js';
import { BottleFactsRepository } from './bottle-facts.repository.js';
import type { LockedBottle } from './bottle-row.js';
import { BottlesRepository, type TotalsRow } from './bottles.repository.js';

/** One more fact for one bottle that is locked. */
export interface Step {
  bottle: LockedBottle;
  fact: BottleFact;
}

/** The one place where a bottle's running totals move. */
@Injectable()
export class BottleLedger {
  constructor(
    private readonly bottles: BottlesRepository,
    private readonly facts: BottleFactsRepository,
    private readonly houses: HouseRepository,
  ) {}

  /**
   * Locks these bottles, first of all locks in a transaction.
   * @throws Problem 'not-found' when one of them is not in this darkroom
   */
  async lock(tx: Tx, darkroomId: string, ids: readonly string[]): Promise<LockedBottle[]> {
    const unique = [...new Set(ids)];
    // The rules of the house are asked for on the way: whatever moves the totals judges by them.
    const [locked] = await Promise.all([
      this.bottles.lock(tx, darkroomId, unique),
      this.houses.read(tx, darkroomId),
    ]);
    if (locked.length !== unique.length) throw problem('not-found');
    return locked;
  }

  /** How the bottle stood before that fact, also when later ones are known by now. Ask before the fact is written. */
  async before(tx: Tx, darkroomId: string, { bottle, fact }: Step): Promise<BottleTotals | null> {
    if (isNewest(bottle.totals, fact)) return bottle.totals;
    const known = await this.facts.standing(tx, darkroomId, [bottle.id]);
    const earlier = (known.get(bottle.id) ?? []).filter((one) => one.happenedAt <= fact.happenedAt);
    return fold(bottle.document, earlier);
  }

  /** Opens the totals of a new bottle. */
  async open(
    tx: Tx,
    darkroomId: string,
    now: Date,
    bottle: { id: string; document: ChemistryDocument; fact: BottleFact },
  ): Promise<void> {
    const house = await this.houses.read(tx, darkroomId);
    const totals = apply(bottle.document, null, bottle.fact);
    await this.bottles.insertTotals(tx, darkroomId, {
      bottleId: bottle.id,
      totals,
      nextLookAt: nextLook(bottle.document, totals, house, now),
    });
  }

  /** Counts facts whose details are written: by `apply` where each is its bottle's newest, by folding anew where it is not. */
  async advance(tx: Tx, darkroomId: string, now: Date, steps: readonly Step[]): Promise<void> {
    const stale = steps
      .filter(({ bottle, fact }) => !isNewest(bottle.totals, fact))
      .map(({ bottle }) => bottle.id);
    const known =
      stale.length > 0 ? await this.facts.standing(tx, darkroomId, stale) : new Map<string, BottleFact[]>();
    await this.write(
      tx,
      darkroomId,
      now,
      steps.map(({ bottle, fact }) => {
        const history = known.get(bottle.id);
        return {
          bottle,
          totals: history ? fold(bottle.document, history) : apply(bottle.document, bottle.totals, fact),
        };
      }),
    );
  }

  /** Folds these locked bottles anew, as after a void. */
  async refold(tx: Tx, darkroomId: string, now: Date, locked: readonly LockedBottle[]): Promise<void> {
    if (locked.length === 0) return;
    const known = await this.facts.standing(
      tx,
      darkroomId,
      locked.map((bottle) => bottle.id),
    );
    await this.write(
      tx,
      darkroomId,
      now,
      locked.map((bottle) => ({
        bottle,
        totals: fold(bottle.document, known.get(bottle.id) ?? []),
      })),
    );
  }

  private async write(
    tx: Tx,
    darkroomId: string,
    now: Date,
    moved: readonly { bottle: LockedBottle; totals: BottleTotals | null }[],
  ): Promise<void> {
    const house = await this.houses.read(tx, darkroomId);
    const rows: TotalsRow[] = moved.map(({ bottle, totals }) => ({
      bottleId: bottle.id,
      totals,
      nextLookAt: totals && nextLook(bottle.document, totals, house, now),
    }));
    await this.bottles.writeTotals(tx, darkroomId, rows);
  }
}

/** When time alone would change what is said of the bottle. */
export function nextLook(
  document: ChemistryDocument,
  totals: BottleTotals,
  house: House,
  now: Date,
): string | null {
  const { zone, thresholds, smallestTankUl } = house;
  const today = localDate(now.toISOString(), zone);
  return assess(document, totals, { now: now.toISOString(), today, zone, smallestTankUl, thresholds })
    .nextLookAt;
}
