import type { INestApplicationContext } from '@nestjs/common';
import { starterCatalogue } from '@wetside/chemistry';
import { chemistryVersions, makes } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { ProvisionService } from '../../features/darkrooms/provision.service.js';
import { Accounts } from '../../platform/auth/accounts.js';
import type { Me } from '../../platform/auth/me.js';
import { Database } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';

/** A darkroom in which one history is played, by one technician. */
export interface HistoryHouse {
  darkroomId: string;
  shortName: string;
  enter: Entrance;
  versionIdOf: (documentKey: string) => string;
}

/** The one person who plays all histories. */
export async function addPlayer(app: INestApplicationContext): Promise<string> {
  const accounts = app.get(Accounts);
  const email = 'player@darkroom.example';
  const account = await accounts.prepare({
    email,
    name: 'Player',
    passphrase: 'one long evening by the enlarger',
  });
  await app.get(Database).asIdentity((tx) => accounts.add(tx, account));
  return account.personId;
}

/** A new darkroom with the starter catalogue, where every chemistry may be poured from a bottle of any other. */
export async function openHistoryHouse(
  app: INestApplicationContext,
  { personId, shortName, zone }: { personId: string; shortName: string; zone: string },
): Promise<HistoryHouse> {
  const darkroomId = v7();
  const database = app.get(Database);
  const name = `The ${shortName} darkroom`;
  const displayName = 'Player';
  const { membershipId, versions } = await database.inDarkroom({ darkroomId, personId }, async (tx) => {
    const manager = { personId, displayName };
    const made = await app
      .get(ProvisionService)
      .provisionDarkroom(tx, { darkroomId, shortName, name, zone, manager });
    const rows = await tx
      .select()
      .from(chemistryVersions)
      .where(eq(chemistryVersions.darkroomId, darkroomId));
    const pairs = rows.flatMap((stock) =>
      rows.map(({ chemistryId }) => ({
        darkroomId,
        id: v7(),
        stockChemistryId: stock.chemistryId,
        chemistryId,
        wholeOnly: false,
      })),
    );
    await tx.insert(makes).values(pairs);
    return { membershipId: made.membershipId, versions: rows };
  });
  const me: Me = {
    membershipId,
    personId,
    role: 'technician',
    displayName,
    darkroomId,
    darkroomName: name,
    shortName,
    zone,
  };
  const ids = new Map(
    starterCatalogue.map(({ key, document }) => [
      key,
      versions.find((version) => version.document.name === document.name)?.id ?? '',
    ]),
  );
  return {
    darkroomId,
    shortName,
    enter: (work) => database.inDarkroom({ darkroomId, personId }, (tx) => work(tx, me)),
    versionIdOf: (key) => ids.get(key) ?? '',
  };
}
