import type { AbstractControl } from '@angular/forms';
import { placeServerErrors } from '../ui/form/server-errors';
import { toProblem } from './problem';
import { fieldWords, problemWords } from './problem-words';

/**
 * Shows a failed write in its form: each field's fault at the field, and the lines that belong to
 * none returned for `<vw-problem-summary [general]>`.
 */
export function showInForm(form: AbstractControl, failure: unknown): readonly string[] {
  const problem = toProblem(failure);
  const left = placeServerErrors(
    form,
    problem.errors.map((error) => ({ field: error.field, words: fieldWords(error) })),
  );
  if (problem.errors.length > 0) return left.map((error) => error.words);
  const words = problemWords(problem);
  const number = words.requestId && problem.status >= 500 ? ` (${words.requestId})` : '';
  return [`${words.title}. ${words.advice}${number}`];
}
