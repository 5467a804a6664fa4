import { NestFactory } from '@nestjs/core';
import { demoPassphrase, demoPeople } from '@wetside/db/seed/demo-people';
import { AppModule } from '../app.module.js';
import { readEnvironment } from '../config/environment.js';
import { Clock } from '../platform/clock/clock.js';
import { assemble, isAnythingThere } from './demo/cast.js';
import { play } from './demo/player.js';
import { emptyDatabase } from './demo/reset.js';

const WEEKS_MS = 57 * 24 * 3_600_000;

/**
 * Plays the demo's eight weeks into an empty database, and does nothing where a darkroom stands; `--reset` empties it first.
 * Prints each sign-in as a line of JSON.
 */
async function main(): Promise<void> {
  const environment = { ...readEnvironment(), background: false, logLevel: 'warn' as const };
  if (environment.mode === 'real') throw new Error('The demo is not for real use.');
  if (process.argv.includes('--reset')) await emptyDatabase(adminUrl());
  const app = await NestFactory.createApplicationContext(AppModule.with(environment), {
    logger: ['warn', 'error'],
  });
  try {
    if (!(await isAnythingThere(app))) {
      const end = app.get(Clock).now();
      app.get(Clock).advance(-WEEKS_MS);
      const deeds = await play(app, await assemble(app), end);
      process.stderr.write(`Played ${deeds} deeds of the demo.\n`);
    }
    for (const { name, email, role, printed } of demoPeople) {
      if (printed)
        process.stdout.write(`${JSON.stringify({ name, email, role, passphrase: demoPassphrase })}\n`);
    }
  } finally {
    await app.close();
  }
}

function adminUrl(): string {
  const url = process.env.DATABASE_ADMIN_URL;
  if (!url) throw new Error('Set DATABASE_ADMIN_URL to reset the demo: npm run demo:reset does.');
  return url;
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exitCode = 1;
});
