import { createApp, startUp } from './create-app.js';
import { ConfigError, readEnvironment } from './config/environment.js';
import { UnsafeDatabase } from './platform/database/start-checks.js';

/** Starts the server, or says in plain sentences why it does not. */
async function main(): Promise<void> {
  const environment = readEnvironment();
  const app = await createApp(environment);
  await startUp(app);
  await app.listen(environment.port, environment.host);
  process.stdout.write(`Wetside is at ${environment.publicOrigin}\n`);
}

main().catch((error: unknown) => {
  const plain = error instanceof ConfigError || error instanceof UnsafeDatabase;
  process.stderr.write(
    plain ? `${error.message}\n` : `${error instanceof Error ? error.stack : String(error)}\n`,
  );
  process.exit(1);
});
