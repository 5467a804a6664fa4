import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { cp, mkdir, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { createServer, type AddressInfo } from 'node:net';
import { dirname, join } from 'node:path';
import type { TestDatabase } from '@wetside/db/testing/clone';
import { ORIGIN, SECRET } from './test-app.js';
import { until } from './until.js';

/** Neither __dirname nor import.meta exists under both Jest and Node: the checkout is where its packages resolve. */
export const checkout = dirname(
  dirname(createRequire(join(process.cwd(), 'package.json')).resolve('@wetside/db/package.json')),
);

/** The built server's folder; built now if it is not there. */
export function builtProgram(): string {
  const dist = join(checkout, 'apps/api/dist');
  if (!existsSync(join(dist, 'main.js'))) {
    execFileSync(join(checkout, 'node_modules/.bin/tsc'), [
      '-b',
      join(checkout, 'apps/api/tsconfig.build.json'),
    ]);
  }
  return dist;
}

/** A copy of the built server with one text taken out of one file. It lies where it finds the same packages. */
export class Mutant {
  private constructor(readonly folder: string) {}

  /** @throws Error when the text stands there not exactly once */
  static async make(file: string, text: string): Promise<Mutant> {
    await mkdir(join(checkout, '.local'), { recursive: true });
    const mutant = new Mutant(await mkdtemp(join(checkout, '.local/mutant-')));
    await cp(builtProgram(), mutant.folder, { recursive: true });
    const path = join(mutant.folder, file);
    const parts = (await readFile(path, 'utf8')).split(text);
    if (parts.length !== 2) {
      await mutant.remove();
      throw new Error(`${file} holds that text ${parts.length - 1} times: ${text}`);
    }
    await writeFile(path, parts.join(''));
    return mutant;
  }

  remove(): Promise<void> {
    return rm(this.folder, { recursive: true, force: true });
  }
}

/** A process of the built server, on a port of its own. Sessions of a TestApp on the same database are good here. */
export class BuiltServer {
  private constructor(
    readonly url: string,
    private readonly child: ChildProcess,
  ) {}

  static async start(folder: string, db: TestDatabase): Promise<BuiltServer> {
    const port = await freePort();
    const child = spawn(process.execPath, [join(folder, 'main.js')], {
      env: {
        PATH: process.env.PATH,
        MODE: 'test',
        PORT: String(port),
        PUBLIC_ORIGIN: ORIGIN,
        DATABASE_URL: db.appUrl,
        DATABASE_JOBS_URL: db.jobsUrl,
        DATABASE_POOL: '8',
        SESSION_SECRET: SECRET,
        SWEEP_S: '3600',
        MAIL_GRACE_S: '3600',
      },
      stdio: ['ignore', 'ignore', 'pipe'],
    });
    let said = '';
    child.stderr.setEncoding('utf8').on('data', (text: string) => (said += text));
    const server = new BuiltServer(`http://127.0.0.1:${port}`, child);
    await until(async () => {
      if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode}: ${said}`);
      return answers(`${server.url}/api/health`);
    });
    return server;
  }

  async stop(): Promise<void> {
    if (this.child.exitCode !== null) return;
    const ended = once(this.child, 'exit');
    this.child.kill('SIGTERM');
    await ended;
  }
}

async function answers(url: string): Promise<boolean> {
  try {
    return (await fetch(url)).ok;
  } catch {
    return false;
  }
}

export async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return port;
}
