// For the proof of backups: signs in at the demo as its technician and ticks off loads, one after the other, until it
// is told to stop; then prints how many were recorded. node scripts/lib/ticks.mjs ORIGIN
import { performance } from 'node:perf_hooks';
import { v7 } from 'uuid';
import { Trouble, begin, say } from './say.mjs';

const [origin = ''] = process.argv.slice(2);
let stop = false;
process.on('SIGTERM', () => (stop = true));
/** @type {string[]} */
let cookies = [];

/** @param {string} method @param {string} path @param {object} [body] @returns {Promise<any>} */
async function ask(method, path, body) {
  const answer = await fetch(`${origin}/api${path}`, {
    method,
    headers: {
      'content-type': 'application/json',
      'sec-fetch-site': 'same-origin',
      origin,
      cookie: cookies.join('; '),
    },
    ...(body ? { body: JSON.stringify(body) } : {}),
  });
  const text = await answer.text();
  if (!answer.ok) throw new Trouble(`${method} ${path}: ${answer.status} ${text}`);
  const set = answer.headers.getSetCookie();
  if (set.length > 0) cookies = set.map((line) => line.split(';')[0] ?? '');
  return JSON.parse(text);
}

/** @param {string} bottleId @param {string} material */
function load(bottleId, material) {
  const now = new Date(performance.timeOrigin + performance.now()).toISOString();
  return {
    content: {
      v: 1,
      happenedAt: now,
      bottleIds: [bottleId],
      material,
      film: [{ format: '135-36', count: 2, filmClass: 'conventional' }],
    },
    envelope: { sentAt: now, deviceNow: now, queued: false },
  };
}

await begin(async () => {
  const { darkrooms } = await ask('POST', '/sign-in', {
    email: 'tomas@harbourlane.example',
    passphrase: 'red lamp over the sink',
  });
  const room = `/darkrooms/${darkrooms[0].id}`;
  const { bottles } = await ask('GET', `${room}/bottles`);
  if (bottles.length === 0) throw new Trouble('There is no bottle to tick anything off at.');
  let ticks = 0;
  for (; !stop; ticks += 1) {
    const { id, material } = bottles[ticks % bottles.length];
    await ask('PUT', `${room}/loads/${v7()}`, load(id, material ?? 'film'));
    if (ticks === 0) say('ticking');
  }
  say(`${ticks} loads`);
});
