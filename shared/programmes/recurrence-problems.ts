import { recurrenceProblems as problemsOfSet } from '../recurrence/feasibility';
import type { RuleProblem } from '../recurrence/rule-problem';
import { asRecurrenceSet, type Recurrence } from './recurrence-set';

/** A fault of a recurrence, and where it stands. */
export interface RecurrenceProblem extends RuleProblem {
  /** The rule text at fault, `rrules.0`; `rrules` where only all of them together are. */
  readonly field: string;
}

/** Most tasks of one rule on one day at one place; an hourly check is the busiest there is. */
export const MOST_PER_DAY = 24;

/** Everything that is wrong with a recurrence; empty when it can be used. */
export function recurrenceProblems(recurrence: Recurrence): RecurrenceProblem[] {
  const set = asRecurrenceSet(recurrence);
  const limits = { mostPerDay: MOST_PER_DAY };
  const problems = set.rrules.flatMap((text, index) =>
    problemsOfSet({ ...set, rrules: [text] }, limits).map((problem) => ({
      field: `rrules.${index}`,
      ...problem,
    })),
  );
  if (problems.length > 0 || set.rrules.length === 1) return problems;
  return problemsOfSet(set, limits).map((problem) => ({ field: 'rrules', ...problem }));
}
