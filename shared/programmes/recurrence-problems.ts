import { isProblems, parseRule } from '../recurrence/parse-rule';
import type { RuleProblem } from '../recurrence/rule-problem';
import type { Recurrence } from './recurrence-set';

/** A fault of one rule text of a recurrence. */
export interface RecurrenceProblem extends RuleProblem {
  /** Which rule text: `rrules.0`. */
  readonly field: string;
}

/** Everything that is wrong with a recurrence's rule texts; empty when it can be used. */
export function recurrenceProblems(recurrence: Recurrence): RecurrenceProblem[] {
  return recurrence.rrules.flatMap((text, index) => {
    const parsed = parseRule(text);
    return isProblems(parsed)
      ? parsed.map((problem) => ({ field: `rrules.${index}`, ...problem }))
      : [];
  });
}
