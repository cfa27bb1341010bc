import type { LocalDateTime } from '../calendar/local-date-time';
import { nextOccurrences } from '../recurrence/expand';
import { type RecurrenceProblem, recurrenceProblems } from './recurrence-problems';
import { asRecurrenceSet, type Recurrence } from './recurrence-set';
import { recurrenceWords } from './recurrence-words';

/** What a person sees of a recurrence while writing it. */
export interface RecurrencePreview {
  readonly words: { readonly en: string; readonly es: string } | null;
  readonly next: LocalDateTime[];
  readonly problems: RecurrenceProblem[];
}

/**
 * A recurrence in words with its next dates after a wall-clock time, or what is wrong with it.
 * @param timeZone decides an UNTIL that is written in UTC
 */
export function recurrencePreview(
  recurrence: Recurrence,
  after: LocalDateTime,
  count: number,
  timeZone?: string,
): RecurrencePreview {
  const problems = recurrenceProblems(recurrence);
  if (problems.length > 0) return { words: null, next: [], problems };
  const next = nextOccurrences(asRecurrenceSet(recurrence), after, count, timeZone);
  return { words: recurrenceWords(recurrence), next, problems };
}
