import type { INestApplicationContext } from '@nestjs/common';
import { darkrooms, memberships, packs, supplierPacks, suppliers } from '@wetside/db';
import {
  demoDarkroom,
  demoPassphrase,
  demoPeople,
  demoSuppliers,
  type DemoPerson,
} from '@wetside/db/seed/demo-people';
import { idFor } from '@wetside/db/seed/ids';
import { eq } from 'drizzle-orm';
import { v7 } from 'uuid';
import { ProvisionService } from '../../features/darkrooms/provision.service.js';
import { Accounts } from '../../platform/auth/accounts.js';
import type { Me } from '../../platform/auth/me.js';
import { Clock } from '../../platform/clock/clock.js';
import { Database } from '../../platform/database/database.js';
import type { Entrance } from '../../platform/ledger/entrance.js';

/** Who plays the demo, and where. */
export interface Cast {
  darkroomId: string;
  enter: (who: DemoPerson['key']) => Entrance;
}

/** Whether a darkroom stands already: then there is nothing to play. */
export async function isAnythingThere(app: INestApplicationContext): Promise<boolean> {
  const rows = await app
    .get(Database)
    .asIdentity((tx) => tx.select({ id: darkrooms.id }).from(darkrooms).limit(1));
  return rows.length > 0;
}

/** Makes the demo's people, darkroom and suppliers; there is no page for suppliers yet, so they are written here. */
export async function assemble(app: INestApplicationContext): Promise<Cast> {
  const darkroomId = v7();
  const people = await makePeople(app);
  const { shortName, name, zone, currency, smallestTankUl } = demoDarkroom;
  const mes = new Map<DemoPerson['key'], Me>();
  const database = app.get(Database);
  await database.inDarkroom({ darkroomId }, async (tx) => {
    const manager = demoPeople.find((person) => person.role === 'manager');
    if (!manager) throw new Error('The demo has no manager.');
    const { membershipId } = await app.get(ProvisionService).provisionDarkroom(tx, {
      darkroomId,
      shortName,
      name,
      zone,
      manager: { personId: people.get(manager.key) ?? '', displayName: manager.name },
      settings: { currency, smallestTankUl },
    });
    for (const { key, role, name: displayName } of demoPeople) {
      const personId = people.get(key) ?? '';
      const id = key === manager.key ? membershipId : v7();
      if (key !== manager.key) {
        await tx
          .insert(memberships)
          .values({ darkroomId, id, personId, role, displayName, joinedAt: app.get(Clock).now() });
      }
      mes.set(key, {
        membershipId: id,
        personId,
        role,
        displayName,
        darkroomId,
        darkroomName: name,
        shortName,
        zone,
      });
    }
    const packIds = new Map(
      (await tx.select().from(packs).where(eq(packs.darkroomId, darkroomId))).map((pack) => [
        pack.name,
        pack.id,
      ]),
    );
    for (const supplier of demoSuppliers) {
      const supplierId = idFor(`supplier ${supplier.key}`);
      const { name: supplierName, email, minimumMinor, leadDays } = supplier;
      await tx
        .insert(suppliers)
        .values({ darkroomId, id: supplierId, name: supplierName, email, currency, minimumMinor, leadDays });
      await tx.insert(supplierPacks).values(
        supplier.packs.map((sold) => ({
          darkroomId,
          id: idFor(`supplier pack ${supplier.key} ${sold.pack}`),
          supplierId,
          packId: packIds.get(sold.pack) ?? '',
          supplierName: sold.supplierName,
          priceMinor: sold.priceMinor,
        })),
      );
    }
  });
  const enter = (who: DemoPerson['key']): Entrance => {
    const me = mes.get(who);
    if (!me) throw new Error(`The demo has no ${who}.`);
    return (work) => database.inDarkroom({ darkroomId, personId: me.personId }, (tx) => work(tx, me));
  };
  return { darkroomId, enter };
}

async function makePeople(app: INestApplicationContext): Promise<Map<DemoPerson['key'], string>> {
  const accounts = app.get(Accounts);
  const made = new Map<DemoPerson['key'], string>();
  for (const { key, name, email } of demoPeople) {
    const account = await accounts.prepare({ email, name, passphrase: demoPassphrase });
    await app.get(Database).asIdentity((tx) => accounts.add(tx, account));
    made.set(key, account.personId);
  }
  return made;
}
