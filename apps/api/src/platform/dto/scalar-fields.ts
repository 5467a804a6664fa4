import { Transform } from 'class-transformer';
import {
  IsBoolean,
  IsEmail,
  IsIn,
  IsInt,
  IsString,
  IsUUID,
  Length,
  Matches,
  Max,
  Min,
} from 'class-validator';
import { field, presence, type FieldOptions } from './field-options.js';
import { IsInstant, IsLocalDate } from './time-checks.js';

interface TextOptions extends FieldOptions {
  min?: number;
  max: number;
  /** Space around it is cut off unless this says no (a passphrase). */
  trim?: false;
  pattern?: { shape: RegExp; sentence: string };
}

/** Text of so many characters, 1 at the least unless said otherwise. */
export function Text({ min = 1, max, trim, pattern, ...options }: TextOptions): PropertyDecorator {
  const sentence = min > 0 ? `Write ${min} to ${max} characters.` : `Write at most ${max} characters.`;
  return field(
    options,
    {
      ...presence(options),
      type: 'string',
      minLength: min,
      maxLength: max,
      ...(pattern ? { pattern: pattern.shape.source } : {}),
    },
    ...(trim === false
      ? []
      : [Transform(({ value }: { value: unknown }) => (typeof value === 'string' ? value.trim() : value))]),
    // One check more than Length needs, for Length alone passes over the sentence for what is not text.
    IsString({ message: sentence }),
    Length(min, max, { message: sentence }),
    ...(pattern ? [Matches(pattern.shape, { message: pattern.sentence })] : []),
  );
}

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

/** A UUID of any version. */
export function Id(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'string', format: 'uuid' },
    IsUUID('all', { message: 'Give an id.' }),
  );
}

/** A moment as an ISO 8601 string with its zone, such as 2025-03-01T18:20:00.000Z. */
export function Instant(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'string', format: 'date-time' },
    IsInstant({ message: 'Give a moment with its time zone.' }),
  );
}

/** A day of the darkroom's own calendar, YYYY-MM-DD. */
export function LocalDateField(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: 'string', format: 'date' },
    IsLocalDate({ message: 'Give a date that the calendar has.' }),
  );
}

/** One of a closed list, of words or of numbers. */
export function Choice(choices: readonly (string | number)[], options: FieldOptions = {}): PropertyDecorator {
  const type = choices.every((choice) => typeof choice === 'number') ? 'integer' : 'string';
  return field(
    options,
    { ...presence(options), type, enum: [...choices] },
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
  return field(
    options,
    { ...presence(options), type: 'string', format: 'email', maxLength: 254 },
    Transform(({ value }: { value: unknown }) =>
      typeof value === 'string' ? value.trim().toLowerCase() : value,
    ),
    IsEmail({}, { message: 'Write a mail address, such as name@example.org.' }),
  );
}
