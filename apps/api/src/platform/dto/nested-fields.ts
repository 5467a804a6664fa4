import { Transform, Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsIn, IsObject, ValidateNested } from 'class-validator';
import { field, presence, type FieldOptions } from './field-options.js';
import { ID_SCHEMA } from './scalar-fields.js';
import { ANY_UUID, HasShape } from './text-checks.js';

type ClassOf = () => new () => object;

interface ListOptions extends FieldOptions {
  min?: number;
  max: number;
}

function listChecks(min: number, max: number): PropertyDecorator[] {
  const message = min > 0 ? `Give ${min} to ${max} of these.` : `Give at most ${max} of these.`;
  return [IsArray({ message }), ArrayMinSize(min, { message }), ArrayMaxSize(max, { message })];
}

/** Another object, checked by its own class. */
export function Nested(classOf: ClassOf, options: FieldOptions = {}): PropertyDecorator {
  const message = 'Fill this part in.';
  return field(
    options,
    { ...presence(options), type: () => classOf() },
    Type(classOf),
    IsObject({ message }),
    ValidateNested({ message }),
  );
}

/** A list of objects, each checked by its class. */
export function ListOf(classOf: ClassOf, { min = 0, max, ...options }: ListOptions): PropertyDecorator {
  return field(
    options,
    { ...presence(options), type: () => classOf(), isArray: true, minItems: min, maxItems: max },
    Type(classOf),
    ...listChecks(min, max),
    IsObject({ each: true, message: 'Each of these must be filled in.' }),
    ValidateNested({ each: true, message: 'Each of these must be filled in.' }),
  );
}

const inSmallLetters = (value: unknown): unknown => (typeof value === 'string' ? value.toLowerCase() : value);

/** A list of ids. */
export function ListOfIds({ min = 0, max, ...options }: ListOptions): PropertyDecorator {
  return field(
    options,
    {
      ...presence(options),
      type: 'array',
      items: ID_SCHEMA,
      minItems: min,
      maxItems: max,
    },
    Transform(({ value }: { value: unknown }) => (Array.isArray(value) ? value.map(inSmallLetters) : value)),
    ...listChecks(min, max),
    HasShape('isId', ANY_UUID, { each: true, message: 'Each of these must be an id.' }),
  );
}

/** A list out of a closed list. */
export function ListOfChoices(
  choices: readonly string[],
  { min = 0, max, ...options }: ListOptions,
): PropertyDecorator {
  return field(
    options,
    {
      ...presence(options),
      type: 'array',
      items: { type: 'string', enum: [...choices] },
      minItems: min,
      maxItems: max,
    },
    ...listChecks(min, max),
    IsIn([...choices], { each: true, message: `Choose from ${choices.join(', ')}.` }),
  );
}

// An object's `required` names its own properties; whether it may be left out itself has another word.
function openPresence({ optional, nullable }: FieldOptions) {
  return { selfRequired: !optional, ...(nullable ? { nullable } : {}) };
}

/** An object whose inside another schema checks, such as a chemistry's document. */
export function OpenObject(options: FieldOptions = {}): PropertyDecorator {
  return field(
    options,
    { ...openPresence(options), type: 'object', additionalProperties: true },
    IsObject({ message: 'Give an object.' }),
  );
}
