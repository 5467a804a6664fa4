import { writeFile } from 'node:fs/promises';
import { readEnvironment } from '../config/environment.js';
import { createApp, startUp } from '../create-app.js';
import { openDarkrooms } from './prove-floor/houses.js';
import { recordFloor } from './prove-floor/record.js';

/**
 * Makes so many darkrooms with three bottles each in the database of DATABASE_URL, and writes to the file which
 * statements the program sends for one load through the three and for one look at the sink, in every darkroom.
 */
async function main(file: string, count: number): Promise<void> {
  const environment = { ...readEnvironment(process.env), background: false };
  const app = await createApp(environment);
  try {
    await startUp(app);
    await app.listen(0, '127.0.0.1');
    const { person, darkrooms } = await openDarkrooms(app, count);
    const recorded = await recordFloor(app, person, darkrooms);
    await writeFile(file, JSON.stringify({ person, pool: environment.databasePool, darkrooms: recorded }));
  } finally {
    await app.close();
  }
}

const [file, count] = process.argv.slice(2);
if (!file || !Number.isInteger(Number(count))) throw new Error('Say the file and how many darkrooms.');
await main(file, Number(count));
