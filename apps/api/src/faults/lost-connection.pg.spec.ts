import { cloneDatabase, type TestDatabase } from '@wetside/db/testing/clone';
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { builtProgram, checkout, Mutant } from '../testing/built-server.js';

let db: TestDatabase;
beforeAll(async () => {
  db = await cloneDatabase();
});
afterAll(() => db.drop());

/** A process of its own, for what is asked is whether it lives: a transaction loses its connection and goes on. */
const PROGRAM = `
  import { sql } from 'drizzle-orm';
  const { Pool } = await import(process.env.POOL);
  const limits = { lockMs: 5000, statementMs: 5000, idleMs: 5000, waitMs: 5000, transactionMs: 5000 };
  const pool = new Pool({ databaseUrl: process.env.DATABASE_URL, databasePool: 2, limits });
  const turn = () => new Promise((resolve) => setImmediate(resolve));
  let lost = null;
  let began;
  const pid = new Promise((resolve) => (began = resolve));
  const first = pool.transaction('read write', async (tx) => {
    const [row] = await tx.execute(sql\`select pg_backend_pid() as pid\`);
    began(row.pid);
    if (process.env.HOW === 'in a statement') await tx.execute(sql\`select pg_sleep(30)\`);
    while (!lost) await turn();
    await tx.execute(sql\`select 1\`);
  });
  first.catch((error) => (lost = error));
  const backend = await pid;
  await pool.transaction('read write', async (tx) => {
    await tx.execute(sql\`select pg_terminate_backend(pid, 5000) from pg_stat_activity where pid = \${backend}\`);
  });
  while (!lost) await turn();
  for (let turns = 0; turns < 50; turns += 1) await turn();
  const [row] = await pool.transaction('read only', (tx) => tx.execute(sql\`select 'lives' as word\`));
  process.stdout.write(row.word + ' ' + lost.code);
  await pool.close(0);
`;

function play(folder: string, how: string): { code: number | null; said: string } {
  const done = spawnSync(process.execPath, ['--input-type=module', '-e', PROGRAM], {
    cwd: join(checkout, 'apps/api'),
    env: {
      PATH: process.env.PATH,
      DATABASE_URL: db.appUrl,
      POOL: join(folder, 'platform/database/pool.js'),
      HOW: how,
    },
    encoding: 'utf8',
    timeout: 25_000,
  });
  return { code: done.status, said: done.stdout + done.stderr };
}

const HOWS = ['in a statement', 'between two statements'];

describe('a connection lost', () => {
  it.each(HOWS)('%s ends its transaction and nothing else', (how) => {
    expect(play(builtProgram(), how)).toEqual({ code: 0, said: 'lives CONNECTION_CLOSED' });
  });

  it.each([
    [
      'in a statement',
      'a roll-back on what is gone',
      'if (isConnectionLost(error))\n            return new Promise(() => undefined);',
    ],
    ['between two statements', 'a query on what is gone', "over && name === 'unsafe' ? nowhere : "],
  ])('mutant: %s, %s ends the process', async (how, _, text) => {
    const mutant = await Mutant.make('platform/database/pool.js', text);
    try {
      const { code, said } = play(mutant.folder, how);
      expect(code).not.toBe(0);
      expect(said).toContain("reading 'write'");
    } finally {
      await mutant.remove();
    }
  });
});
