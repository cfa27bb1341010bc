import { daysBetween, parseCalendarDate } from '@shared/calendar/calendar-date';
import { calendarDay } from '../ui/text/calendar-day';
import type { TodayTask } from './today-api';

/** Minutes as people say them: "50 min", "2 h", "2 h 50 min". */
export function minutesText(minutes: number): string {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  if (hours === 0) return $localize`:@@today.minutes:${rest}:minutes: min`;
  if (rest === 0) return $localize`:@@today.hours:${hours}:hours: h`;
  return $localize`:@@today.hours-minutes:${hours}:hours: h ${rest}:minutes: min`;
}

/** The one thing to know about when: how late it is, or until which day it is on time. */
export function whenText(task: TodayTask, today: string, zone: string, locale: string): string {
  const lastMoment = Date.parse(task.closesAt) - 1;
  const closesOn = new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(lastMoment);
  if (task.state === 'overdue') {
    const late = daysBetween(parseCalendarDate(closesOn), parseCalendarDate(today));
    if (late <= 0) return $localize`:@@today.over-today:over since today`;
    return late === 1
      ? $localize`:@@today.one-day-over:1 day over`
      : $localize`:@@today.days-over:${late}:count: days over`;
  }
  if (task.state !== 'open' && task.state !== 'due-soon') return '';
  const left = daysBetween(parseCalendarDate(today), parseCalendarDate(closesOn));
  if (left === 0) return $localize`:@@today.due-today:due today`;
  // Within the week its name is the shorter and the clearer word.
  const style =
    left < 7 ? ({ weekday: 'long' } as const) : ({ month: 'short', day: 'numeric' } as const);
  return $localize`:@@today.due-by:due by ${calendarDay(closesOn, locale, style)}:day:`;
}

/** Share of the window that is left at `now` (epoch milliseconds): the oil in the task's vat. */
export function windowLeft(task: TodayTask, now: number): number {
  const [opens, closes] = [Date.parse(task.opensAt), Date.parse(task.closesAt)];
  return closes <= opens ? 0 : Math.min(1, Math.max(0, (closes - now) / (closes - opens)));
}
