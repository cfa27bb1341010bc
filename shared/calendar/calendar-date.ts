declare const calendarDate: unique symbol;

/** A date without a time or a zone, `YYYY-MM-DD` (proleptic Gregorian). Never an instant. */
export type CalendarDate = string & { readonly [calendarDate]: true };

/**
 * Days since 1970-01-01 of a proleptic Gregorian date; months count from 1.
 * A day past the month's end runs on into the next month.
 *
 * @example dayNumber(1970, 1, 1) // 0
 * @example dayNumber(2000, 3, 1) // 11017
 */
export function dayNumber(year: number, month: number, day: number): number {
  // Years start in March here, so that the leap day comes last and needs no special case.
  const shifted = month > 2 ? year : year - 1;
  const era = Math.floor(shifted / 400);
  const yearOfEra = shifted - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const leaps = Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100);
  return era * 146097 + yearOfEra * 365 + leaps + dayOfYear - 719468;
}

/** The date that lies `days` after 1970-01-01; the inverse of {@link dayNumber}. */
export function fromDayNumber(days: number): CalendarDate {
  return new Date(days * 86_400_000).toISOString().slice(0, 10) as CalendarDate;
}

/** Days since 1970-01-01 of a calendar date. */
export function toDayNumber(date: CalendarDate): number {
  return dayNumber(+date.slice(0, 4), +date.slice(5, 7), +date.slice(8, 10));
}

/**
 * Reads `YYYY-MM-DD`.
 * @throws RangeError naming the text when it is not a date of the calendar (30 February).
 */
export function parseCalendarDate(text: string): CalendarDate {
  const date = text as CalendarDate;
  if (!/^\d{4}-\d\d-\d\d$/.test(text) || fromDayNumber(toDayNumber(date)) !== text) {
    throw new RangeError(`Not a calendar date: ${text}`);
  }
  return date;
}
