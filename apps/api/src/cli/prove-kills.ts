import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { KINDS, type Killed } from './prove-kills/drill.js';
import { KillGround } from './prove-kills/setting.js';

const SERVER_PORT = 56_230;
const CLUSTER = { name: 'kills-proof', port: 56_220 };

/** Kills so many times, each kind in its turn, and prints what came of each as JSON. */
async function main(): Promise<void> {
  const wanted = Number(process.argv[2] ?? 100);
  if (!Number.isInteger(wanted) || wanted < 1) throw new Error('Say how many kills: a whole number from 1.');
  const folder = dirname(dirname(fileURLToPath(import.meta.url)));
  const root = join(folder, '../../..');
  const ground = await KillGround.open({ root, folder, port: SERVER_PORT, cluster: CLUSTER });
  const kills: Killed[] = [];
  // Told to stop, it ends with what it has.
  let stopped = false;
  process.once('SIGTERM', () => (stopped = true));
  try {
    while (kills.length < wanted && !stopped) {
      const killed = await ground.drill.kill(KINDS[kills.length % KINDS.length] ?? 'server');
      kills.push(killed);
      for (const difference of killed.differences) process.stderr.write(`${difference}\n`);
      if (kills.length % 10 === 0) process.stderr.write(`  ${kills.length} kills\n`);
    }
  } finally {
    await ground.end();
  }
  process.stdout.write(`${JSON.stringify(kills)}\n`);
  if (kills.some(({ differences }) => differences.length > 0)) process.exitCode = 1;
}

main().catch((error: unknown) => {
  for (let at = error; at instanceof Error; at = at.cause)
    process.stderr.write(`${at.stack ?? at.message}\n`);
  process.exitCode = 1;
});
