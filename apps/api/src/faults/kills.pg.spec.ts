import postgres from 'postgres';
import { compare } from '../cli/prove-kills/compare.js';
import { KillGround } from '../cli/prove-kills/setting.js';
import { builtProgram, checkout, freePort } from '../testing/built-server.js';

jest.setTimeout(180_000);

let ground: KillGround;
beforeAll(async () => {
  const cluster = { name: 'kills-test', port: 56_210 };
  ground = await KillGround.open({
    root: checkout,
    folder: builtProgram(),
    port: await freePort(),
    cluster,
  });
});
afterAll(() => ground.end());

describe('eight people tick loads and', () => {
  it.each([
    ['the server is killed', 'server'],
    ['PostgreSQL is killed; the server outlives it', 'database'],
    ['PostgreSQL is killed, and the server while it recovers', 'both'],
  ] as const)('%s: every answered load is there once, and every retry makes it so', async (_, kind) => {
    const killed = await ground.drill.kill(kind);
    expect(killed.differences).toEqual([]);
    expect(killed.answered).toBeGreaterThan(0);
  });

  it('mutant: a database that says "committed" before it has written loses loads, and that is seen', async () => {
    const root = postgres(ground.db.superUrl, { max: 1, onnotice: () => undefined });
    await root`alter system set synchronous_commit = off`;
    await root`alter system set wal_writer_delay = '10s'`;
    await root`select pg_reload_conf()`;
    await root.end();
    const { differences } = await ground.drill.kill('database');
    expect(differences).toContainEqual(expect.stringContaining('was answered and is not there'));
  });
});

describe('the comparison complains of', () => {
  const sent = [
    { id: 'a', bottleIds: ['x'], body: '', answered: true },
    { id: 'b', bottleIds: ['x', 'y'], body: '', answered: false },
  ];
  const stored = {
    loads: [{ id: 'a', times: 1, bottles: 1 }],
    totals: [
      { bottleId: 'x', loads: 1, usedE4: 10_000 },
      { bottleId: 'y', loads: 0, usedE4: 0 },
    ],
  };
  const [kept] = stored.loads;
  const there = { id: 'b', times: 1, bottles: 2 };

  it('nothing where all is well', () => {
    expect(compare(sent, stored)).toEqual([]);
  });

  it.each([
    ['an answered load that is lost', { ...stored, loads: [] }, 'Load a was answered and is not there.'],
    [
      'a load that is there twice',
      { ...stored, loads: [{ ...kept, id: 'a', times: 2, bottles: 1 }] },
      '2 times',
    ],
    ['half a load', { ...stored, loads: [...stored.loads, { ...there, bottles: 1 }] }, 'is there for 1'],
    [
      'a load that no total counts',
      { ...stored, loads: [...stored.loads, there] },
      'Bottle y counts 0 loads',
    ],
    ['a load of nobody', { ...stored, loads: [...stored.loads, { ...there, id: 'c' }] }, 'sent by nobody'],
    [
      'a total that counts twice',
      { ...stored, totals: [{ bottleId: 'x', loads: 2, usedE4: 20_000 }] },
      'Bottle x counts 2 loads',
    ],
  ])('mutant: %s', (_, found, sentence) => {
    expect(compare(sent, found)).toContainEqual(expect.stringContaining(sentence));
  });
});
