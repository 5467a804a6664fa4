import { gzipSync } from 'node:zlib';
import { v7 } from 'uuid';
import { nested, post, text, withKey } from './body.js';
import type { Row } from './table.js';
import type { World } from './world.js';

const LIMIT = 256 * 1024;

/** A body of exactly so many bytes: JSON may be followed by space. */
const ofSize = (w: World, bytes: number) => text(w).padEnd(bytes, ' ');

const sizes: Row[] = [
  ['a body as large as is taken', (w) => post(w, ofSize(w, LIMIT)), 201],
  [
    'a body of one byte more',
    (w) => post(w, ofSize(w, LIMIT + 1)),
    413,
    'too-large',
    undefined,
    'more than is accepted',
  ],
  ['a body of 2 MB', (w) => post(w, ofSize(w, 2 * 1024 * 1024)), 413, 'too-large'],
  ['a body that is zipped', (w) => post(w, gzipSync(text(w)), { 'content-encoding': 'gzip' }), 201],
  [
    'a body that is 50 MB once it is unzipped',
    (w) => post(w, gzipSync(Buffer.alloc(50 * 1024 * 1024, ' ')), { 'content-encoding': 'gzip' }),
    413,
    'too-large',
  ],
  [
    'a body that only says that it is zipped',
    (w) => post(w, text(w), { 'content-encoding': 'gzip' }),
    400,
    'malformed',
  ],
];

const broken: Row[] = [
  ['no body', (w) => w.technician.put(w.url(`receipts/${v7()}`)), 400, 'invalid', 'content'],
  ['an empty body', (w) => post(w, ''), 400],
  ['a body of spaces', (w) => post(w, '   '), 400],
  ['a body that breaks off', (w) => post(w, text(w).slice(0, -2)), 400, 'malformed', undefined, 'JSON'],
  ['a body with something behind it', (w) => post(w, `${text(w)}x`), 400, 'malformed'],
  ['a comma too many', (w) => post(w, text(w).replace(/\}$/, ',}')), 400, 'malformed'],
  ['single quotation marks', (w) => post(w, text(w).replaceAll('"', "'")), 400, 'malformed'],
  ['a raw line break inside a text', (w) => post(w, text(w).replace('B-7', 'B\n7')), 400, 'malformed'],
  [
    'bytes that are no UTF-8, read with a mark in their place',
    (w) => post(w, Buffer.from(text(w).replace('B-7', 'B\u00ff7'), 'latin1')),
    201,
  ],
  ['a list', (w) => post(w, '[]'), 400],
  ['a list of the right thing', (w) => post(w, `[${text(w)}]`), 400],
  ['an object with nothing in it', (w) => post(w, '{}'), 400, 'invalid', 'content'],
  ...['null', 'true', '5', '"text"', '""'].map((body): Row => [
    `the body ${body}`,
    (w) => post(w, body),
    400,
  ]),
  ...(['null', '[]', '"text"', '5', '{}', '[{}]', 'true'] as const).map((content): Row => [
    `the content ${content}`,
    (w) =>
      post(w, JSON.stringify({ ...w.told({}), content: 0 }).replace('"content":0', `"content":${content}`)),
    400,
    'invalid',
  ]),
  ...(['null', '[]', '"text"', '{}', '[{}]'] as const).map((envelope): Row => [
    `the envelope ${envelope}`,
    (w) =>
      post(
        w,
        JSON.stringify({ ...w.told(w.receipt()), envelope: 0 }).replace(
          '"envelope":0',
          `"envelope":${envelope}`,
        ),
      ),
    400,
    'invalid',
  ]),
  ...[[null], [[]], ['text'], [5], [{}], [[{}]], [true], null, 'text', {}, { 0: {}, length: 1 }].map(
    (lines): Row => [
      `the lines ${JSON.stringify(lines)}`,
      (w) => post(w, text(w, { lines })),
      400,
      'invalid',
    ],
  ),
  ...[[null], [[]], ['text'], {}, 'text'].map((bottleIds): Row => [
    `the bottles ${JSON.stringify(bottleIds)}`,
    (w) => w.put(w.member, 'loads', w.load({ bottleIds })),
    400,
    'invalid',
    'content.bottleIds',
  ]),
  ...[[null], [[]], ['text'], {}, [[[]]]].map((film): Row => [
    `the film ${JSON.stringify(film)}`,
    (w) => w.put(w.member, 'loads', w.load({ film })),
    400,
    'invalid',
  ]),
  ...[[], 'text', 5, null, { guest: [] }, { guest: 'Otto' }, { guest: null }, { guest: {} }].map(
    (owner): Row => [
      `the owner ${JSON.stringify(owner)}`,
      (w) => w.put(w.member, 'loads', w.load({ film: [w.film({ owner })] })),
      400,
      'invalid',
    ],
  ),
];

const nesting: Row[] = [
  ['lists in lists, ten thousand deep', (w) => post(w, nested(10_000, '[', ']')), 400],
  ['a content of lists, ten thousand deep', (w) => post(w, `{"content":${nested(10_000, '[', ']')}}`), 400],
  ['objects in objects, ten thousand deep', (w) => post(w, nested(10_000, '{"content":', '}', '1')), 400],
  [
    'a note of objects, ten thousand deep',
    (w) => post(w, withKey(w, `"note":${nested(10_000, '{"a":', '}', '1')}`)),
    400,
  ],
  [
    'an unknown field of lists, a hundred thousand deep',
    (w) => post(w, withKey(w, `"x":${nested(100_000, '[', ']')}`)),
    400,
  ],
  [
    'lines of lists, ten thousand deep',
    (w) => post(w, text(w).replace(/"lines":\[/, `"lines":[${nested(10_000, '[', ']')},`)),
    400,
  ],
  ['lists in lists, twenty deep', (w) => post(w, withKey(w, `"x":${nested(20, '[', ']')}`)), 400, 'invalid'],
];

export const bodyRows: Row[] = [...sizes, ...broken, ...nesting];
