import { Transform } from 'class-transformer';
import { IsBoolean, IsIn, IsInt, Max, Min } from 'class-validator';
import { field, presence, type FieldOptions } from './field-options.js';
import { ANY_UUID, HasLength, HasShape, KEPT_TEXT, MAIL_ADDRESS, SEEN_TEXT } from './text-checks.js';
import { INSTANT, IsInstant, IsLocalDate, LOCAL_DATE } from './time-checks.js';

/** The document's word for: space around the text is cut off before it is looked at. */
const TRIMMED = { 'x-trimmed': true };
/** RFC 5321's limit of a path, without its brackets. */
const MOST_OF_ADDRESS = 254;
/** What `Id` takes, for documents that are written by hand. */
export const ID_SCHEMA = { type: 'string' as const, format: 'uuid', pattern: ANY_UUID };

interface TextOptions extends FieldOptions {
  min?: number;
  max: number;
  /** Space around it is cut off unless this says no (a passphrase). */
  trim?: false;
}

/**
 * Text of so many characters (code points), 1 at the least unless said otherwise. What has to be there has to be seen,
 * too: characters without a width alone do not do.
 */
export function Text({ min = 1, max, trim, ...options }: TextOptions): PropertyDecorator {
  const sentence = min > 0 ? `Write ${min} to ${max} characters.` : `Write at most ${max} characters.`;
  const trims = trim !== false;
  const pattern = trims && min > 0 ? SEEN_TEXT : KEPT_TEXT;
  return field(
    options,
    {
      ...presence(options),
      type: 'string',
      minLength: min,
      maxLength: max,
      pattern,
      ...(trims ? TRIMMED : {}),
    },
    ...(trims ? [Transform(({ value }: { value: unknown }) => trimmed(value))] : []),
    HasLength(min, max, { message: sentence }),
    HasShape('isKeepable', KEPT_TEXT, {
      message: 'There is a character in it that cannot be kept; type it anew.',
    }),
    ...(pattern === SEEN_TEXT ? [HasShape('isSeen', SEEN_TEXT, { message: sentence })] : []),
  );
}

const trimmed = (value: unknown): unknown => (typeof value === 'string' ? value.trim() : value);

interface NumberOptions extends FieldOptions {
  min: number;
  max: number;
  /** Set on query fields, which arrive as text. */
  query?: true;
}

/** A whole number; all amounts are whole in their smallest unit. */
export function WholeNumber({ min, max, query, ...options }: NumberOptions): PropertyDecorator {
  const sentence = `Give a whole number from ${min} to ${max}.`;
  return field(
    options,
    { ...presence(options), type: 'integer', minimum: min, maximum: max },
    ...(query ? [Transform(({ value }: { value: unknown }) => numberFrom(value))] : []),
    IsInt({ message: sentence }),
    Min(min, { message: sentence }),
    Max(max, { message: sentence }),
  );
}

function numberFrom(value: unknown): unknown {
  return typeof value === 'string' && /^-?\d+$/.test(value) ? Number(value) : value;
}

/** A UUID of any version, in small letters from here on. */
export function Id(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), ...ID_SCHEMA },
    Transform(({ value }: { value: unknown }) => (typeof value === 'string' ? value.toLowerCase() : value)),
    HasShape('isId', ANY_UUID, { message: 'Give an id.' }),
  );
}

/** A moment as an ISO 8601 string with its zone, such as 2025-03-01T18:20:00.000Z. */
export function Instant(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'string', format: 'date-time', pattern: INSTANT },
    IsInstant({ message: 'Give a moment with its time zone.' }),
  );
}

/** A day of the darkroom's own calendar, YYYY-MM-DD. */
export function LocalDateField(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'string', format: 'date', pattern: LOCAL_DATE },
    IsLocalDate({ message: 'Give a date that the calendar has.' }),
  );
}

/** One of a closed list, of words or of numbers. */
export function Choice(choices: readonly (string | number)[], options: FieldOptions = {}): PropertyDecorator {
  const type = choices.every((choice) => typeof choice === 'number') ? 'integer' : 'string';
  return field(
    options,
    { ...presence(options), type, enum: [...choices, ...(options.nullable ? [null] : [])] },
    IsIn([...choices], { message: `Choose one of ${choices.join(', ')}.` }),
  );
}

interface FlagOptions extends FieldOptions {
  /** Set on query fields, which arrive as text. */
  query?: true;
}

export function Flag({ query, ...options }: FlagOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'boolean' },
    ...(query
      ? [
          Transform(({ value }: { value: unknown }) =>
            value === 'true' ? true : value === 'false' ? false : value,
          ),
        ]
      : []),
    IsBoolean({ message: 'Say yes or no.' }),
  );
}

/** A mail address, in lower case from here on. */
export function MailAddress(options: FieldOptions = {}): PropertyDecorator {
  const message = 'Write a mail address, such as name@example.org.';
  const shape = { format: 'idn-email', maxLength: MOST_OF_ADDRESS, pattern: MAIL_ADDRESS };
  return field(
    options,
    { ...presence(options), type: 'string', ...shape, ...TRIMMED },
    Transform(({ value }: { value: unknown }) =>
      typeof value === 'string' ? value.trim().toLowerCase() : value,
    ),
    HasLength(0, MOST_OF_ADDRESS, { message }),
    HasShape('isMailAddress', MAIL_ADDRESS, { message }),
  );
}
