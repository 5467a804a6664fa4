import { starterCatalogue } from '@wetside/chemistry';
import { chemistryVersions, memberships } from '@wetside/db';
import type { TestDatabase } from '@wetside/db/testing/clone';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { ProvisionService } from '../../features/darkrooms/provision.service.js';
import { Accounts } from '../../platform/auth/accounts.js';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import { openProgram } from '../prove-histories/program.js';

export const PASSPHRASE = 'one long evening by the enlarger';

export interface KillHouse {
  darkroomId: string;
  versionId: string;
  /** The first of them manages the darkroom. */
  emails: string[];
}

/** A darkroom with so many people, written by the program before any server runs. */
export async function openKillHouse(db: TestDatabase, people: number): Promise<KillHouse> {
  const app = await openProgram(db);
  try {
    const accounts = app.get(Accounts);
    const database = app.get(Database);
    const one = await accounts.prepare({
      email: 'ticker@darkroom.example',
      name: 'Ticker',
      passphrase: PASSPHRASE,
    });
    // Hashing takes long, and they may as well all have the same.
    const prepared = Array.from({ length: people }, (_, n) => ({
      ...one,
      personId: v7(),
      email: `ticker-${n}@darkroom.example`,
      name: `Ticker ${n}`,
    }));
    for (const account of prepared) await database.asIdentity((tx) => accounts.add(tx, account));
    const [first, ...others] = prepared;
    if (!first) throw new Error('Somebody has to tick.');
    const darkroomId = v7();
    const versions = await database.inDarkroom({ darkroomId, personId: first.personId }, async (tx) => {
      await app.get(ProvisionService).provisionDarkroom(tx, {
        darkroomId,
        shortName: 'kills',
        name: 'The kills darkroom',
        zone: 'Europe/Prague',
        manager: { personId: first.personId, displayName: first.name },
      });
      const joined = { darkroomId, role: 'member' as const, joinedAt: app.get(Clock).now() };
      if (others.length > 0) {
        await tx
          .insert(memberships)
          .values(others.map(({ personId, name }) => ({ ...joined, id: v7(), personId, displayName: name })));
      }
      return tx.select().from(chemistryVersions).where(eq(chemistryVersions.darkroomId, darkroomId));
    });
    const fixer = starterCatalogue.find(({ key }) => key === 'rapid-fixer')?.document.name;
    const versionId = versions.find(({ document }) => document.name === fixer)?.id ?? '';
    return { darkroomId, versionId, emails: prepared.map(({ email }) => email) };
  } finally {
    await app.close();
  }
}
