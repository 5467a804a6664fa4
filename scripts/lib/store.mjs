import { join } from 'node:path';
import { Cluster } from './database.mjs';
import { GivenDatabase, withClient } from './given-database.mjs';
import { local } from './paths.mjs';
import { realPlace } from './real.mjs';
import { Trouble } from './say.mjs';

/**
 * The database that a command works on, and the note of the program that runs on it: real use where WETSIDE_DATA is
 * set, else npm start's.
 */
export function store() {
  if (!process.env['WETSIDE_DATA'])
    return { real: false, database: new Cluster('durable'), note: local('running.json') };
  const { data, given } = realPlace();
  const database = given ? new GivenDatabase(given) : new Cluster('durable', join(data, 'pg'));
  return { real: true, database, note: join(data, 'running.json') };
}

/** Real use keeps what it was told, through a power cut too. @param {string} url @throws Trouble */
export async function refuseForgetful(url) {
  const [row] = await withClient(url, (client) => client`show fsync`);
  if (row?.['fsync'] !== 'on')
    throw new Trouble('The database makes nothing durable (fsync is off): real use needs one that does.');
}
