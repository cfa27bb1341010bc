import { instantOf } from '@shared/calendar/instant-of';
import type { LocalDateTime } from '@shared/calendar/local-date-time';
import { asRecurrenceSet } from '@shared/programmes/recurrence-set';
import type { RecurrenceSet } from '@shared/recurrence/rule';
import { type WindowTimes, windowOpensAt, windowTimes } from '@shared/recurrence/window';
import {
  type ZonedOccurrence,
  nextZonedOccurrences,
  zonedOccurrencesBetween,
} from '@shared/recurrence/zoned-occurrences';
import type { DueSchedule } from './due-schedules';

/** One occurrence of a rule in a zone with its window; `key` stands for rule, revision and zone. */
export interface TimedOccurrence extends WindowTimes {
  readonly key: string;
  readonly local: LocalDateTime;
}

interface Span {
  readonly from: string;
  readonly to: string;
  readonly occurrences: readonly TimedOccurrence[];
}

/** Rule, revision and zone decide every time of a task; the schedule only cuts a piece out. */
export const keyOf = ({ ruleId, revision, timeZone }: DueSchedule) =>
  `${ruleId} ${revision} ${timeZone}`;

/** Works out the times of tasks once per rule, revision and zone and hands them to every schedule. */
export class TaskTimetable {
  private readonly spans = new Map<string, Span>();

  /** Every occurrence that some schedule of the batch wants; each schedule still takes its own part. */
  occurrencesFor(batch: readonly DueSchedule[]): TimedOccurrence[] {
    const wanted = new Map<string, { schedule: DueSchedule; from: string; to: string }>();
    for (const schedule of batch) {
      if (schedule.ended || schedule.fromLocal >= schedule.toLocal) continue;
      const key = keyOf(schedule);
      const before = wanted.get(key);
      const { fromLocal, toLocal } = schedule;
      wanted.set(key, {
        schedule,
        from: before && before.from < fromLocal ? before.from : fromLocal,
        to: before && before.to > toLocal ? before.to : toLocal,
      });
    }
    return [...wanted].flatMap(([key, { schedule, from, to }]) =>
      this.span(key, schedule, from, to).filter(({ local }) => local >= from && local < to),
    );
  }

  private span(key: string, schedule: DueSchedule, from: string, to: string) {
    const known = this.spans.get(key);
    if (known && known.from <= from && known.to >= to) return known.occurrences;
    const occurrences = timedOccurrences(key, schedule, from, to);
    this.spans.set(key, { from, to, occurrences });
    return occurrences;
  }
}

function timedOccurrences(
  key: string,
  { recurrence, window, timeZone }: DueSchedule,
  from: string,
  to: string,
): TimedOccurrence[] {
  const set = asRecurrenceSet(recurrence);
  const found = zonedOccurrencesBetween(
    set,
    timeZone,
    instantOf(from as LocalDateTime, timeZone),
    instantOf(to as LocalDateTime, timeZone),
  );
  return found.map(({ local }, i) => {
    // Only a plan that stays late until the next one opens asks what comes next.
    const next = window.late === null ? (found[i + 1] ?? following(set, timeZone, found[i])) : null;
    const nextOpensAt = next ? windowOpensAt(next.local, timeZone, window) : null;
    return { key, local, ...windowTimes(local, timeZone, window, nextOpensAt) };
  });
}

function following(
  set: RecurrenceSet,
  timeZone: string,
  last: ZonedOccurrence | undefined,
): ZonedOccurrence | null {
  return last ? (nextZonedOccurrences(set, timeZone, last.instant, 1)[0] ?? null) : null;
}
