import type { FieldError } from '../problem';
import { recurrenceProblems } from './recurrence-problems';
import type { RuleDefinition } from './rule-definition';

/** What keeps a rule from being used, beyond the shape of its fields; each names its part. */
export function ruleFaults(rule: RuleDefinition): FieldError[] {
  return recurrenceProblems(rule.recurrence).map((problem) => ({
    field: `recurrence.${problem.field}`,
    reason: problem.code,
    message: problem.message,
    params: { part: problem.part, ...problem.params },
  }));
}
