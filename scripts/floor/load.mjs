// Asks one server as fast as so many connections allow, for so long, and prints what came of it as JSON.
// node scripts/floor/load.mjs '{ "origin", "kind": "load" | "sink" | "path", "connections", "seconds", "file" }'
import { Buffer } from 'node:buffer';
import { readFileSync } from 'node:fs';
import { Agent, request } from 'node:http';
import { performance } from 'node:perf_hooks';
import { setTimeout as wait } from 'node:timers/promises';
import { v7 } from 'uuid';

/** @typedef {{ status: number, text: string, cookies: string[] }} Answer */

const order = JSON.parse(process.argv[2] ?? '{}');
const { person, darkrooms } = JSON.parse(readFileSync(order.file, 'utf8'));
const agent = new Agent({ keepAlive: true, maxSockets: order.connections });
const origin = new URL(order.origin);
let cookie = '';

/** @param {string} method @param {string} path @param {object} [body] @returns {Promise<Answer>} */
function ask(method, path, body) {
  const text = body ? JSON.stringify(body) : '';
  /** @type {Record<string, string | number>} */
  const headers = { 'sec-fetch-site': 'same-origin', cookie };
  if (body)
    Object.assign(headers, { 'content-type': 'application/json', 'content-length': Buffer.byteLength(text) });
  return new Promise((resolve, reject) => {
    const sent = request(
      { agent, host: origin.hostname, port: origin.port, method, path, headers },
      (answer) => {
        let said = '';
        answer.setEncoding('utf8').on('data', (chunk) => (said += chunk));
        answer.on('end', () =>
          resolve({
            status: answer.statusCode ?? 0,
            text: said,
            cookies: answer.headers['set-cookie'] ?? [],
          }),
        );
      },
    );
    sent.on('error', reject).end(text);
  });
}

const now = () => new Date(performance.timeOrigin + performance.now()).toISOString();

/** @param {{ id: string, bottleIds: string[] }} darkroom */
function load({ bottleIds }) {
  const film = [{ format: '135-36', count: 1, filmClass: 'conventional' }];
  return {
    content: { v: 1, happenedAt: now(), bottleIds, material: 'film', film },
    envelope: { sentAt: now(), deviceNow: now(), queued: false },
  };
}

/** @param {{ id: string, bottleIds: string[] }} darkroom */
const once = (darkroom) =>
  order.kind === 'load'
    ? ask('PUT', `/api/darkrooms/${darkroom.id}/loads/${v7()}`, load(darkroom))
    : ask('GET', order.kind === 'sink' ? `/api/darkrooms/${darkroom.id}/bottles` : order.path);

/** Each connection stands in a darkroom of its own, as far as there are any. @param {number} seconds */
async function round(seconds) {
  /** @type {number[]} */
  const took = [];
  let refused = 0;
  const end = performance.now() + seconds * 1000;
  const began = performance.now();
  await Promise.all(
    Array.from({ length: order.connections }, async (_, n) => {
      for (let at = performance.now(); at < end; at = performance.now()) {
        const answer = await once(darkrooms[n % darkrooms.length]);
        if (answer.status === 503) {
          refused += 1;
          await wait(1000);
          continue;
        }
        if (answer.status >= 300) throw new Error(`${answer.status} ${answer.text}`);
        took.push(performance.now() - at);
      }
    }),
  );
  return { took, refused, seconds: (performance.now() - began) / 1000 };
}

if (order.signIn) {
  const { status, text, cookies } = await ask('POST', '/api/sign-in', person);
  if (status !== 200) throw new Error(`Sign-in: ${status} ${text}`);
  cookie = cookies.map((line) => line.split(';')[0]).join('; ');
}
/** Milliseconds of processor that the server has used. */
function serverCpu() {
  const fields = (readFileSync(`/proc/${order.pid}/stat`, 'utf8').split(') ')[1] ?? '').split(' ');
  return (Number(fields[11]) + Number(fields[12])) * 10;
}
await round(1);
const before = serverCpu();
const { took, refused, seconds } = await round(order.seconds);
const cpuMs = (serverCpu() - before) / took.length;
took.sort((a, b) => a - b);
const part = (/** @type {number} */ share) =>
  took[Math.min(took.length - 1, Math.floor(took.length * share))] ?? 0;
process.stdout.write(
  `${JSON.stringify({ requests: took.length, perSecond: took.length / seconds, p50: part(0.5), p99: part(0.99), cpuMs, refused })}\n`,
);
agent.destroy();
