/**
 * A calendar date for the eye, the same in every zone; empty for no date.
 *
 * @example calendarDay('2026-06-10', 'en') // 'Wed, Jun 10'
 */
export function calendarDay(
  date: string | null | undefined,
  locale: string,
  options: Intl.DateTimeFormatOptions = { weekday: 'short', month: 'short', day: 'numeric' },
): string {
  if (!date) return '';
  // Noon UTC of that day, written in UTC: no zone can move it to the day before.
  const noon = new Date(`${date}T12:00:00Z`);
  return new Intl.DateTimeFormat(locale, { ...options, timeZone: 'UTC' }).format(noon);
}
