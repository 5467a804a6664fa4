import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ProblemError, wordsOf } from '../api/problem.js';

/**
 * Puts an answer that says no into the form: a field's own sentence at the field, the first of them focused,
 * everything else above the button. `fieldFor` turns the server's field names into those of the form's fields that
 * stand on the page; null for one that does not.
 */
export function showProblem<Form extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Form>,
  fieldFor: (field: string, code: string) => FieldPath<Form> | null,
): void {
  const fields = error instanceof ProblemError ? error.fields : [];
  const code = error instanceof ProblemError ? error.code : '';
  const homeless: string[] = [];
  let placed = 0;
  for (const { field, message } of fields) {
    const name = fieldFor(field.replace(/^content\./, ''), code);
    if (!name) homeless.push(message);
    else {
      setError(name, { type: 'server', message }, { shouldFocus: placed === 0 });
      placed += 1;
    }
  }
  if (homeless.length > 0)
    setError('root', { type: 'server', message: [wordsOf(error), ...homeless].join(' ') });
  if (fields.length > 0) return;
  const whole = fieldFor('', code);
  if (whole) setError(whole, { type: 'server', message: wordsOf(error) }, { shouldFocus: true });
  else setError('root', { type: 'server', message: wordsOf(error) });
}
