import { v7 } from 'uuid';
import type { Answer, Row } from './table.js';
import type { World } from './world.js';

/** A figure somewhere in a body: where it stands, its bounds, and how to ask with another in its place. */
interface Figure {
  what: string;
  field: string;
  min: number;
  max: number;
  /** `value` is JSON, letter by letter. `fresh`: what it is about is made first; a refusal of the figure needs nothing to be there. */
  ask: (world: World, value: string, fresh: boolean) => PromiseLike<Answer | (() => PromiseLike<Answer>)>;
  /** Statuses at the bounds where they are not 201. */
  atMin?: Partial<{ status: number; code: Row[3] }>;
  atMax?: Partial<{ status: number; code: Row[3] }>;
}

const MARK = '"figure goes here"';
const mark = 'figure goes here';

const action = (
  world: World,
  who: 'manager' | 'member' | 'technician',
  what: string,
  content: Record<string, unknown>,
  value: string,
) => {
  const text = JSON.stringify(world.told(content)).replaceAll(MARK, value);
  const path = `${what}/${v7()}`;
  return world[who].put(world.url(path)).set('content-type', 'application/json').send(text);
};

const sheet = (world: World, sides: Record<string, unknown>) =>
  world.load({ film: [world.film({ format: 'sheet', widthMm: 102, heightMm: 127, ...sides })] });

const figures: Figure[] = [
  {
    what: 'rolls of a load',
    field: 'content.film.0.count',
    min: 1,
    max: 99,
    ask: (w, value) => action(w, 'member', 'loads', w.load({ film: [w.film({ count: mark })] }), value),
  },
  {
    what: 'the width of a sheet',
    field: 'content.film.0.widthMm',
    min: 1,
    max: 2000,
    ask: (w, value) => action(w, 'member', 'loads', sheet(w, { widthMm: mark }), value),
  },
  {
    what: 'the height of a sheet',
    field: 'content.film.0.heightMm',
    min: 1,
    max: 2000,
    ask: (w, value) => action(w, 'member', 'loads', sheet(w, { heightMm: mark }), value),
  },
  {
    what: 'the shape’s version of an action',
    field: 'content.v',
    min: 1,
    max: 1,
    ask: (w, value) => action(w, 'member', 'loads', w.load({ v: mark }), value),
  },
  {
    what: 'the volume of a mix',
    field: 'content.volumeUl',
    min: 1_000,
    max: 1_000_000_000,
    ask: (w, value) => action(w, 'technician', 'mixes', w.mix({ volumeUl: mark }), value),
  },
  {
    what: 'the size of a container',
    field: 'content.container.sizeUl',
    min: 1_000,
    max: 1_000_000_000,
    atMin: { status: 422, code: 'volume-over-container' },
    ask: (w, value) =>
      action(w, 'technician', 'mixes', w.mix({ container: { sizeUl: mark, kind: 'tank' } }), value),
  },
  {
    what: 'packs of a receipt',
    field: 'content.lines.0.count',
    min: 1,
    max: 999,
    ask: (w, value) => action(w, 'technician', 'receipts', w.receipt({ count: mark }), value),
  },
  {
    what: 'the price of a receipt',
    field: 'content.lines.0.priceMinor',
    min: 0,
    max: 100_000_000,
    ask: (w, value) => action(w, 'technician', 'receipts', w.receipt({ priceMinor: mark }), value),
  },
  {
    what: 'packs of a draft',
    field: 'content.lines.0.count',
    min: 1,
    max: 999,
    ask: (w, value) => action(w, 'technician', 'order-drafts', w.draft({ count: mark }), value),
  },
  {
    what: 'packs on a changed line',
    field: 'lines.0.count',
    min: 0,
    max: 999,
    atMin: { status: 200 },
    atMax: { status: 200 },
    ask: (w, value, fresh) => change(w, fresh, { count: mark }, value),
  },
  {
    what: 'the revision of a change',
    field: 'revision',
    min: 1,
    max: 2_147_483_647,
    atMin: { status: 200 },
    atMax: { status: 409, code: 'order-changed' },
    ask: (w, value, fresh) => change(w, fresh, {}, value, mark),
  },
  {
    what: 'the revision of a sending',
    field: 'content.revision',
    min: 1,
    max: 2_147_483_647,
    atMax: { status: 409, code: 'order-changed' },
    ask: async (w, value, fresh) => {
      const orderId = fresh ? (await w.house.draft()).orderId : v7();
      return () => action(w, 'manager', 'order-sendings', { orderId, revision: mark }, value);
    },
  },
];

async function change(w: World, fresh: boolean, line: object, value: string, revision: unknown = 1) {
  const { orderId, concentrate } = fresh ? await w.house.draft() : { orderId: v7(), concentrate: v7() };
  const lines = [{ id: concentrate, supplierPackId: w.house.soldConcentrate, count: 1, ...line }];
  const text = JSON.stringify({ revision, lines }).replaceAll(MARK, value);
  return () =>
    w.technician
      .patch(w.url(`orders/${orderId}`))
      .set('content-type', 'application/json')
      .send(text);
}

function wrong({ min, max }: Figure): [what: string, value: string][] {
  return [
    ['one less than the least', String(min - 1)],
    ['one more than the most', String(max + 1)],
    ['below nothing', '-1'],
    ['a fraction', String(min + 0.5)],
    ['a small fraction', `${max}.001`],
    ['text', `"${min}"`],
    ['a number beyond all numbers', '1e309'],
    ['nothing', 'null'],
    ['yes', 'true'],
    ['a list of one', `[${min}]`],
  ];
}

/** A price may be null: there is none. */
const taken = ({ field }: Figure, value: string): boolean => field.endsWith('priceMinor') && value === 'null';

function rowsOf(figure: Figure): Row[] {
  const { what, field, min, max, ask } = figure;
  const bad = wrong(figure)
    .filter(([, value]) => !taken(figure, value))
    .map(([how, value]): Row => [
      `${what}: ${how}, ${value}`,
      (w) => ask(w, value, false),
      400,
      'invalid',
      field,
      'whole number',
    ]);
  const edge = (
    value: number,
    { status = 201, code }: Partial<{ status: number; code: Row[3] }> = {},
  ): Row => [`${what}: ${value} is within bounds`, (w) => ask(w, String(value), true), status, code];
  return [...bad, edge(min, figure.atMin), edge(max, figure.atMax)];
}

const notJson = ['NaN', 'Infinity', '-Infinity', '0x10', '01', '+1', '1.', '.5', "'1'"].map((value): Row => [
  `rolls of a load: ${value} is no JSON`,
  (w) => action(w, 'member', 'loads', w.load({ film: [w.film({ count: mark })] }), value),
  400,
  'malformed',
]);

const limits = (
  [
    ['0', 400],
    ['101', 400],
    ['-1', 400],
    ['1.5', 400],
    ['ten', 400],
    ['', 400],
    ['1', 200],
    ['100', 200],
  ] as const
).map(([limit, status]): Row => [
  `entries of a page of the log: ${limit || 'empty'}`,
  (w) => w.member.get(w.url(`log?limit=${limit}`)),
  status,
  status === 400 ? 'invalid' : undefined,
  status === 400 ? 'limit' : undefined,
]);

export const countRows: Row[] = [
  ...figures.flatMap(rowsOf),
  ...notJson,
  ...limits,
  [
    'rolls of a load: ten thousand',
    (w) => action(w, 'member', 'loads', w.load({ film: [w.film({ count: mark })] }), '10000'),
    400,
    'invalid',
    'content.film.0.count',
    '1 to 99',
  ],
];
