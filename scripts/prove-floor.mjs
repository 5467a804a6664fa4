// npm run prove:floor [-- SECONDS ROUNDS LOADS_EACH]: the program beside a bare node:http + postgres.js one with the same
// statements and pool, and both again on a database with 10 million load steps. Writes docs/proofs/floor.md.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { page } from './floor/page.mjs';
import { inTurn, startServer } from './floor/servers.mjs';
import { build } from './lib/build.mjs';
import { Cluster } from './lib/database.mjs';
import { at, local } from './lib/paths.mjs';
import { mustRun, read, run } from './lib/run.mjs';
import { begin, say } from './lib/say.mjs';

/** @typedef {import('./lib/database.mjs').DatabaseLogins} DatabaseLogins */
/** @typedef {import('./floor/servers.mjs').Server} Server */
/** @typedef {{ name: string, file: string, logins: DatabaseLogins, steps: number }} Store */

const DARKROOMS = 64;
const CONNECTIONS = [8, 64];
const KINDS = ['load', 'sink'];
const [seconds = 8, rounds = 5, loadsEach = 52_084] = process.argv.slice(2).map(Number);
/** 64 darkrooms × 52 loads × 3 steps are 10 thousand. */
const SMALL = 52;
const cluster = new Cluster('durable', local('floor-pg'));

/** @param {DatabaseLogins} logins @param {string} name @returns {DatabaseLogins} */
const onDatabase = (logins, name) =>
  /** @type {DatabaseLogins} */ (
    Object.fromEntries(
      Object.entries(logins).map(([key, url]) => {
        const other = new URL(url);
        other.pathname = `/${name}`;
        return [key, other.href];
      }),
    )
  );

/** A database with so many loads in each darkroom. @param {DatabaseLogins} own @param {string} name @param {number} loads @returns {Promise<Store>} */
async function fill(own, name, loads) {
  say(`Filling ${name}`);
  await mustRun('The database was not made.', at('scripts/postgres.sh'), ['database', name], {
    env: cluster.env,
  });
  const logins = onDatabase(own, name);
  await cluster.migrate(logins);
  const file = local(`floor-${name}.json`);
  const env = { ...process.env, ...logins, MODE: 'test' };
  const houses = [at('apps/api/dist/cli/prove-floor.js'), file, String(DARKROOMS)];
  await mustRun('The darkrooms were not made.', process.execPath, houses, { env });
  const psql = [
    logins.DATABASE_SUPER_URL ?? '',
    '-qAt',
    '-v',
    `loads_each=${loads}`,
    '-f',
    at('scripts/floor/history.sql'),
  ];
  const { code, output } = await read('psql', psql);
  if (code !== 0) throw new Error(output);
  return { name, file, logins, steps: Number(output.trim().split('\n').at(-1)) };
}

/** @param {Store} store @returns {Promise<Server[]>} the bare one and the program */
async function serve({ name, file, logins }) {
  const bare = [at('scripts/floor/bare.mjs'), file, 'PORT'];
  const settings = { MODE: 'test', SWEEP_S: '86400', MAIL_GRACE_S: '86400', LOG_LEVEL: 'info' };
  return [
    await startServer(`floor on ${name}`, bare, () => ({ ...process.env, ...logins })),
    await startServer(
      `program on ${name}`,
      [at('apps/api/dist/main.js')],
      (port) => ({
        ...process.env,
        ...logins,
        ...settings,
        PORT: String(port),
        PUBLIC_ORIGIN: `http://127.0.0.1:${port}`,
      }),
      { path: '/api/health', signIn: true },
    ),
  ].map((server) => ({ ...server, file }));
}

/** What one small GET costs on each floor, in milliseconds of processor. @param {Store} store */
async function ladder({ file, logins }) {
  const names = ['http', 'express', 'nest'];
  /** @type {Server[]} */
  const servers = [];
  try {
    for (const name of names)
      servers.push(
        await startServer(name, [at('scripts/floor/ladder.mjs'), name, 'PORT'], () => process.env),
      );
    const [, program] = await serve({ name: 'ladder', file, logins, steps: 0 });
    if (program) servers.push({ ...program, name: 'program', signIn: false });
    const { http, express, nest } = await inTurn(
      servers.slice(0, 3),
      { kind: 'path', path: '/', connections: 8, seconds: 4, file },
      rounds,
    );
    const last = await inTurn(
      servers.slice(3),
      { kind: 'path', path: '/api/health', connections: 8, seconds: 4, file },
      rounds,
    );
    return { http, express, nest, program: last['program'] };
  } finally {
    for (const server of servers) server.stop();
  }
}

await begin(async () => {
  await build();
  const { output } = await read('git', ['-C', at(), 'rev-parse', '--short', 'HEAD']);
  const loose = (await read('git', ['-C', at(), 'status', '--porcelain'])).output.trim() !== '';
  const own = await cluster.start();
  /** @type {Server[]} */
  let servers = [];
  try {
    const stores = [await fill(own, 'small', SMALL), await fill(own, 'large', loadsEach)];
    for (const store of stores) servers.push(...(await serve(store)));
    const results = [];
    for (const kind of KINDS) {
      for (const connections of CONNECTIONS) {
        say(`${kind}, ${connections} connections`);
        results.push({
          kind,
          connections,
          by: await inTurn(servers, { kind, connections, seconds }, rounds),
        });
      }
    }
    servers.forEach((server) => server.stop());
    servers = [];
    const [small] = stores;
    const recorded = JSON.parse(readFileSync(small?.file ?? '', 'utf8'));
    const frames = small ? await ladder(small) : {};
    mkdirSync(at('docs', 'proofs'), { recursive: true });
    const found = { results, stores, frames, recorded, seconds, rounds };
    writeFileSync(local('floor.json'), JSON.stringify(found));
    writeFileSync(
      at('docs/proofs/floor.md'),
      page(found, `${output.trim()}${loose ? ', with changes that were not committed' : ''}`),
    );
    await run(process.execPath, [
      at('node_modules/prettier/bin/prettier.cjs'),
      '--write',
      at('docs/proofs/floor.md'),
    ]);
    return 0;
  } finally {
    servers.forEach((server) => server.stop());
    await cluster.destroy();
  }
});
