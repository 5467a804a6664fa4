import { v7 } from 'uuid';
import type { Answer, Row } from './table.js';
import type { World } from './world.js';

type Asked = PromiseLike<Answer | (() => PromiseLike<Answer>)>;

/** A field of words: where it stands, how long it may be, and how to ask with these words in it. */
interface Words {
  what: string;
  field: string;
  max: number;
  /** It may be left empty. */
  empty?: true;
  status?: number;
  /** `fresh`: what it is about is made for it first; a refusal of the words needs nothing to be there. */
  ask: (world: World, text: string, fresh: boolean) => Asked;
}

const held = async (w: World, text: string, fresh: boolean, what: 'holds' | 'releases') => {
  const bottleId = fresh ? await w.bottle() : v7();
  if (fresh && what === 'releases')
    await w.put(w.member, 'holds', { bottleId, reason: 'cloudy' }).expect(201);
  return () => w.put(w.technician, what, { bottleId, reason: text });
};

const loaded = async (w: World, fresh: boolean) => {
  const id = v7();
  if (fresh) await w.put(w.member, 'loads', w.load({ reported: true }), { id }).expect(201);
  return id;
};

const decided = async (w: World, text: string, fresh: boolean) => {
  const loadActionId = await loaded(w, fresh);
  return () => w.put(w.technician, 'decisions', { loadActionId, decision: 'accept', reason: text });
};

const drafted = async (w: World, fresh: boolean, then: (orderId: string) => PromiseLike<Answer>) => {
  const orderId = fresh ? (await w.house.draft()).orderId : v7();
  return () => then(orderId);
};

const guest = (w: World, change: object) =>
  w.put(
    w.member,
    'loads',
    w.load({
      film: [
        w.film({ owner: { guest: { id: v7(), name: 'Otto', reach: 'otto@guest.example', ...change } } }),
      ],
    }),
  );

const fields: Words[] = [
  {
    what: 'why a bottle is held',
    field: 'content.reason',
    max: 300,
    ask: (w, text, fresh) => held(w, text, fresh, 'holds'),
  },
  {
    what: 'why it is let go',
    field: 'content.reason',
    max: 300,
    ask: (w, text, fresh) => held(w, text, fresh, 'releases'),
  },
  { what: 'why a load is accepted', field: 'content.reason', max: 500, ask: decided },
  {
    what: 'a guest’s name',
    field: 'content.film.0.owner.guest.name',
    max: 120,
    ask: (w, name) => guest(w, { name }),
  },
  {
    what: 'how a guest is reached',
    field: 'content.film.0.owner.guest.reach',
    max: 200,
    ask: (w, reach) => guest(w, { reach }),
  },
  {
    what: 'a load’s note',
    field: 'content.note',
    max: 500,
    empty: true,
    ask: (w, note) => w.put(w.member, 'loads', w.load({ note })),
  },
  {
    what: 'a mix’s note',
    field: 'content.note',
    max: 500,
    empty: true,
    ask: (w, note) => w.put(w.technician, 'mixes', w.mix({ note })),
  },
  {
    what: 'a discard’s note',
    field: 'content.note',
    max: 500,
    empty: true,
    ask: async (w, note, fresh) => {
      const bottleId = fresh ? await w.bottle() : v7();
      return () => w.put(w.technician, 'discards', { bottleId, wasteRoute: 'fixer-silver', note });
    },
  },
  {
    what: 'why something is taken back',
    field: 'content.reason',
    max: 300,
    empty: true,
    ask: async (w, reason, fresh) => {
      const voidedActionId = await loaded(w, fresh);
      return () => w.put(w.member, 'voids', { voidedActionId, reason });
    },
  },
  {
    what: 'a lot’s number',
    field: 'content.lines.0.lotNumber',
    max: 60,
    ask: (w, lotNumber) => w.put(w.technician, 'receipts', w.receipt({ lotNumber })),
  },
  {
    what: 'a receipt’s note',
    field: 'content.note',
    max: 1000,
    ask: (w, note) => w.put(w.technician, 'receipts', { ...w.receipt(), note }),
  },
  {
    what: 'an order’s note',
    field: 'note',
    max: 1000,
    status: 200,
    ask: (w, note, fresh) =>
      drafted(w, fresh, (id) =>
        w.technician.patch(w.url(`orders/${id}`)).send({ revision: 1, note, lines: [] }),
      ),
  },
  {
    what: 'why an order is cancelled',
    field: 'content.reason',
    max: 500,
    ask: (w, reason, fresh) =>
      drafted(w, fresh, (orderId) => w.put(w.manager, 'order-cancellations', { orderId, reason })),
  },
];

const CAMERA = '📷';

/** What is never taken. */
function refused({ max, empty }: Words): [what: string, text: string][] {
  return [
    ['a zero character', 'foggy\u0000'],
    ['a zero character alone', '\u0000'],
    ['half of a picture', 'foggy \ud83d'],
    ['the other half alone', '\udcf7 foggy'],
    ['one letter too many', 'x'.repeat(max + 1)],
    ['one picture too many', CAMERA.repeat(max + 1)],
    ['a letter and marks without end', `x${'\ufe0f'.repeat(max)}`],
    ...(empty
      ? []
      : ([
          ['nothing', ''],
          ['spaces alone', '  \t\n '],
          ['nothing that shows', '\u200b\u200d\u2060\ufeff'],
          ['direction marks alone', '\u200e\u200f\u202e'],
        ] as [string, string][])),
  ];
}

const noText = ['null', '5', 'true', '["x"]', '{}'] as const;

function taken({ max, empty }: Words): [what: string, text: string][] {
  return [
    ['as many letters as may be', 'x'.repeat(max)],
    ['as many pictures as may be', CAMERA.repeat(max)],
    ...(empty ? ([['nothing', '']] as [string, string][]) : []),
  ];
}

function rowsOf(words: Words): Row[] {
  const { what, field, ask, status = 201 } = words;
  return [
    ...refused(words).map(([how, text]): Row => [
      `${what}: ${how}`,
      (w) => ask(w, text, false),
      400,
      'invalid',
      field,
    ]),
    ...noText
      .filter((text) => !(field === 'note' && text === 'null'))
      .map((text): Row => [
        `${what}: ${text} is no text`,
        (w) => ask(w, JSON.parse(text) as string, false),
        400,
        'invalid',
        field,
      ]),
    ...taken(words).map(([how, text]): Row => [`${what}: ${how}`, (w) => ask(w, text, true), status]),
  ];
}

const signIn = (w: World, email: unknown, passphrase: unknown) =>
  w.t.browser().post('/api/sign-in').send({ email, passphrase });

const atTheDoor: Row[] = [
  ...[
    '',
    'ada',
    'ada@',
    '@x.example',
    'a b@x.example',
    'ada@x.example\u0000',
    'ada@x.example\nbcc: all@x.example',
    `${'a'.repeat(300)}@x.example`,
    5,
    null,
    ['ada@x.example'],
    {},
  ].map((email): Row => [
    `signing in as ${JSON.stringify(email).slice(0, 40)}`,
    (w) => signIn(w, email, 'x'),
    400,
    'invalid',
    'email',
  ]),
  ...['', 'x'.repeat(5000), 5, null, ['x'], {}, 'x\u0000'].map((passphrase): Row => [
    `signing in with ${JSON.stringify(passphrase).slice(0, 40)}`,
    (w) => signIn(w, 'ada@x.example', passphrase),
    400,
    'invalid',
    'passphrase',
  ]),
];

export const textRows: Row[] = [...fields.flatMap(rowsOf), ...atTheDoor];
