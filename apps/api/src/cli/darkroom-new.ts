import { createInterface } from 'node:readline/promises';
import { parseArgs } from 'node:util';
import { NestFactory } from '@nestjs/core';
import { AppModule } from '../app.module.js';
import { ConfigError, readEnvironment } from '../config/environment.js';
import { DarkroomNewService, type DarkroomOrder } from '../features/darkrooms/darkroom-new.service.js';
import { randomSecret } from '../platform/auth/tokens.js';
import { Problem } from '../platform/errors/problem.js';

const USAGE =
  'npm run darkroom:new -- --name "Riverside Darkroom" --short-name riverside --zone Europe/Vienna --email name@example.org --person-name "Ada"';

const text = { type: 'string' } as const;

function orderFrom(args: string[]): DarkroomOrder | null {
  const { values } = parseArgs({
    args,
    options: { name: text, 'short-name': text, zone: text, email: text, 'person-name': text },
  });
  const { name, zone, email, 'short-name': shortName, 'person-name': personName } = values;
  if (!name || !shortName || !zone || !email || !personName) return null;
  return { name, shortName, zone, email, personName };
}

/** Reads the passphrase from standard input; an empty line has one made and printed, once. */
async function askPassphrase(): Promise<string> {
  const lines = createInterface({ input: process.stdin });
  process.stdout.write('Passphrase of 15 characters or more (leave empty to have one made): ');
  let line = '';
  for await (const first of lines) {
    line = first;
    break;
  }
  lines.close();
  if (line !== '') return line;
  const made = randomSecret().slice(0, 24);
  process.stdout.write(`\nPassphrase made: ${made}\n`);
  return made;
}

async function main(): Promise<void> {
  const order = orderFrom(process.argv.slice(2));
  if (!order) throw new ConfigError(`Say all five: ${USAGE}`);
  const environment = { ...readEnvironment(), logLevel: 'warn' as const };
  const app = await NestFactory.createApplicationContext(AppModule.with(environment), {
    logger: ['warn', 'error'],
  });
  try {
    const { darkroomId } = await app.get(DarkroomNewService).open(order, askPassphrase);
    process.stdout.write(
      `\n${order.name} is open: ${environment.publicOrigin}/d/${order.shortName} (${darkroomId})\n`,
    );
  } finally {
    await app.close();
  }
}

main().catch((error: unknown) => {
  const plain = error instanceof ConfigError || error instanceof Problem;
  process.stderr.write(
    plain ? `${error.message}\n` : `${error instanceof Error ? error.stack : String(error)}\n`,
  );
  process.exitCode = 1;
});
