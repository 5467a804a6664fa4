import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ProblemError, wordsOf } from '../api/problem.js';

/**
 * Puts an answer that says no into the form: a field's own sentence at the field, the first of them focused,
 * everything else above the button. `fieldFor` turns the server's field names into the form's.
 */
export function showProblem<Form extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Form>,
  fieldFor: (field: string, code: string) => FieldPath<Form> | null,
): void {
  const fields = error instanceof ProblemError ? error.fields : [];
  const code = error instanceof ProblemError ? error.code : '';
  let placed = 0;
  for (const { field, message } of fields) {
    const name = fieldFor(field.replace(/^content\./, ''), code);
    if (!name) continue;
    setError(name, { type: 'server', message }, { shouldFocus: placed === 0 });
    placed += 1;
  }
  const whole = placed === 0 ? fieldFor('', code) : null;
  if (whole) setError(whole, { type: 'server', message: wordsOf(error) }, { shouldFocus: true });
  else if (placed === 0) setError('root', { type: 'server', message: wordsOf(error) });
}
