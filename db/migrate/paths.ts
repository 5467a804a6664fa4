import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The folder of the db workspace, found from the sources as well as from dist/. */
export function dbFolder(from: string): string {
  for (let at = from; at !== dirname(at); at = dirname(at)) {
    if (existsSync(join(at, 'drizzle.config.ts'))) return at;
  }
  throw new Error(`No db workspace above ${from}.`);
}
