import { randomUUID } from 'node:crypto';
import postgres from 'postgres';
import { runCommand, type Settings } from './program.js';

export type RoleName = 'member' | 'technician' | 'manager';

export interface Someone {
  name: string;
  email: string;
}
export type Cast = Record<RoleName, Someone>;

export interface SupplierOrder {
  name: string;
  email: string;
  packs: { pack: string; supplierName: string; priceMinor: number }[];
}

export interface Place {
  shortName: string;
  name: string;
  zone: string;
  cast: Cast;
  suppliers: SupplierOrder[];
}

export const passphrase = 'a wet print on the line';

/** Opens the darkroom with the program's own command: it makes the manager, the chemistries and the packs. */
async function openDarkroom({ shortName, name, zone, cast }: Place, settings: Settings): Promise<void> {
  const { email, name: personName } = cast.manager;
  const said = { name, 'short-name': shortName, zone, email, 'person-name': personName };
  const args = Object.entries(said).flatMap(([option, value]) => [`--${option}`, value]);
  await runCommand('cli/darkroom-new.js', args, settings, `${passphrase}\n`);
}

/** People join by SQL while there is no page to invite them: with the manager's passphrase, and so with its hash. */
async function join(
  sql: postgres.Sql,
  shortName: string,
  role: RoleName,
  { name, email }: Someone,
): Promise<void> {
  const id = randomUUID();
  await sql`
    insert into identity.people (id, email, name, created_at)
    select ${id}, ${email}, ${name}, created_at from identity.darkrooms where short_name = ${shortName}`;
  await sql`
    insert into identity.credentials (person_id, passphrase_hash, changed_at)
    select ${id}, passphrase_hash, changed_at from identity.credentials limit 1`;
  await sql`
    insert into memberships (darkroom_id, id, person_id, role, display_name, joined_at)
    select id, ${randomUUID()}, ${id}, ${role}, ${name}, created_at
    from identity.darkrooms where short_name = ${shortName}`;
}

/** Suppliers come by SQL while there is no page for them. */
async function addSupplier(sql: postgres.Sql, shortName: string, supplier: SupplierOrder): Promise<void> {
  const id = randomUUID();
  await sql`
    insert into suppliers (darkroom_id, id, name, email, currency)
    select id, ${id}, ${supplier.name}, ${supplier.email}, 'EUR'
    from identity.darkrooms where short_name = ${shortName}`;
  for (const { pack, supplierName, priceMinor } of supplier.packs) {
    const added = await sql`
      insert into supplier_packs (darkroom_id, id, supplier_id, pack_id, supplier_name, price_minor)
      select packs.darkroom_id, ${randomUUID()}, ${id}, packs.id, ${supplierName}, ${priceMinor}
      from packs join identity.darkrooms on darkrooms.id = packs.darkroom_id
      where short_name = ${shortName} and packs.name = ${pack}`;
    if (added.count !== 1) throw new Error(`There is no pack ${pack}.`);
  }
}

/** One statement or more as the administrator of the journey's database. */
export async function asAdmin(adminUrl: string, work: (sql: postgres.Sql) => Promise<void>): Promise<void> {
  const sql = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  try {
    await work(sql);
  } finally {
    await sql.end();
  }
}

/** A darkroom with its people and suppliers, before the server starts. */
export async function furnish(place: Place, settings: Settings, adminUrl: string): Promise<void> {
  await openDarkroom(place, settings);
  await asAdmin(adminUrl, async (sql) => {
    await join(sql, place.shortName, 'technician', place.cast.technician);
    await join(sql, place.shortName, 'member', place.cast.member);
    for (const supplier of place.suppliers) await addSupplier(sql, place.shortName, supplier);
  });
}
