import type { LocalDateTime } from '../calendar/local-date-time';
import type { RecurrenceSet } from '../recurrence/rule';
import type { RuleDefinition } from './rule-definition';

export type Recurrence = RuleDefinition['recurrence'];

/** A recurrence as it travels and is stored, for the engine. The contract has checked its dates. */
export function asRecurrenceSet(recurrence: Recurrence): RecurrenceSet {
  return {
    startsLocal: recurrence.startsLocal as LocalDateTime,
    rrules: recurrence.rrules,
    rdates: recurrence.rdates as LocalDateTime[],
    exdates: recurrence.exdates as LocalDateTime[],
  };
}
