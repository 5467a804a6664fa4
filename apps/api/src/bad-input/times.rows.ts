import { v7 } from 'uuid';
import { DAY, MINUTE } from '../testing/ledger-house.js';
import type { Row } from './table.js';
import type { World } from './world.js';

const SECOND = 1_000;

const NO_MOMENTS = [
  '',
  'now',
  '2026-11-01',
  '2026-11-01T18:20:00',
  '2026-11-01 18:20:00Z',
  '2026-02-30T18:20:00Z',
  '2026-13-01T18:20:00Z',
  '2026-11-01T24:00:00Z',
  '2026-11-01T18:60:00Z',
  '2026-11-01T18:20:60Z',
  '2026-11-01T18:20:00+24:00',
  '2026-11-01T18:20:00Z\u0000',
  '+275760-09-13T00:00:00Z',
  '-000001-01-01T00:00:00Z',
  '0000-01-01T00:00:00Z',
  '1899-12-31T23:59:59Z',
  '2200-01-01T00:00:00Z',
  'infinity',
  1_793_556_000_000,
  null,
  true,
  ['2026-11-01T18:20:00Z'],
  {},
];

const NO_DATES = [
  '',
  'today',
  '2026-02-29',
  '2026-04-31',
  '2026-13-01',
  '2026-1-1',
  '01.02.2026',
  '0000-01-01',
  '2026-11-01T00:00:00Z',
  '10000-01-01',
  20261101,
  true,
  ['2026-11-01'],
];

const shown = (value: unknown) => JSON.stringify(value);

const inEnvelope = (w: World, field: string, value: unknown) => {
  const body = w.told(w.load());
  return w.member
    .put(w.url(`loads/${v7()}`))
    .send({ ...body, envelope: { ...body.envelope, [field]: value } });
};

const sold = (w: World, value: unknown) =>
  w.put(w.technician, 'setting-changes', {
    subject: 'supplier-pack',
    subjectId: w.ids.supplierPackId,
    changes: [{ field: 'outUntil', value }],
  });

const told: Row[] = [
  ...NO_MOMENTS.flatMap((value): Row[] => [
    [
      `a load that happened at ${shown(value)}`,
      (w) => w.put(w.member, 'loads', w.load({ happenedAt: value })),
      400,
      'invalid',
      'content.happenedAt',
      'time zone',
    ],
    [
      `a device’s clock that says ${shown(value)}`,
      (w) => inEnvelope(w, 'deviceNow', value),
      400,
      'invalid',
      'envelope.deviceNow',
      'time zone',
    ],
  ]),
  ['a body sent at no time', (w) => inEnvelope(w, 'sentAt', 'soon'), 400, 'invalid', 'envelope.sentAt'],
  ['a body that waited perhaps', (w) => inEnvelope(w, 'queued', 'yes'), 400, 'invalid', 'envelope.queued'],
  ...NO_DATES.flatMap((value): Row[] => [
    [
      `a lot that is good until ${shown(value)}`,
      (w) => w.put(w.technician, 'receipts', w.receipt({ expiresOn: value })),
      400,
      'invalid',
      'content.lines.0.expiresOn',
      'calendar',
    ],
    [
      `a supplier who is out until ${shown(value)}`,
      (w) => sold(w, value),
      400,
      'invalid',
      'content.changes.0.value',
      'calendar',
    ],
  ]),
  ...['2028-02-29', '1900-01-01', '9999-12-31', null].flatMap((value): Row[] => [
    [
      `a lot that is good until ${shown(value)}`,
      (w) => w.put(w.technician, 'receipts', w.receipt({ expiresOn: value })),
      201,
    ],
    [`a supplier who is out until ${shown(value)}`, (w) => sold(w, value), 201],
  ]),
];

/** A day so far off that the two clocks' difference leads out of all calendars. */
const far = (
  w: World,
  by: 'member' | 'technician',
  what: string,
  content: Record<string, unknown>,
  at: string,
  deviceNow: string,
) => w.put(w[by], what, content, { at: new Date(at), deviceNow: new Date(deviceNow) });
const FIRST = '1900-01-01T00:00:00Z';
const LAST = '2199-12-31T23:59:59Z';

/** Asked while the clock stands still. */
export const boundRows: Row[] = [
  ...(['mixes', 'receipts', 'order-drafts'] as const).flatMap((what): Row[] => {
    const content = (w: World) =>
      what === 'mixes' ? w.mix() : what === 'receipts' ? w.receipt() : w.draft();
    const at = (ms: number) => (w: World) =>
      w.put(w.technician, what, content(w), { at: w.ago(-ms), deviceNow: w.t.clock.now() });
    return [
      [`${what}: 5 minutes ahead`, at(5 * MINUTE), 201],
      [
        `${what}: 5 minutes and a second ahead`,
        at(5 * MINUTE + SECOND),
        422,
        'in-the-future',
        undefined,
        'clock of this device',
      ],
      [`${what}: a year ahead`, at(365 * DAY), 422, 'in-the-future'],
      [`${what}: 30 days back, by a technician`, at(-30 * DAY), 201],
      [`${what}: 31 days back, by a technician`, at(-31 * DAY), 201],
      [
        `${what}: in the year 2199 by a clock of the year 1900`,
        (w) => far(w, 'technician', what, content(w), LAST, FIRST),
        422,
        'in-the-future',
      ],
      [
        `${what}: in the year 1900 by a clock of the year 2199`,
        (w) => far(w, 'technician', what, content(w), FIRST, LAST),
        201,
      ],
    ];
  }),
  [
    'a load in the year 1900 by a clock of the year 2199',
    (w) => far(w, 'technician', 'loads', w.load(), FIRST, LAST),
    422,
  ],
  [
    'a load in the year 1900',
    (w) =>
      w.put(w.technician, 'loads', w.load(), {
        at: new Date('1900-01-01T00:00:00Z'),
        deviceNow: w.t.clock.now(),
      }),
    422,
    'before-the-mix',
    undefined,
    'Correct the time',
  ],
  [
    'a load in the year 1900, by a member',
    (w) => w.put(w.member, 'loads', w.load(), { at: new Date(FIRST), deviceNow: w.t.clock.now() }),
    403,
    'too-long-ago',
    undefined,
    'Ask one',
  ],
  [
    'a hold 5 minutes and a second ahead',
    (w) =>
      w.put(
        w.member,
        'holds',
        { bottleId: w.ids.bottleId, reason: 'cloudy' },
        { at: w.ago(-5 * MINUTE - SECOND), deviceNow: w.t.clock.now() },
      ),
    422,
    'in-the-future',
  ],
  [
    'a load 30 days and a second back, by a member',
    (w) => w.put(w.member, 'loads', w.load(), { at: w.ago(30 * DAY + SECOND), deviceNow: w.t.clock.now() }),
    403,
    'too-long-ago',
    undefined,
    'Ask one',
  ],
  [
    'a load a day and a second before its mix',
    async (w) => {
      const bottleId = await w.bottle();
      return () =>
        w.put(w.member, 'loads', w.load({ bottleIds: [bottleId] }), {
          at: w.ago(DAY + SECOND),
          deviceNow: w.t.clock.now(),
        });
    },
    422,
    'before-the-mix',
    undefined,
    'Correct the time',
  ],
];

export const timeRows = told;
