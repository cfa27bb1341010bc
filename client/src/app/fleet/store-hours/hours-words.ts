import type { DayHours, StoreHours, WeekdayCode } from '@shared/fleet/store-hours';

/** The week as RFC 5545 section 3.3.10 writes its days, Monday first. */
export const weekdays: readonly WeekdayCode[] = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'];

/** The name of a weekday in the reader's language. */
export function weekdayName(day: WeekdayCode, locale: string, width: 'long' | 'short'): string {
  // 1 January 2024 was a Monday.
  const date = Date.UTC(2024, 0, 1 + weekdays.indexOf(day));
  return new Intl.DateTimeFormat(locale, { weekday: width, timeZone: 'UTC' }).format(date);
}

/** A wall-clock time `HH:MM` as the reader's language writes it. */
export function clockWords(time: string, locale: string): string {
  const [hour = 0, minute = 0] = time.split(':').map(Number);
  const date = Date.UTC(2024, 0, 1, hour, minute);
  return new Intl.DateTimeFormat(locale, { timeStyle: 'short', timeZone: 'UTC' }).format(date);
}

/** The hours of a day: its own where it has them, else the usual ones; null when closed. */
export function dayOf(hours: StoreHours, day: WeekdayCode): DayHours | null {
  const own = hours.byDay?.[day];
  return own === undefined ? hours : own;
}

/** "6:00 AM – 11:00 PM", or that nothing is known. */
export function openWords(day: DayHours | null, locale: string): string {
  if (day === null) return $localize`:@@fleet.hours.closed:closed`;
  if (day.open === null || day.close === null) return $localize`:@@fleet.hours.unknown:not known`;
  return `${clockWords(day.open, locale)} – ${clockWords(day.close, locale)}`;
}

export function rushWords(day: DayHours | null, locale: string): string {
  return (day?.rush ?? [])
    .map(({ from, to }) => `${clockWords(from, locale)} – ${clockWords(to, locale)}`)
    .join(', ');
}

/** The week in runs of days, one after the other, that have the same hours. */
export function runsOfDays(
  hours: StoreHours,
): readonly { first: WeekdayCode; last: WeekdayCode; day: DayHours | null }[] {
  const runs: { first: WeekdayCode; last: WeekdayCode; day: DayHours | null; key: string }[] = [];
  for (const code of weekdays) {
    const day = dayOf(hours, code);
    const key = JSON.stringify(day && [day.open, day.close, day.rush]);
    const before = runs.at(-1);
    if (before?.key === key) before.last = code;
    else runs.push({ first: code, last: code, day, key });
  }
  return runs;
}
