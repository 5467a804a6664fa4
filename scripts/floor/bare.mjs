// The floor: node:http and postgres.js with the statements that the program sends, and nothing else: no framework, no
// sign-in, no check, no reckoning. node scripts/floor/bare.mjs FILE PORT, with DATABASE_URL.
import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';
import postgres from 'postgres';

/** @typedef {{ text: string, parameters: any[], turn: number }} Statement */
/** @typedef {{ id: string, actionId: string, load: Statement[][], sink: Statement[][] }} Darkroom */

const [file = '', port = ''] = process.argv.slice(2);
const { pool, darkrooms } = JSON.parse(readFileSync(file, 'utf8'));
/** Without begin and commit, by turns. @param {Statement[]} statements */
function turnsOf(statements) {
  /** @type {Map<number, Statement[]>} */
  const turns = new Map();
  for (const one of statements) {
    if (/^(begin|commit)/i.test(one.text.trim())) continue;
    turns.set(one.turn, [...(turns.get(one.turn) ?? []), one]);
  }
  return [...turns.values()];
}
/** @type {Map<string, Darkroom>} */
const byId = new Map();
for (const one of darkrooms) byId.set(one.id, { ...one, load: turnsOf(one.load), sink: turnsOf(one.sink) });
const sql = postgres(process.env['DATABASE_URL'] ?? '', { max: pool, onnotice: () => undefined });

/** Runs them in a transaction: one after the other, or together where the program sends them together. @param {Statement[][]} statements @param {(value: any) => any} put */
async function run(statements, put) {
  /** @type {any[]} */
  const rows = [];
  await sql.begin(async (tx) => {
    for (const turn of statements) {
      const sent = turn.map(({ text, parameters }) =>
        tx.unsafe(text, parameters.map(put), { prepare: true }),
      );
      rows.push(...(await Promise.all(sent)));
    }
  });
  return rows;
}

/** @param {import('node:http').IncomingMessage} request */
async function bodyOf(request) {
  let text = '';
  for await (const chunk of request.setEncoding('utf8')) text += chunk;
  return text === '' ? null : JSON.parse(text);
}

const server = createServer(async (request, response) => {
  const [, , , darkroomId = '', what = '', id = ''] = (request.url ?? '').split('/');
  const darkroom = byId.get(darkroomId);
  try {
    if (!darkroom) throw new Error(`There is no darkroom ${darkroomId}.`);
    await bodyOf(request);
    const old = darkroom.actionId;
    const put = (/** @type {any} */ value) =>
      typeof value === 'string' && value.includes(old) ? value.replaceAll(old, id) : value;
    const rows =
      what === 'loads' ? await run(darkroom.load, put) : await run(darkroom.sink, (value) => value);
    // What the program answers with is in the last rows: the bottles as they stand now.
    const text = JSON.stringify(rows.slice(-4));
    response.writeHead(200, { 'content-type': 'application/json; charset=utf-8' }).end(text);
  } catch (error) {
    response.writeHead(500).end(String(error));
  }
});
server.listen(Number(port), '127.0.0.1');
process.on('SIGTERM', () => {
  server.close();
  server.closeAllConnections();
  void sql.end({ timeout: 1 });
});
