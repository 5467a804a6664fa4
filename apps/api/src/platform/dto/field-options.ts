import { applyDecorators } from '@nestjs/common';
import { ApiProperty, type ApiPropertyOptions } from '@nestjs/swagger';
import { ValidateIf } from 'class-validator';

/** Whether a field may be left out, and whether it may be null. */
export interface FieldOptions {
  optional?: true;
  nullable?: true;
}

/** A field's presence, for its entry in the OpenAPI document. */
export function presence({ optional, nullable }: FieldOptions): { required: boolean; nullable?: true } {
  return { required: !optional, ...(nullable ? { nullable } : {}) };
}

/** What every kind of field shares: its entry in the OpenAPI document and when its checks are left out. */
export function field(
  options: FieldOptions,
  api: ApiPropertyOptions,
  ...checks: PropertyDecorator[]
): PropertyDecorator {
  const { optional = false, nullable = false } = options;
  return applyDecorators(ApiProperty(api), ...absence(optional, nullable), ...checks);
}

function absence(optional: boolean, nullable: boolean): PropertyDecorator[] {
  if (!optional && !nullable) return [];
  return [
    ValidateIf((_object, value: unknown) => {
      if (optional && value === undefined) return false;
      return !(nullable && value === null);
    }),
  ];
}
