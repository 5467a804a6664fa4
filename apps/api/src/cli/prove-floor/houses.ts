import type { INestApplication } from '@nestjs/common';
import { starterCatalogue } from '@wetside/chemistry';
import { chemistryVersions } from '@wetside/db';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { ProvisionService } from '../../features/darkrooms/provision.service.js';
import { Accounts } from '../../platform/auth/accounts.js';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import { Caller, type Person } from './caller.js';

/** A darkroom with a bottle of each chemistry of the starter catalogue, so large that no load ever spends it. */
export interface FloorDarkroom {
  id: string;
  bottleIds: string[];
}

const VOLUME_UL = 1_000_000_000;

/** One person manages them all: what is measured is the load, not the sign-in. */
export async function openDarkrooms(
  app: INestApplication,
  count: number,
): Promise<{ person: Person; darkrooms: FloorDarkroom[] }> {
  const person = { email: 'floor@darkroom.example', passphrase: 'a floor of boards under the sink' };
  const name = 'Fen Floorley';
  const accounts = app.get(Accounts);
  const database = app.get(Database);
  const account = await accounts.prepare({ ...person, name });
  await database.asIdentity((tx) => accounts.add(tx, account));
  const caller = await Caller.signIn(await app.getUrl(), app.get(Clock), person);
  const darkrooms: FloorDarkroom[] = [];
  for (let n = 1; n <= count; n += 1) {
    const darkroomId = v7();
    const order = { darkroomId, shortName: `floor-${n}`, name: `Floor ${n}`, zone: 'Europe/Vienna' };
    const manager = { personId: account.personId, displayName: name };
    const versions = await database.inDarkroom({ darkroomId, personId: account.personId }, async (tx) => {
      await app.get(ProvisionService).provisionDarkroom(tx, { ...order, manager });
      return tx.select().from(chemistryVersions).where(eq(chemistryVersions.darkroomId, darkroomId));
    });
    const bottleIds: string[] = [];
    for (const { document } of starterCatalogue) {
      const version = versions.find((one) => one.document.name === document.name);
      const bottleId = v7();
      const content = {
        bottleId,
        chemistryVersionId: version?.id,
        volumeUl: VOLUME_UL,
        container: { sizeUl: VOLUME_UL, kind: 'tank' },
        material: 'film',
        from: { kind: 'hand' },
      };
      await caller.put(darkroomId, 'mixes', v7(), content);
      bottleIds.push(bottleId);
    }
    darkrooms.push({ id: darkroomId, bottleIds });
  }
  return { person, darkrooms };
}
