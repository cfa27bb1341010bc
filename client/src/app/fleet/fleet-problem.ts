import type { AbstractControl } from '@angular/forms';
import { showInForm } from '../problems/form-problems';
import { Problem, toProblem } from '../problems/problem';
import { problemWords } from '../problems/problem-words';

/** The server's refusals about the fleet in the reader's language; others stay as they came. */
function fieldReason(reason: string): string | undefined {
  switch (reason) {
    case 'store-number-taken':
      return $localize`:@@fleet.fault.store-number:Another store of this chain has this number.`;
    case 'unit-tag-taken':
      return $localize`:@@fleet.fault.unit-tag:Another unit of this store has this tag.`;
    case 'in-future':
      return $localize`:@@fleet.fault.in-future:This day has not come yet.`;
    case 'part-fitted':
      return $localize`:@@fleet.fault.part-fitted:The unit has one already. Replace that one, or take it off first.`;
    case 'position-unknown':
      return $localize`:@@fleet.fault.position:This ZIP code is not known. Correct it, or give the position in degrees.`;
    case 'time-zone':
      return $localize`:@@fleet.fault.time-zone:No such time zone.`;
    case 'unknown':
      return $localize`:@@fleet.fault.unknown:Choose one that is in use.`;
    case 'pump-only':
      return $localize`:@@fleet.fault.pump-only:Only a pump has a face with a drain slot or a gasket.`;
    case 'before-fitting':
      return $localize`:@@fleet.fault.before-fitting:It was fitted after this day.`;
    case 'after-removal':
      return $localize`:@@fleet.fault.after-removal:It came off before this day.`;
    default:
      return undefined;
  }
}

function detailOf(problem: Problem): string {
  switch (problem.code) {
    case 'in-use':
      return $localize`:@@fleet.fault.in-use:Stores in use still belong to it. Move or retire them first.`;
    case 'group-retired':
      return $localize`:@@fleet.fault.group-retired:Its chain or region is retired. Restore that first.`;
    case 'store-retired':
      return $localize`:@@fleet.fault.store-retired:The store is retired. Restore it first.`;
    case 'came-off':
      return $localize`:@@fleet.fault.came-off:This part came off already.`;
    default:
      return problem.detail;
  }
}

/** A failure with the fleet's own refusals put into the reader's words. */
export function fleetProblem(failure: unknown): Problem {
  const problem = toProblem(failure);
  return new Problem(
    problem.status,
    problem.code,
    problem.title,
    detailOf(problem),
    problem.requestId,
    problem.errors.map((error) => ({
      ...error,
      message: fieldReason(error.reason) ?? error.message,
    })),
  );
}

/** {@link showInForm} with the fleet's words. */
export function showFleetFaults(form: AbstractControl, failure: unknown): readonly string[] {
  return showInForm(form, fleetProblem(failure));
}

/** Somebody else saved first: the newer version has to be shown beside what was entered. */
export function isConflict(failure: unknown): boolean {
  return toProblem(failure).code === 'changed-meanwhile';
}

/** One line for a notice. */
export function fleetFaultLine(failure: unknown): string {
  const problem = fleetProblem(failure);
  const [first] = problem.errors;
  if (first) return first.message;
  const refused = ['in-use', 'group-retired', 'store-retired', 'came-off'].includes(problem.code);
  if (refused) return problem.detail;
  const { title, advice } = problemWords(problem);
  return `${title}. ${advice}`;
}
