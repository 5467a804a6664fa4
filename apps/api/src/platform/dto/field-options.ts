import { applyDecorators } from '@nestjs/common';
import { ApiProperty, type ApiPropertyOptions } from '@nestjs/swagger';
import { ValidateBy, ValidateIf, type ValidationArguments } from 'class-validator';

/** Whether a field may be left out, and whether it may be null. */
export interface FieldOptions {
  optional?: true;
  nullable?: true;
  /** The field is there, and has to be, when another field of its object has that value; and never else. */
  onlyWith?: { field: string; value: string };
}

/** A field's presence, for its entry in the OpenAPI document. */
export function presence({ optional, nullable, onlyWith }: FieldOptions): {
  required: boolean;
  nullable?: true;
} {
  return { required: !optional && !onlyWith, ...(nullable ? { nullable } : {}) };
}

/** What every kind of field shares: its entry in the OpenAPI document and when its checks are left out. */
export function field(
  options: FieldOptions,
  api: ApiPropertyOptions,
  ...checks: PropertyDecorator[]
): PropertyDecorator {
  return applyDecorators(ApiProperty(api), ...absence(options), ...checks);
}

function absence({ optional, nullable, onlyWith }: FieldOptions): PropertyDecorator[] {
  if (onlyWith) return company(onlyWith);
  if (!optional && !nullable) return [];
  return [
    ValidateIf((_object, value: unknown) => {
      if (optional && value === undefined) return false;
      return !(nullable && value === null);
    }),
  ];
}

function company({ field, value: wanted }: { field: string; value: string }): PropertyDecorator[] {
  const goes = (object: object) => Reflect.get(object, field) === wanted;
  return [
    ValidateIf((object: object, value: unknown) => goes(object) || value !== undefined),
    ValidateBy(
      {
        name: 'goesWith',
        validator: {
          validate: (_value, args?: ValidationArguments) => args !== undefined && goes(args.object),
        },
      },
      { message: `This goes with the ${field} ${wanted} only; leave it out.` },
    ),
  ];
}
