import type { Json } from './schema.js';

const FACE = '\u{1F600}';
/** One picture to the eye, five code points. */
const FAMILY = '\u{1F469}\u200D\u{1F467}\u200D\u{1F466}';

/** Values of every type, for a place where another type belongs. */
export const anyValues: readonly Json[] = [
  ...[null, true, false, 0, -0, 1, -1, 2, 0.5, 1e21, -1e21, 2 ** 31, 2 ** 53, 2 ** 63, Infinity, 1e-7],
  ...['', ' ', '0', '1', 'true', 'null', 'x', '[object Object]'],
  ...[[], {}, [null], [[]], [{}], [0], ['x'], { a: 1 }, { length: 1 }, { '0': {} }],
];

/** Names that a field must not have. */
export const strangeNames = [
  ...[
    'unknown',
    '',
    ' ',
    '0',
    '__proto__',
    'constructor',
    'prototype',
    'toString',
    'valueOf',
    'hasOwnProperty',
  ],
  ...['__defineGetter__', 'toJSON', 'then', 'length', '\0', '\ud800', 'ünknown'],
];

const ID = '0190c8a0-0000-7000-8000-000000000001';
export const idTexts = [
  ...[
    ID,
    ID.toUpperCase(),
    `urn:uuid:${ID}`,
    `{${ID}}`,
    ID.replaceAll('-', ''),
    `${ID}\n`,
    ` ${ID}`,
    `${ID}0`,
  ],
  ...[
    ID.slice(1),
    ID.replace('-7000', '-f000'),
    ID.replace('-8000', '-0000'),
    ID.replace('0', 'g'),
    ID.replace('0', '٠'),
  ],
  ...['00000000-0000-0000-0000-000000000000', 'ffffffff-ffff-ffff-ffff-ffffffffffff', ID.replace('1', '\0')],
];

export const dateTexts = [
  ...[
    '2026-03-01',
    '2024-02-29',
    '2025-02-29',
    '2000-02-29',
    '1900-02-29',
    '2026-02-30',
    '2026-04-31',
    '2026-13-01',
  ],
  ...[
    '2026-00-10',
    '2026-01-00',
    '0000-01-01',
    '0001-01-01',
    '0099-12-31',
    '0999-12-31',
    '1000-01-01',
    '9999-12-31',
  ],
  ...[
    '10000-01-01',
    '+275760-09-13',
    '-000001-01-01',
    '2026-3-1',
    '2026-03-01 ',
    '2026-03-01\n',
    '20260301',
    '2026-060',
  ],
  ...['2026-W10-7', 'infinity', 'today', '٢٠٢٦-٠٣-٠١'],
];

export const momentTexts = [
  ...dateTexts.map((date) => `${date}T00:00:00Z`),
  ...[
    'T24:00:00Z',
    'T23:59:59Z',
    'T23:59:60Z',
    'T23:60:00Z',
    'T12:00Z',
    'T12:00:00',
    'T12:00:00z',
    't12:00:00Z',
  ].map(at),
  ...[
    ' 12:00:00Z',
    'T12:00:00.1Z',
    'T12:00:00.123456789Z',
    'T12:00:00.1234567890Z',
    'T12:00:00.Z',
    'T12:00:00,5Z',
  ].map(at),
  ...[
    'T12:00:00+00:00',
    'T12:00:00-00:00',
    'T12:00:00+23:59',
    'T12:00:00-23:59',
    'T12:00:00+24:00',
    'T12:00:00+14:60',
  ].map(at),
  ...[
    'T12:00:00+0100',
    'T12:00:00+01',
    'T12:00:00 +01:00',
    'T12:00:00Z\n',
    'T12:00:00ZZ',
    'T23:59:60-00:30',
  ].map(at),
  ...[
    '1000-01-01T00:00:00+23:59',
    '1899-12-31T23:59:59Z',
    '1900-01-01T00:00:00+23:59',
    '2199-12-31T23:59:59-23:59',
    '2200-01-01T00:00:00Z',
    '9999-12-31T23:59:59-23:59',
    'Sun, 01 Mar 2026 18:20:00 GMT',
    '1772389200000',
  ],
];

function at(time: string): string {
  return `2026-03-01${time}`;
}

export const mailTexts = [
  ...[
    'ada@example.org',
    ' Ada@Example.ORG ',
    'ada',
    'ada@',
    '@example.org',
    'ada@example',
    'ada@@example.org',
    'a b@example.org',
  ],
  ...[
    'ada.@example.org',
    '.ada@example.org',
    'a..b@example.org',
    'ada+films@example.org',
    '"ada"@example.org',
    'ada@[127.0.0.1]',
  ],
  ...[
    'ada@-example.org',
    'ada@example-.org',
    'ada@exa_mple.org',
    'ada@example.o',
    'ada@example.12',
    'ada@xn--bcher-kva.example',
  ],
  ...[
    'jiří@příklad.example',
    'ada@example.org\nbcc: all@example.org',
    `${'a'.repeat(64)}@example.org`,
    `${'a'.repeat(65)}@example.org`,
  ],
  ...[
    `ada@${'a'.repeat(63)}.org`,
    `ada@${'a'.repeat(64)}.org`,
    `ada@${'a.'.repeat(123)}org`,
    `ada@${'a.'.repeat(124)}org`,
    `${FACE}@example.org`,
  ],
];

export const textEdges = [
  ...[
    '',
    ' ',
    '\n',
    '\t',
    '\u00a0',
    '\u3000',
    '\ufeff',
    '\u2028',
    '\u200b',
    '\u200d\u2060',
    '\ufe0f',
    '\u00ad',
    '\u3164',
    '\u202e',
  ],
  ...[
    '\0',
    'a\0b',
    '\ud800',
    '\udc00',
    'a\ud83d',
    '\ude00a',
    '\udc00\ud800',
    FACE,
    FAMILY,
    'e\u0301',
    '❤\ufe0f',
    'שלום',
    'مرحبا',
  ],
  ...[
    "'; drop table bottles; --",
    "' OR 1=1 --",
    '<script>alert(1)</script>',
    '${7*7}',
    '%00',
    '\\u0000',
    'a\r\nb',
    '\x1b[31m',
    '\x7f',
  ],
  ...['NaN', 'undefined', '-', '1e5', '0x10'],
];

/** Texts of that many characters each, made of letters of one, two and four bytes and of those that people see as one. */
export const textsOfLength = (length: number): string[] =>
  length < 1
    ? ['']
    : [
        ...['a', 'é', '漢', FACE, '\ufffd'].map((letter) => letter.repeat(length)),
        `a${'\ufe0f'.repeat(length - 1)}`,
        `a${'\u0301'.repeat(length - 1)}`,
        ` ${'a'.repeat(length)} `,
        `${'a'.repeat(length)}\u200b`,
        `a${' '.repeat(length - 1)}`,
      ];
