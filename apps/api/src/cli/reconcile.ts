import { ConfigError, readEnvironment } from '../config/environment.js';
import { Clock } from '../platform/clock/clock.js';
import { reconcile, sumUp } from './reconcile/reconcile.js';

/** The time by the clock that the servers of this database go by. */
function now(adminUrl: string): Date {
  const { CLOCK_OFFSET } = process.env;
  const only = { MODE: 'test', DATABASE_URL: adminUrl, DATABASE_JOBS_URL: adminUrl };
  return new Clock(readEnvironment(CLOCK_OFFSET ? { ...only, CLOCK_OFFSET } : only)).now();
}

/** Prints every difference and ends with 1, or says that there is none. */
async function main(): Promise<void> {
  const adminUrl = process.env.DATABASE_ADMIN_URL;
  if (!adminUrl) throw new ConfigError('Set DATABASE_ADMIN_URL to the address of wetside_admin.');
  const found = await reconcile(adminUrl, now(adminUrl));
  for (const difference of found.differences) process.stdout.write(`${difference}\n`);
  process.stdout.write(`${sumUp(found)}\n`);
  if (found.differences.length > 0) process.exitCode = 1;
}

main().catch((error: unknown) => {
  const plain = error instanceof ConfigError;
  process.stderr.write(
    plain ? `${error.message}\n` : `${error instanceof Error ? error.stack : String(error)}\n`,
  );
  process.exitCode = 1;
});
