import { post, text, withKey } from './body.js';
import type { Row } from './table.js';

const keys: Row[] = [
  ['a key twice: the last one counts', (w) => post(w, withKey(w, '"v":2')), 201],
  [
    'a key twice: the last one counts, and is wrong',
    (w) => post(w, text(w).replace('"v":1', '"v":1,"v":2')),
    400,
    'invalid',
    'content.v',
  ],
  [
    'an unknown field at the top',
    (w) => post(w, JSON.stringify({ ...w.told(w.receipt()), darkroomId: w.there.ids.darkroomId })),
    400,
    'invalid',
    'darkroomId',
    'leave it out',
  ],
  [
    'an unknown field in the content',
    (w) => post(w, text(w, { role: 'manager' })),
    400,
    'invalid',
    'content.role',
    'leave it out',
  ],
  [
    'an unknown field in a line',
    (w) => post(w, JSON.stringify(w.told(w.receipt({ unopened: 5 })))),
    400,
    'invalid',
    'content.lines.0.unopened',
  ],
  [
    'an unknown field in the envelope',
    (w) => post(w, text(w).replace('"queued":', '"seq":1,"queued":')),
    400,
    'invalid',
    'envelope.seq',
  ],
  ...[
    '"constructor":{"prototype":{"v":1}}',
    '"constructor":1',
    '"toString":1',
    '"hasOwnProperty":1',
    '"valueOf":null',
    '"then":1',
    '"length":1',
    '"0":1',
    '"":1',
    '" v":1',
  ].map((key): Row => [`the key ${key}`, (w) => post(w, withKey(w, key)), 400, 'invalid']),
  [
    'the key "constructor" at the top',
    (w) => post(w, text(w).replace('{"content"', '{"constructor":{"name":"x"},"content"')),
    400,
    'invalid',
  ],
];

const types: Row[] = [
  ...[
    'text/plain',
    'application/x-www-form-urlencoded',
    'multipart/form-data; boundary=x',
    'application/xml',
    'application/jsonp',
  ].map((type): Row => [
    `a body of ${type}`,
    (w) => post(w, text(w), { 'content-type': type }),
    415,
    undefined,
    undefined,
    'JSON',
  ]),
  [
    'JSON in another alphabet',
    (w) => post(w, text(w), { 'content-type': 'application/json; charset=iso-8859-1' }),
    415,
    undefined,
    undefined,
    'JSON',
  ],
  [
    'a packing that is not known',
    (w) => post(w, text(w), { 'content-encoding': 'zip' }),
    415,
    undefined,
    undefined,
    'JSON',
  ],
  [
    'JSON with its alphabet named',
    (w) => post(w, text(w), { 'content-type': 'application/json; charset=utf-8' }),
    201,
  ],
];

const QUERY = `?x=${'q'.repeat(8 * 1024)}`;
const cursor = (said: string) => `log?cursor=${encodeURIComponent(Buffer.from(said).toString('base64url'))}`;

const queries: Row[] = [
  ['a query of 8 kB with an unknown field', (w) => w.member.get(w.url(`log${QUERY}`)), 400, 'invalid', 'x'],
  ['a query of 8 kB where none is read', (w) => w.member.get(w.url(`people${QUERY}`)), 200],
  ...['in-us', 'IN-USE', '', 'all%00', "all';--"].map((state): Row => [
    `bottles in the state "${state}"`,
    (w) => w.member.get(w.url(`bottles?state=${state}`)),
    400,
    'invalid',
    'state',
  ]),
  [
    'bottles in two states',
    (w) => w.member.get(w.url('bottles?state=all&state=in-use')),
    400,
    'invalid',
    'state',
  ],
  [
    'orders in no state that there is',
    (w) => w.technician.get(w.url('orders?state=lost')),
    400,
    'invalid',
    'state',
  ],
  ['a limit twice', (w) => w.member.get(w.url('log?limit=1&limit=2')), 400, 'invalid', 'limit'],
  ['a limit as an object', (w) => w.member.get(w.url('log?limit[a]=1')), 400, 'invalid'],
  ...['nonsense', '%00', '%F0%9F%93%B7', 'a'.repeat(200), '....', 'null'].map((said): Row => [
    `the cursor ${said.slice(0, 20)}`,
    (w) => w.member.get(w.url(`log?cursor=${said}`)),
    400,
    'invalid',
    'cursor',
  ]),
  [
    'a cursor of 201 letters',
    (w) => w.member.get(w.url(`log?cursor=${'a'.repeat(201)}`)),
    400,
    'invalid',
    'cursor',
  ],
  ...[
    '|',
    'x|1',
    '2026-11-01T00:00:00Z|',
    '2026-11-01T00:00:00Z|-1',
    '2026-11-01T00:00:00Z|1.5',
    '2026-11-01T00:00:00Z|9999999999999999',
    '+275760-09-13T00:00:00.000Z|1',
    '-100000-01-01T00:00:00.000Z|1',
    '0000-01-01T00:00:00.000Z|1',
    "2026-11-01T00:00:00Z|1'; drop table actions;--",
  ].map((said): Row => [
    `a cursor that reads ${said}`,
    (w) => w.member.get(w.url(cursor(said))),
    400,
    'invalid',
    'cursor',
    'newest',
  ]),
  ['a cursor from before everything', (w) => w.member.get(w.url(cursor('2001-01-01T00:00:00.000Z|1'))), 200],
];

export const requestRows: Row[] = [...keys, ...types, ...queries];
