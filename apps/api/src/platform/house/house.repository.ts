import { Injectable } from '@nestjs/common';
import type { Thresholds } from '@wetside/chemistry';
import { darkrooms, darkroomSettings } from '@wetside/db';
import { eq, sql } from 'drizzle-orm';
import type { Tx } from '../database/database.js';
import { hotQuery } from '../database/hot-query.js';

/** A darkroom and its rules, as everything that judges a bottle or writes to its people needs them. */
export interface House {
  darkroomId: string;
  darkroomName: string;
  shortName: string;
  /** IANA time zone; the darkroom's dates follow it. */
  zone: string;
  thresholds: Thresholds;
  /** The least a tank here needs, in microlitres; null where nobody said. */
  smallestTankUl: number | null;
  temperatureUnit: 'C' | 'F';
  volumeUnit: 'mL' | 'fl oz';
  /** ISO 4217. */
  currency: string;
}

@Injectable()
export class HouseRepository {
  /** What a transaction has read: its several judges are to judge by the same rules. */
  private readonly known = new WeakMap<Tx, Map<string, Promise<House>>>();

  /** @throws Error when the transaction is not inside that darkroom, or it has no rules. */
  read(tx: Tx, darkroomId: string): Promise<House> {
    const known = this.known.get(tx) ?? new Map<string, Promise<House>>();
    this.known.set(tx, known);
    const house = known.get(darkroomId) ?? findHouse(tx, darkroomId);
    known.set(darkroomId, house);
    return house;
  }
}

const readHouse = hotQuery('read_house', (db) =>
  db
    .select({
      darkroomName: darkrooms.name,
      shortName: darkrooms.shortName,
      zone: darkrooms.zone,
      rules: darkroomSettings,
    })
    .from(darkroomSettings)
    .innerJoin(darkrooms, eq(darkrooms.id, darkroomSettings.darkroomId))
    .where(eq(darkroomSettings.darkroomId, sql.placeholder('darkroomId'))),
);

async function findHouse(tx: Tx, darkroomId: string): Promise<House> {
  const [row] = await readHouse(tx, { darkroomId });
  if (!row) throw new Error(`Darkroom ${darkroomId} has no rules here.`);
  const { rules, ...names } = row;
  const { lowShareE4, lowRollsE4, nearDaysMax, nearShareE4 } = rules;
  return {
    darkroomId,
    ...names,
    thresholds: { lowShareE4, lowRollsE4, nearDaysMax, nearShareE4 },
    smallestTankUl: rules.smallestTankUl,
    temperatureUnit: rules.temperatureUnit,
    volumeUnit: rules.volumeUnit,
    currency: rules.currency,
  };
}
