import { addDays, type CalendarDate, daysBetween } from '../calendar/calendar-date';
import { dateAt, instantOf, localAt } from '../calendar/instant-of';
import { atTime, timeOf } from '../calendar/local-date-time';
import { NEVER_LAPSES, type WindowTimes } from '../recurrence/window';

/** How many days after the day on which it was first due a task may be put off, all deferrals together. */
export const MOST_DAYS_DEFERRED = 90;

/**
 * The times of a task whose window counts days, put off to the day `dueOn`: it is due at the same
 * time of day, and due soon, close and lapse move on by as many calendar days. It opens when it did,
 * as nobody minds it being done early.
 *
 * @param times epoch milliseconds, as the task has them now
 * @param tzid the store's zone
 *
 * @example
 * // Due Wednesday 10 June at 09:00 in Chicago, two days either side, put off to Monday the 15th:
 * // opens Monday the 8th as before, is due on the 15th at 09:00, closes on the 17th at 24:00.
 */
export function deferredTimes(times: WindowTimes, tzid: string, dueOn: CalendarDate): WindowTimes {
  const days = daysBetween(times.dueOn, dueOn);
  const midnight = (date: CalendarDate) => instantOf(atTime(date, '00:00'), tzid);
  const later = (instant: number) => midnight(addDays(dateAt(instant, tzid), days));
  const closesOn = addDays(times.closesOn, days);
  const dueAt = instantOf(atTime(dueOn, timeOf(localAt(times.dueAt, tzid))), tzid);
  const closesAt = Math.max(midnight(addDays(closesOn, 1)), dueAt);
  const lapsesAt = times.lapsesAt >= NEVER_LAPSES ? NEVER_LAPSES : later(times.lapsesAt);
  return {
    opensAt: times.opensAt,
    dueSoonAt: Math.min(Math.max(later(times.dueSoonAt), times.opensAt), closesAt),
    dueAt,
    closesAt,
    lapsesAt: Math.max(lapsesAt, closesAt),
    dueOn,
    closesOn,
  };
}
