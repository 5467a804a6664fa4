import { filmClasses, materials, namedFormats, sheetFormat, wasteRoutes } from '@wetside/chemistry';
import type { Chance } from '@wetside/chemistry/testing';
import { containerKinds } from '@wetside/db';
import {
  anyValues,
  dateTexts,
  idTexts,
  momentTexts,
  strangeNames,
  textEdges,
  textsOfLength,
} from './edge-values.js';
import { withAt } from './schema-values.js';
import type { Json } from './schema.js';

const DATE = /^\d{4}-\d{2}-\d{2}$/;
const MOMENT = /^\d{4}-\d{2}-\d{2}T/;
const ID = /^[0-9a-f]{8}-[0-9a-f]{4}-/i;
const NUMBERS = [
  0, 1, 2, 3, 7, 9, 12, 40, 99, 100, 500, 999, 1_000, 2_000, 500_000, 1_000_000, 100_000_000, 1_000_000_000,
  2_147_483_647,
];
/** Words that go for one another. */
const WORDS: readonly (readonly string[])[] = [
  materials,
  [...namedFormats, sheetFormat],
  filmClasses,
  containerKinds,
  wasteRoutes,
  ['lot', 'opened', 'stock', 'hand'],
];
const SAYINGS = [
  '0611',
  'a',
  'smells wrong',
  '\u{1F600}',
  'é',
  "'; drop table bottles; --",
  '%00',
  'a\r\nbcc: all@example.org',
  'שלום',
  '=1+1',
  '<b>',
  'x'.repeat(60),
];
const DATES = [
  '1000-01-01',
  '1970-01-01',
  '2024-02-29',
  '2026-11-30',
  '2026-12-01',
  '2026-12-02',
  '2030-01-01',
  '9999-12-31',
];
const SECOND = 1_000;
const SHIFTS = [
  1, 60, 119, 120, 121, 299, 301, 3_599, 3_601, 86_400, 86_401, 2_592_000, 2_592_001, 31_536_000, 1e9, 5e9,
];
const LENGTHS = [1, 2, 60, 80, 120, 200, 300, 500, 1_000, 1_001];

/** Every place of a value, the whole of it first. */
function pathsOf(value: Json, path: readonly string[] = []): (readonly string[])[] {
  if (typeof value !== 'object' || value === null) return [path];
  return [path, ...Object.entries(value).flatMap(([key, inner]) => pathsOf(inner, [...path, key]))];
}

const valueAt = (whole: Json, path: readonly string[]): Json =>
  path.reduce<Json>((at, key) => (at as Record<string, Json>)[key] ?? null, whole);

/** How far a change goes: what the first look takes still, the same type, or anything. */
type Manner = 'gentle' | 'alike' | 'wild';

/**
 * A request's body with up to three things changed by chance. Most changes are gentle, so that they get past the first
 * look and to the rules behind it.
 * @param ids live ids of the house
 */
export function mutated(body: Json, by: Chance, ids: readonly string[]): Json {
  const manner = by.pick<Manner>(['gentle', 'gentle', 'gentle', 'gentle', 'alike', 'wild']);
  let changed = body;
  for (let times = by.pick([0, 1, 1, 1, 2, 3]); times > 0; times -= 1) {
    const path = by.pickAny(pathsOf(changed).slice(1)) ?? [];
    if (path.length === 0) continue;
    const there = valueAt(changed, path);
    const roll = manner === 'gentle' ? 100 : by.between(1, 100);
    if (roll <= 10) changed = withAt(changed, [...path.slice(0, -1), by.pickAny(strangeNames) ?? ''], there);
    else if (roll <= 20) changed = withAt(changed, path, undefined);
    else changed = withAt(changed, path, manner === 'wild' ? anything(by) : another(there, by, ids, manner));
  }
  return changed;
}

/** Another value of the same type. */
function another(value: Json, by: Chance, ids: readonly string[], manner: Manner): Json {
  const gentle = manner === 'gentle';
  if (typeof value === 'number') return number(value, by);
  if (typeof value === 'boolean') return !value;
  if (Array.isArray(value)) return list(value, by, gentle);
  if (typeof value !== 'string') return gentle ? value : anything(by);
  if (MOMENT.test(value)) return moment(value, by, gentle);
  if (DATE.test(value)) return by.pickAny(gentle ? DATES : dateTexts) ?? '';
  if (ID.test(value)) return id(value, by, ids, gentle);
  const words = WORDS.find((one) => one.includes(value));
  if (words && gentle) return by.pickAny(words) ?? value;
  return gentle ? (by.pickAny(SAYINGS) ?? value) : text(by);
}

function number(value: number, by: Chance): number {
  const roll = by.between(1, 10);
  if (roll <= 5) return value + by.between(-2, 2);
  if (roll <= 8) return Math.max(1, value * by.pick([2, 3, 10]) + by.between(-1, 1));
  return by.pickAny(NUMBERS) ?? 0;
}

function list(value: Json[], by: Chance, gentle: boolean): Json {
  const [first = null] = value;
  const times = (count: number): Json[] => Array.from({ length: count }, () => first);
  if (gentle)
    return by.pick<Json[]>([times(2), [...value].reverse(), [...value, ...value], times(by.between(1, 8))]);
  return by.pick<Json[]>([[], value.slice(1), times(by.between(0, 45)), [...value, null]]);
}

function moment(value: string, by: Chance, gentle: boolean): string {
  if (!gentle && by.percent(50)) return by.pickAny(momentTexts) ?? '';
  if (by.percent(10))
    return by.pick([
      '1000-01-01T00:00:00Z',
      '9999-12-31T23:59:59.999-23:59',
      '1900-01-01T00:00:00+14:00',
      '2199-12-31T23:59:59.999-23:59',
    ]);
  const shift = (by.pickAny(SHIFTS) ?? 0) * SECOND * by.pick([1, -1, -1]);
  const shifted = new Date(new Date(value).getTime() + shift);
  const zone = by.pick(['Z', 'Z', 'Z', '+00:01', '-00:02', '+05:45']);
  return Number.isNaN(shifted.getTime()) ? value : shifted.toISOString().replace('Z', zone);
}

function id(value: string, by: Chance, ids: readonly string[], gentle: boolean): string {
  if (by.percent(15)) return value.toUpperCase();
  return gentle || by.percent(50) ? (by.pickAny(ids) ?? value) : (by.pickAny(idTexts) ?? '');
}

const text = (by: Chance): string =>
  by.percent(60)
    ? (by.pickAny(textEdges) ?? '')
    : (by.pickAny(textsOfLength(by.pickAny(LENGTHS) ?? 1)) ?? '');

function anything(by: Chance): Json {
  if (by.percent(70)) return by.pickAny(anyValues) ?? null;
  if (by.percent(50)) return text(by);
  let deep: Json = 'deep';
  for (let depth = by.pick([2, 15, 17, 100]); depth > 0; depth -= 1)
    deep = by.percent(50) ? [deep] : { content: deep };
  return deep;
}

/** Fields that may be left out, by the route's last name, added now and then. */
export function filledUp(body: Json, what: string, by: Chance, ids: readonly string[]): Json {
  const said = by.pickAny(SAYINGS) ?? '';
  const more: Readonly<Record<string, Readonly<Record<string, Json>>>> = {
    loads: { reported: true, note: said, lineVersionId: null },
    mixes: { note: said, material: null },
    discards: { note: said },
    voids: { reason: said },
    receipts: { note: said, overDeliveryOk: true, orderId: by.pickAny(ids) ?? '' },
  };
  const [name, value] = by.pickAny(Object.entries(more[what] ?? {})) ?? [];
  return name === undefined || !by.percent(30) ? body : withAt(body, ['content', name], value);
}

/** The body as text, now and then spoilt as no program would write it. */
export function written(body: Json, by: Chance): string {
  const whole = JSON.stringify(body);
  if (by.percent(95)) return whole;
  return by.pick([
    whole.slice(0, by.between(0, whole.length)),
    whole.replace(/\d+/, '1e999'),
    whole.replace(/\d+/, '-0'),
    whole.replace('{', '{"v":1,"content":null,'),
    whole.replace('{', `{"deep":${'['.repeat(10_000)}${']'.repeat(10_000)},`),
    whole.replace(/"(?=[^"]*"$)/, '"\\u0000'),
    whole.replace(/:"/, ':"\\ud800'),
    whole.replace('{', '{"__proto__":{"role":"manager"},'),
    `\ufeff${whole}`,
    `[${whole}]`,
    '[]',
    'null',
    '"text"',
    '',
    `${whole}${' '.repeat(300_000)}`,
  ]);
}

const SEGMENTS = [
  '%00',
  '%',
  '%ff',
  '%ed%a0%80',
  '..',
  '.',
  '%2e%2e',
  '%2F',
  '*',
  "'",
  '%22',
  '%F0%9F%98%80',
  'null',
  '0',
  '-1',
  '%0d%0a',
];
const QUERIES = [
  '',
  '1',
  '0',
  '101',
  '-1',
  'all',
  'draft',
  '%00',
  '%',
  '%ff',
  'a=b',
  '%F0%9F%98%80',
  '1e1',
  'eyJ9',
  "'--",
  '9'.repeat(30),
  'x'.repeat(8_000),
];
const NAMES = [
  'state',
  'limit',
  'cursor',
  'state[]',
  'state[a]',
  '__proto__',
  'limit%00',
  'unknown',
  'toString',
];

/** An address with a part of its path or its query changed, now and then. */
export function strayed(url: string, by: Chance, ids: readonly string[]): string {
  const [path = '', query] = url.split('?');
  const parts = path.split('/');
  if (by.percent(6)) {
    const at = by.between(3, Math.max(3, parts.length - 1));
    const other = by.pick([
      by.pickAny(SEGMENTS),
      by.pickAny(ids),
      parts[at]?.toUpperCase(),
      encodeURIComponent(by.pickAny(idTexts) ?? ''),
    ]);
    if (parts[at] !== undefined) parts[at] = other ?? '';
  }
  const there = parts.join('/');
  if (by.percent(path.includes('/log') || query !== undefined ? 30 : 94))
    return query === undefined ? there : `${there}?${query}`;
  const pairs = Array.from(
    { length: by.between(1, 3) },
    () => `${by.pickAny(NAMES) ?? ''}=${by.pickAny(QUERIES) ?? ''}`,
  );
  return `${there}?${pairs.join('&')}`;
}
