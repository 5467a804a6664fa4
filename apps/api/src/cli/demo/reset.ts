import { darkrooms } from '@wetside/db';
import { demoDarkroom } from '@wetside/db/seed/demo-people';
import { ne, sql } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';

/**
 * Empties the database so that the demo can be played anew, in the owner's name.
 * @param adminUrl wetside_admin's login
 * @throws Error when a darkroom other than the demo's stands there: a reset would take it along
 */
export async function emptyDatabase(adminUrl: string): Promise<void> {
  const client = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  const db = drizzle(client);
  try {
    const others = await db
      .select({ name: darkrooms.name })
      .from(darkrooms)
      .where(ne(darkrooms.shortName, demoDarkroom.shortName));
    if (others.length > 0) {
      throw new Error(
        `Not only the demo stands here but ${others.map((row) => row.name).join(', ')}: nothing was emptied.`,
      );
    }
    await db.transaction(async (tx) => {
      await tx.execute(sql`set local role wetside_owner`);
      await tx.execute(sql`truncate identity.darkrooms, identity.people, identity.rate_counters cascade`);
    });
  } finally {
    await client.end();
  }
}
