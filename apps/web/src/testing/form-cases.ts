import { fireEvent, screen } from '@testing-library/react';
import type { ChemistryView, LogEntry, NeedsYouRow } from '../shared/api/types.js';
import type { Handler } from './fake-api.js';
import { actionView, bottle, fixer } from './fixtures.js';
import { body, inside, order, orderPage, pack } from './order-fixtures.js';

/** A form, how to come to it filled in rightly, and what it must not take. */
export interface FormCase {
  name: string;
  at: string;
  answers: Record<string, Handler>;
  /** 'PUT /darkrooms/harbour/holds/*' */
  request: string;
  fill: () => Promise<void>;
  button: string;
  /** Fields and what stands in them once it is filled in. */
  kept: Record<string, string>;
  /** The server's name of a field, and the label of the form's. */
  objection?: readonly [field: string, label: string];
  bad: readonly (readonly [label: string, text: string, says: RegExp])[];
  /** A sheet closes while nobody knows, and the strip keeps what was done. */
  strip?: string;
}

const held = bottle({ code: 'FX-01', document: fixer, hold: 'cloudy' });
const sound = bottle({ code: 'FX-01', document: fixer });
const page = (shown: typeof held) =>
  body({ bottle: shown, document: fixer, history: [], today: '2026-12-01' });
const bottleAt = (shown: typeof held) => ({ ...inside, 'GET /darkrooms/harbour/bottles/FX-01': page(shown) });

const chemistry: ChemistryView = {
  id: 'c-1',
  versionId: 'v-1',
  number: 1,
  document: fixer,
  nextCode: 'FX-02',
  from: [],
};
const voidable: LogEntry = {
  action: { ...actionView('a-1', 'load'), by: { membershipId: 'm-2', displayName: 'Tomas' } },
  sentence: 'put 2 rolls of 135 through FX-01',
  codes: [],
  flags: [],
};
const reported: NeedsYouRow = {
  kind: 'load-to-decide',
  eventId: 'e-1',
  crossing: 1,
  verb: 'decide',
  sentence: 'A load was reported.',
  why: '',
  mailedTo: 0,
  openedAt: '2026-12-01T09:00:00.000Z',
  load: { actionId: 'a-1', by: 'Tomas', sentence: '1 roll of 135 through FX-01' },
};

const type = async (label: string | RegExp, text: string): Promise<void> => {
  fireEvent.change(await screen.findByLabelText(label), { target: { value: text } });
};
const press = async (name: string | RegExp): Promise<void> => {
  fireEvent.click(await screen.findByRole('button', { name }));
};
const long = 'x'.repeat(301);

/** The same rules for every sheet that asks for a reason. */
const reasonCase = (
  given: Pick<FormCase, 'name' | 'at' | 'answers' | 'request' | 'button' | 'strip'> & {
    label: string;
    missing: RegExp;
    open: () => Promise<void>;
  },
): FormCase => ({
  ...given,
  fill: async () => {
    await given.open();
    await type(given.label, 'smells of eggs');
  },
  kept: { [given.label]: 'smells of eggs' },
  objection: ['content.reason', given.label],
  bad: [
    [given.label, '', given.missing],
    [given.label, '   ', given.missing],
    [given.label, long, /^300 characters at the most; this is 301\.$/],
  ],
});

const count = 'Whole packs, ';
export const formCases: FormCase[] = [
  {
    name: 'signing in',
    at: '/sign-in',
    answers: { 'GET /me': () => ({ status: 401, body: { code: 'signed-out' } }) },
    request: 'POST /sign-in',
    fill: async () => {
      await type('E-mail address', 'ines@example.org');
      await type('Passphrase', 'a long enough phrase');
    },
    button: 'Sign in',
    kept: { 'E-mail address': 'ines@example.org', Passphrase: 'a long enough phrase' },
    objection: ['passphrase', 'Passphrase'],
    bad: [
      ['E-mail address', '', /^Your e-mail address\.$/],
      ['Passphrase', '', /^Your passphrase\.$/],
    ],
  },
  reasonCase({
    name: 'a hold',
    at: '/d/harbour/bottles/FX-01?do=hold',
    answers: bottleAt(sound),
    request: 'PUT /darkrooms/harbour/holds/*',
    button: 'Put FX-01 on hold',
    strip: 'FX-01 is on hold.',
    label: 'What is wrong with it',
    missing: /^Say what is wrong/,
    open: () => Promise.resolve(),
  }),
  reasonCase({
    name: 'a release',
    at: '/d/harbour/bottles/FX-01?do=release',
    answers: bottleAt(held),
    request: 'PUT /darkrooms/harbour/releases/*',
    button: 'Release FX-01',
    strip: 'FX-01 is released.',
    label: 'Why it may be used again',
    missing: /^Say why/,
    open: () => Promise.resolve(),
  }),
  reasonCase({
    name: 'a void',
    at: '/d/harbour/log',
    answers: { ...inside, 'GET /darkrooms/harbour/log': body({ entries: [voidable], nextCursor: null }) },
    request: 'PUT /darkrooms/harbour/voids/*',
    button: 'Void it',
    strip: 'Undone: put 2 rolls of 135 through FX-01.',
    label: 'Why Tomas’s “put 2 rolls of 135 through FX-01” is taken off',
    missing: /^Say why/,
    open: () => press(/^Void: /),
  }),
  reasonCase({
    name: 'a decision',
    at: '/d/harbour/needs-you',
    answers: { ...inside, 'GET /darkrooms/harbour/needs-you': body({ open: [reported] }) },
    request: 'PUT /darkrooms/harbour/decisions/*',
    button: 'Accept the load',
    strip: 'The load of Tomas stands.',
    label: 'Why',
    missing: /^Say why/,
    open: () => press('Decide'),
  }),
  reasonCase({
    name: 'a cancellation',
    at: '/d/harbour/orders/o-2',
    answers: orderPage(order('sent')),
    request: 'PUT /darkrooms/harbour/order-cancellations/*',
    button: 'Cancel the rest and tell Low Quay Supplies',
    strip: 'Order 0002 is cancelled.',
    label: 'Why',
    missing: /^Say why/,
    open: () => press('Cancel the rest'),
  }),
  {
    name: 'a discard',
    at: '/d/harbour/bottles/FX-01?do=discard',
    answers: bottleAt(sound),
    request: 'PUT /darkrooms/harbour/discards/*',
    fill: () => type('Note', 'poured off early'),
    button: 'Discard FX-01',
    strip: 'FX-01 is discarded.',
    kept: { Note: 'poured off early' },
    objection: ['content.note', 'Note'],
    bad: [],
  },
  {
    name: 'a mix',
    at: '/d/harbour/mixing/new',
    answers: {
      ...inside,
      'GET /darkrooms/harbour/chemistries': body({ chemistries: [chemistry] }),
      'GET /darkrooms/harbour/shelf': body({ packs: [] }),
    },
    request: 'PUT /darkrooms/harbour/mixes/*',
    fill: async () => {
      await type('How much', '800');
      await type('Size of it', '1000');
      await type('Note', 'for the Tuesday class');
    },
    button: 'Record FX-02',
    kept: { 'How much': '800', 'Size of it': '1000', Note: 'for the Tuesday class' },
    objection: ['content.volumeUl', 'How much'],
    bad: [
      ...['', '0', '-5', '1.5', '1,5', 'a litre', '1e3', '0x10', ' '].map(
        (text) => ['How much', text, /^A whole number of mL, 1 or more\.$/] as const,
      ),
      ['Size of it', '799', /^It must hold 800 mL at least\.$/],
      ['Size of it', 'big', /^A whole number of mL, 1 or more\.$/],
    ],
  },
  {
    name: 'a delivery by hand',
    at: '/d/harbour/shelf/receive',
    answers: { ...inside, 'GET /darkrooms/harbour/shelf': body({ packs: [pack] }) },
    request: 'PUT /darkrooms/harbour/receipts/*',
    fill: async () => {
      await type('How many came', '2');
      await type('Lot number', 'L-7');
      await type('Note', 'one box was torn');
    },
    button: 'Put on the shelf',
    kept: { 'How many came': '2', 'Lot number': 'L-7', Note: 'one box was torn' },
    objection: ['content.lines.0.lotNumber', 'Lot number'],
    bad: [
      ...['', '0', '-1', '1.5', '10000', 'two'].map(
        (text) => ['How many came', text, new RegExp(`^${count}1 to 999\\.$`)] as const,
      ),
      ['Lot number', '', /^Copy the lot number from the pack\.$/],
      ['Lot number', 'x'.repeat(61), /^60 characters at the most; this is 61\.$/],
    ],
  },
  {
    name: 'a draft',
    at: '/d/harbour/orders/o-2',
    answers: orderPage(order('draft')),
    request: 'PATCH /darkrooms/harbour/orders/*',
    fill: async () => {
      await type(/^Count/, '4');
      await type('Note to the supplier', 'ring twice');
    },
    button: 'Save draft',
    kept: { 'Count of Rapid fixer concentrate, 1 L': '4', 'Note to the supplier': 'ring twice' },
    objection: ['lines.0.count', 'Count of Rapid fixer concentrate, 1 L'],
    bad: ['', '-1', '1.5', '10000', 'four'].map(
      (text) => ['Count of Rapid fixer concentrate, 1 L', text, new RegExp(`^${count}0 to 999\\.$`)] as const,
    ),
  },
  {
    name: 'the sending of an order',
    at: '/d/harbour/orders/o-2',
    answers: orderPage(order('draft')),
    request: 'PUT /darkrooms/harbour/order-sendings/*',
    fill: () => press('Send the order'),
    button: 'Send 3 packs',
    kept: {},
    bad: [],
  },
  {
    name: 'a delivery of an order',
    at: '/d/harbour/orders/o-2',
    answers: orderPage(order('sent')),
    request: 'PUT /darkrooms/harbour/receipts/*',
    fill: () => type('Lot number', 'L-7'),
    button: 'Receive these packs',
    kept: { 'How many came': '3', 'Lot number': 'L-7' },
    objection: ['content.lines.0.count', 'How many came'],
    bad: ['', '-1', '1.5', '10000', 'three'].map(
      (text) => ['How many came', text, new RegExp(`^${count}0 to 999\\.$`)] as const,
    ),
  },
];
