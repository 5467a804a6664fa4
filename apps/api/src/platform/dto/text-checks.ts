import { ValidateBy, type ValidationOptions } from 'class-validator';

/** NUL, which PostgreSQL keeps in no text, and halves of characters, which no encoding carries. */
const KEEPABLE = String.raw`[^\0\p{Cs}]*$`;
/** Something to be seen somewhere: a name of spaces or of characters without a width is none. */
const SEEN = String.raw`(?=[^]*[^\s\p{Z}\p{Cc}\p{Default_Ignorable_Code_Point}])`;

/** Patterns as the OpenAPI document tells them; they are read with the flag u. */
export const KEPT_TEXT = `^${KEEPABLE}`;
export const SEEN_TEXT = `^${SEEN}${KEEPABLE}`;
export const ANY_UUID = '^[0-9a-fA-F]{8}-([0-9a-fA-F]{4}-){3}[0-9a-fA-F]{12}$';

const ATOM = String.raw`[\p{L}\p{M}\p{N}!#$%&'*+/=?^_\x60{|}~\-]+`;
const LABEL = String.raw`[\p{L}\p{M}\p{N}]([\p{L}\p{M}\p{N}\-]{0,61}[\p{L}\p{M}\p{N}])?`;
const TOP = String.raw`\p{L}[\p{L}\p{M}\p{N}\-]{0,61}[\p{L}\p{M}\p{N}]`;

/** A mail address of plain words, in any script: 64 characters before the @, names of a domain of 63 after it. */
export const MAIL_ADDRESS = String.raw`^(?=[^@]{1,64}@)${ATOM}(\.${ATOM})*@(${LABEL}\.)+${TOP}$`;

/** Characters as PostgreSQL's length() and JSON Schema count them: code points, a smiling face being one. */
export const characters = (text: string): number => [...text].length;

/** Text of so many characters. */
export const HasLength = (min: number, max: number, options: ValidationOptions) =>
  ValidateBy(
    {
      name: 'hasLength',
      validator: {
        validate: (value: unknown) =>
          // A text of more than twice as many UTF-16 units is too long without being counted.
          typeof value === 'string' && value.length <= 2 * max && isBetween(characters(value), min, max),
      },
    },
    options,
  );

/** Text that matches a pattern of the OpenAPI document. */
export const HasShape = (name: string, pattern: string, options: ValidationOptions) => {
  const shape = new RegExp(pattern, 'u');
  const validate = (value: unknown) => typeof value === 'string' && shape.test(value);
  return ValidateBy({ name, validator: { validate } }, options);
};

const isBetween = (count: number, min: number, max: number): boolean => count >= min && count <= max;
