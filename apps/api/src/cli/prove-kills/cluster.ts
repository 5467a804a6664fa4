import { execFile } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** A PostgreSQL cluster of its own that makes everything durable, to be killed. */
export class KillCluster {
  private place = '';

  private constructor(
    private readonly script: string,
    private readonly env: NodeJS.ProcessEnv,
  ) {}

  /**
   * Makes it anew and starts it.
   * @param root the checkout
   * @param folder where it lies, by a name under .local; what an earlier run left there goes
   * @param port the first port to try
   */
  static async make(root: string, folder: string, port: number): Promise<KillCluster> {
    const clean = Object.entries(process.env).filter(([name]) => !/^(PG|DATABASE_)/.test(name));
    const cluster = new KillCluster(join(root, 'scripts/postgres.sh'), {
      ...Object.fromEntries(clean),
      PG_PROFILE: 'durable',
      PG_DIR: join(root, '.local', folder),
      PG_PORT: String(port),
    });
    await cluster.say('destroy');
    await cluster.start();
    return cluster;
  }

  /** Starts it, after a kill too: PostgreSQL recovers from its log. */
  async start(): Promise<void> {
    await this.say('start');
    this.place = / in (.+)\n/.exec(await this.say('status'))?.[1] ?? '';
  }

  /** The logins of the tests' databases, as DATABASE_… */
  async logins(): Promise<Record<string, string>> {
    const lines = (await this.say('env')).matchAll(/^export (\w+)='(.*)'$/gm);
    return Object.fromEntries([...lines].map(([, name = '', url = '']) => [name, url]));
  }

  /** Ends every process of it at once, as when the machine loses its power: nobody can write anything any more. */
  kill(): void {
    const [first = ''] = readFileSync(join(this.place, 'data/postmaster.pid'), 'utf8').split('\n');
    const postmaster = Number(first);
    for (const pid of [postmaster, ...childrenOf(postmaster)]) end(pid);
  }

  async destroy(): Promise<void> {
    await this.say('destroy');
  }

  private async say(word: string): Promise<string> {
    return (await run(this.script, [word], { env: this.env })).stdout;
  }
}

function childrenOf(parent: number): number[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .map(Number)
    .filter((pid) => parentOf(pid) === parent);
}

/** The fourth field; the second is the name in brackets, which may hold anything. */
function parentOf(pid: number): number | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return Number(stat.slice(stat.lastIndexOf(')') + 2).split(' ')[1]);
  } catch {
    return null;
  }
}

function end(pid: number): void {
  try {
    process.kill(pid, 'SIGKILL');
  } catch (error) {
    // It ended by itself in between.
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}
