import { addDays, parseCalendarDate, weekdayOf } from '@shared/calendar/calendar-date';
import type { CalendarDate } from '@shared/calendar/calendar-date';
import { lastDayOf, type Month } from '@shared/compliance/month';

/**
 * The weeks that a month touches, Monday first; null for days of the months beside it.
 *
 * @example monthWeeks('2026-02')[0] // six nulls and '2026-02-01', a Sunday
 */
export function monthWeeks(month: Month): readonly (readonly (CalendarDate | null)[])[] {
  const first = parseCalendarDate(`${month}-01`);
  const last = lastDayOf(month);
  const weeks: (CalendarDate | null)[][] = [];
  for (
    let monday = addDays(first, -weekdayOf(first));
    monday <= last;
    monday = addDays(monday, 7)
  ) {
    weeks.push(
      Array.from({ length: 7 }, (_, weekday) => {
        const day = addDays(monday, weekday);
        return day < first || day > last ? null : day;
      }),
    );
  }
  return weeks;
}
