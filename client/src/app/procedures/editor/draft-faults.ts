import { Problem, toProblem } from '../../problems/problem';

/**
 * A refused draft with its faults in the reader's language; what every form can have wrong is worded
 * by the form itself.
 */
export function draftFaults(failure: unknown): Problem {
  const problem = toProblem(failure);
  const errors = problem.errors.map((error) => ({
    ...error,
    message: faultWords(error.reason) ?? error.message,
  }));
  const { status, code, title, detail, requestId } = problem;
  return new Problem(status, code, title, detail, requestId, errors);
}

function faultWords(reason: string): string | null {
  switch (reason) {
    case 'below-low':
      return $localize`:@@procedures.fault.below-low:The upper limit lies below the lower one.`;
    case 'too-few':
      return $localize`:@@procedures.fault.too-few:A choice needs at least two answers.`;
    case 'twice':
      return $localize`:@@procedures.fault.twice:Another one has this name too.`;
    default:
      return null;
  }
}
