import { daysBetween, parseCalendarDate } from '@shared/calendar/calendar-date';
import type { Task } from '../tasks-api';

/** A calendar date for the eye, the same in every zone. */
export function dayText(
  date: string,
  locale: string,
  options: Intl.DateTimeFormatOptions = { weekday: 'short', month: 'short', day: 'numeric' },
): string {
  // Noon UTC of that day, written in UTC: no zone can move it to the day before.
  return new Intl.DateTimeFormat(locale, { ...options, timeZone: 'UTC' }).format(
    new Date(`${date}T12:00:00Z`),
  );
}

/** What a wall clock in the store shows when the task is due: day, and time of day. */
export function dueClock(task: Pick<Task, 'dueLocal'>, locale: string): string {
  return new Intl.DateTimeFormat(locale, {
    dateStyle: 'medium',
    timeStyle: 'short',
    timeZone: 'UTC',
  }).format(new Date(`${task.dueLocal}Z`));
}

/**
 * The one thing to know about when, beside the state: how late it is, or until when it is on time.
 *
 * @param today the date of the store
 */
export function urgencyText(
  task: Pick<Task, 'state' | 'closesOn' | 'outcomeAt' | 'deferredFrom'>,
  today: string,
  locale: string,
): string {
  if (task.state !== 'overdue') {
    const last = dayText(task.closesOn, locale);
    return $localize`:@@tasks.until:to ${last}:day:`;
  }
  const late = daysBetween(parseCalendarDate(task.closesOn), parseCalendarDate(today));
  return late === 1
    ? $localize`:@@tasks.one-day-over:1 day over`
    : $localize`:@@tasks.days-over:${late}:count: days over`;
}

/** Share of the window that is left at `now`: the level of oil in the task's sign. */
export function windowLeft(task: Pick<Task, 'opensAt' | 'closesAt'>, now: number): number {
  const [opens, closes] = [Date.parse(task.opensAt), Date.parse(task.closesAt)];
  if (closes <= opens) return 0;
  return Math.min(1, Math.max(0, (closes - now) / (closes - opens)));
}
