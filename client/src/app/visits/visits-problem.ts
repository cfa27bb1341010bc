import { Problem, toProblem } from '../problems/problem';
import { problemWords } from '../problems/problem-words';

function reasonWords(reason: string): string | undefined {
  switch (reason) {
    case 'not-here':
      return $localize`:@@visits.fault.not-here:This person is not a technician for that store.`;
    case 'past':
      return $localize`:@@visits.fault.past:This day is over.`;
    case 'not-open':
      return $localize`:@@visits.fault.not-open:One of the tasks can no longer be done.`;
    case 'in-visit':
      return $localize`:@@visits.fault.in-visit:One of the tasks is in another visit already.`;
    case 'unknown':
      return $localize`:@@visits.fault.unknown:One of the tasks is not there any more.`;
    case 'other-visits':
      return $localize`:@@visits.fault.other-visits:The day has other visits by now.`;
    default:
      return undefined;
  }
}

/** A failure with the refusals about visits in the reader's words. */
export function visitsProblem(failure: unknown): Problem {
  const problem = toProblem(failure);
  return new Problem(
    problem.status,
    problem.code,
    problem.title,
    problem.detail,
    problem.requestId,
    problem.errors.map((error) => ({
      ...error,
      message: reasonWords(error.reason) ?? error.message,
    })),
  );
}

/** One line for a notice. */
export function visitsFaultLine(failure: unknown): string {
  const problem = visitsProblem(failure);
  const [first] = problem.errors;
  if (first) return first.message;
  switch (problem.code) {
    case 'changed-meanwhile':
      return $localize`:@@visits.fault.changed:Somebody else changed this day meanwhile. It is shown as it is now.`;
    case 'visit-begun':
      return $localize`:@@visits.fault.begun:Work was done on this visit already; it stays where it is.`;
    case 'empty-route':
      return $localize`:@@visits.fault.empty:There is no visit on this day yet.`;
    default: {
      const { title, advice } = problemWords(problem);
      return `${title}. ${advice}`;
    }
  }
}
