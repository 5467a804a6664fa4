import { writeFile } from 'node:fs/promises';
import { createApp } from '../create-app.js';
import { readEnvironment } from '../config/environment.js';
import { buildOpenApi } from '../platform/http/open-api.js';

/** Writes the OpenAPI document to the file named, or to standard output. Nothing is connected: no database is needed. */
async function main(file: string | undefined): Promise<void> {
  const nowhere = 'postgres://nobody@127.0.0.1:1/none';
  const app = await createApp(
    readEnvironment({
      MODE: 'test',
      DATABASE_URL: nowhere,
      DATABASE_JOBS_URL: nowhere,
      SESSION_SECRET: '-'.repeat(32),
    }),
  );
  const text = `${JSON.stringify(buildOpenApi(app), null, 2)}\n`;
  if (file === undefined) process.stdout.write(text);
  else await writeFile(file, text);
}

await main(process.argv[2]);
