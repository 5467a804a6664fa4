import type { ValidationError } from 'class-validator';
import { invalid, type FieldProblem, type Problem } from './problem.js';

/** The validator's tree as a flat list of fields, each with its first complaint. */
export function validationProblem(errors: readonly ValidationError[]): Problem {
  return invalid(flatten(errors, ''));
}

function flatten(errors: readonly ValidationError[], prefix: string): FieldProblem[] {
  return errors.flatMap((error) => {
    const field = prefix === '' ? error.property : `${prefix}.${error.property}`;
    return [...own(error, field), ...flatten(error.children ?? [], field)];
  });
}

function own(error: ValidationError, field: string): FieldProblem[] {
  const [first] = Object.entries(error.constraints ?? {});
  if (!first) return [];
  const [kind, message] = first;
  return [
    { field, message: kind === 'whitelistValidation' ? 'This is not a field here; leave it out.' : message },
  ];
}
