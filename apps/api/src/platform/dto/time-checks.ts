import { ValidateBy, type ValidationOptions } from 'class-validator';

/**
 * Years of four digits from 1000, as the OpenAPI document tells them: before that, the ways to write a year and to
 * reckon a zone differ between JavaScript, PostgreSQL and JSON Schema, and no darkroom stood.
 */
export const LOCAL_DATE = String.raw`^[1-9]\d{3}-\d{2}-\d{2}$`;
/**
 * RFC 3339 without its small letters and leap seconds, which no clock here can tell, from 1900 to 2199: a device's clock
 * corrects what it tells, and a difference of thousands of years would lead to times that no calendar writes.
 */
export const INSTANT = String.raw`^(19|20|21)\d{2}-\d{2}-\d{2}T([01]\d|2[0-3]):[0-5]\d:[0-5]\d(\.\d{1,9})?(Z|[+\-]([01]\d|2[0-3]):[0-5]\d)$`;

const date = new RegExp(LOCAL_DATE, 'u');
const instant = new RegExp(INSTANT, 'u');

/** Whether the text is a day that exists, as YYYY-MM-DD, of the years 1000 to 9999. */
export function isLocalDate(value: unknown): value is string {
  if (typeof value !== 'string' || !date.test(value)) return false;
  const [year, month, day] = value.split('-').map(Number);
  const there = new Date(Date.UTC(year ?? 0, (month ?? 0) - 1, day));
  // The calendar rolls 30 February over into March; then the text does not come back.
  return there.toISOString().slice(0, 10) === value;
}

/** Whether the text is a moment with its zone. */
export function isInstant(value: unknown): value is string {
  return typeof value === 'string' && instant.test(value) && isLocalDate(value.slice(0, 10));
}

export const IsLocalDate = (options: ValidationOptions) =>
  ValidateBy({ name: 'isLocalDate', validator: { validate: isLocalDate } }, options);

export const IsInstant = (options: ValidationOptions) =>
  ValidateBy({ name: 'isInstant', validator: { validate: isInstant } }, options);
