/** Letters that are written from right to left: Hebrew, Arabic and their neighbours. */
const rightToLeft = /[\u0590-\u08ff\ufb1d-\ufdff\ufe70-\ufefc]/;
const FIRST_STRONG_ISOLATE = '\u2068';
const POP_ISOLATE = '\u2069';

/** The fields that hold what people, darkrooms, suppliers and packs are called. Nothing of them is edited here. */
const names = new Set([
  'by',
  'displayName',
  'draftedBy',
  'holdBy',
  'mixedBy',
  'name',
  'packName',
  'sentBy',
  'supplierName',
]);

const isolated = (text: string): string =>
  rightToLeft.test(text) ? `${FIRST_STRONG_ISOLATE}${text}${POP_ISOLATE}` : text;

/** An answer in which a name written from right to left keeps to itself, and does not turn the sentence around it. */
export function isolateNames(value: unknown, field = ''): unknown {
  if (typeof value === 'string') return names.has(field) ? isolated(value) : value;
  if (Array.isArray(value)) return value.map((one: unknown) => isolateNames(one, field));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, one]) => [key, isolateNames(one, key)]));
}
