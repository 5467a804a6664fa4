import { ValidateBy, type ValidationOptions } from 'class-validator';

const DATE = /^(\d{4})-(\d{2})-(\d{2})$/;
const INSTANT =
  /^(\d{4}-\d{2}-\d{2})T([01]\d|2[0-3]):[0-5]\d:[0-5]\d(\.\d{1,9})?(Z|[+-]([01]\d|2[0-3]):[0-5]\d)$/;

/** Whether the text is a day that exists, as YYYY-MM-DD. */
export function isLocalDate(value: unknown): value is string {
  const parts = typeof value === 'string' ? DATE.exec(value) : null;
  if (!parts) return false;
  const [year, month, day] = parts.slice(1).map(Number);
  const date = new Date(Date.UTC(year ?? 0, (month ?? 0) - 1, day));
  // The calendar rolls 30 February over into March; then the text does not come back.
  return date.toISOString().slice(0, 10) === value;
}

/** Whether the text is a moment with its zone. */
export function isInstant(value: unknown): value is string {
  const parts = typeof value === 'string' ? INSTANT.exec(value) : null;
  return parts !== null && isLocalDate(parts[1]);
}

export const IsLocalDate = (options: ValidationOptions) =>
  ValidateBy({ name: 'isLocalDate', validator: { validate: isLocalDate } }, options);

export const IsInstant = (options: ValidationOptions) =>
  ValidateBy({ name: 'isInstant', validator: { validate: isInstant } }, options);
