import type { AbstractControl } from '@angular/forms';
import { showInForm } from '../problems/form-problems';
import { Problem, toProblem } from '../problems/problem';
import { problemWords } from '../problems/problem-words';

function fieldReason(field: string, reason: string): string | undefined {
  if (field === 'homePostalCode') {
    return $localize`:@@people.fault.zip:This ZIP code is not known.`;
  }
  if (reason === 'taken') {
    return $localize`:@@people.fault.email-taken:Somebody has this address already.`;
  }
  if (reason === 'unknown') {
    return $localize`:@@people.fault.place:This place is not there any more. Choose another.`;
  }
  return undefined;
}

function detailOf(problem: Problem): string {
  switch (problem.code) {
    case 'beyond-reach':
      return $localize`:@@people.fault.beyond-reach:You can give and take roles only within the places that you administer yourself.`;
    case 'last-administrator':
      return $localize`:@@people.fault.last-administrator:This is the last administrator. Make somebody else administrator of the whole organisation first.`;
    case 'own-account':
      return $localize`:@@people.fault.own-account:This is your own account. Ask another administrator.`;
    case 'not-waiting':
      return $localize`:@@people.fault.not-waiting:No invitation is waiting for this person any more.`;
    default:
      return '';
  }
}

/** A failure with the refusals about people in the reader's words. */
export function peopleProblem(failure: unknown): Problem {
  const problem = toProblem(failure);
  return new Problem(
    problem.status,
    problem.code,
    problem.title,
    detailOf(problem) || problem.detail,
    problem.requestId,
    problem.errors.map((error) => ({
      ...error,
      message: fieldReason(error.field, error.reason) ?? error.message,
      // Our words for the reason are better here than the general ones.
      reason: error.reason === 'taken' ? 'people-taken' : error.reason,
    })),
  );
}

/** {@link showInForm} with the words about people; a role's fault goes to its place. */
export function showPeopleFaults(form: AbstractControl, failure: unknown): readonly string[] {
  const problem = peopleProblem(failure);
  if (detailOf(problem)) return [problem.detail];
  return showInForm(
    form,
    new Problem(
      problem.status,
      problem.code,
      problem.title,
      problem.detail,
      problem.requestId,
      problem.errors.map((error) => ({
        ...error,
        field: error.field.replace(/^(roles\.\d+)$/, '$1.scopeId'),
      })),
    ),
  );
}

/** One line for a notice. */
export function peopleFaultLine(failure: unknown): string {
  const problem = peopleProblem(failure);
  if (detailOf(problem)) return problem.detail;
  const { title, advice } = problemWords(problem);
  return `${title}. ${advice}`;
}

/** Somebody else saved first. */
export const changedMeanwhile = (failure: unknown): boolean =>
  toProblem(failure).code === 'changed-meanwhile';
