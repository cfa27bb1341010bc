declare const calendarDate: unique symbol;

/** A date without a time or a zone, `YYYY-MM-DD` (proleptic Gregorian). Never an instant. */
export type CalendarDate = string & { readonly [calendarDate]: true };

/** A day of the week counted from Monday (ISO 8601 less one): 0 Monday … 6 Sunday. */
export type Weekday = 0 | 1 | 2 | 3 | 4 | 5 | 6;

/** Year, month (1–12) and day (1–31) of a date. */
export interface CivilDate {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

/** `00` to `99`, so that writing a date needs no padding. */
export const TWO_DIGITS: readonly string[] = Array.from({ length: 100 }, (_, n) =>
  String(n).padStart(2, '0'),
);

/** Days from 1970 to the end of 2069: the dates that a fleet's tasks fall on are written once each. */
const WRITTEN_DAYS = 36_525;
const written: CalendarDate[] = [];

const MONTH_LENGTHS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

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

/** Year, month and day that lie `days` after 1970-01-01; the inverse of {@link dayNumber}. */
export function civilFromDayNumber(days: number): CivilDate {
  const shifted = days + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36524) -
      Math.floor(dayOfEra / 146096)) /
      365,
  );
  const dayOfYear =
    dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const fromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const month = fromMarch < 10 ? fromMarch + 3 : fromMarch - 9;
  return {
    year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0),
    month,
    day: dayOfYear - Math.floor((153 * fromMarch + 2) / 5) + 1,
  };
}

/** Whether the Gregorian year has 366 days. */
export function isLeapYear(year: number): boolean {
  return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
}

/** Days of a month (1–12) of a Gregorian year. */
export function daysInMonth(year: number, month: number): number {
  return month === 2 && isLeapYear(year) ? 29 : (MONTH_LENGTHS[month - 1] ?? 0);
}

/** The weekday of a day number. 1970-01-01 was a Thursday. */
export function weekdayOfDayNumber(days: number): Weekday {
  return ((((days + 3) % 7) + 7) % 7) as Weekday;
}

/** The date that lies `days` after 1970-01-01; the inverse of {@link toDayNumber}. Years 0–9999. */
export function fromDayNumber(days: number): CalendarDate {
  if (days < 0 || days >= WRITTEN_DAYS) return writeDay(days);
  return (written[days] ??= writeDay(days));
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
  if (!isCalendarDate(text)) throw new RangeError(`Not a calendar date: ${text}`);
  return text;
}

/** Whether the text is `YYYY-MM-DD` and a day of the calendar. */
export function isCalendarDate(text: string): text is CalendarDate {
  if (!/^\d{4}-\d\d-\d\d$/.test(text)) return false;
  const [month, day] = [+text.slice(5, 7), +text.slice(8, 10)];
  return month >= 1 && month <= 12 && day >= 1 && day <= daysInMonth(+text.slice(0, 4), month);
}

/** The date so many days later, or earlier when negative. */
export function addDays(date: CalendarDate, days: number): CalendarDate {
  return fromDayNumber(toDayNumber(date) + days);
}

/**
 * The same day so many months later, or the last day of that month where it is shorter.
 *
 * @example addMonths('2026-01-31', 1) // '2026-02-28'
 */
export function addMonths(date: CalendarDate, months: number): CalendarDate {
  const { year, month, day } = civilFromDayNumber(toDayNumber(date));
  const index = year * 12 + month - 1 + months;
  const [toYear, toMonth] = [Math.floor(index / 12), (((index % 12) + 12) % 12) + 1];
  return writeDate(toYear, toMonth, Math.min(day, daysInMonth(toYear, toMonth)));
}

/** Days from `from` to `to`; negative when `to` comes first. */
export function daysBetween(from: CalendarDate, to: CalendarDate): number {
  return toDayNumber(to) - toDayNumber(from);
}

/** Orders dates for `sort`: negative, zero or positive. */
export function compareDates(a: CalendarDate, b: CalendarDate): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** The weekday of a date, from Monday 0 to Sunday 6. */
export function weekdayOf(date: CalendarDate): Weekday {
  return weekdayOfDayNumber(toDayNumber(date));
}

/**
 * Week number and week-numbering year by ISO 8601: weeks start on Monday, and week 1 holds 4 January.
 *
 * @example isoWeek('2027-01-03') // { year: 2026, week: 53 }
 */
export function isoWeek(date: CalendarDate): { readonly year: number; readonly week: number } {
  const day = toDayNumber(date);
  // The Thursday of a week always lies in the year to which the week belongs.
  const thursday = day - weekdayOfDayNumber(day) + 3;
  const { year } = civilFromDayNumber(thursday);
  return { year, week: Math.floor((thursday - dayNumber(year, 1, 1)) / 7) + 1 };
}

function writeDay(days: number): CalendarDate {
  const { year, month, day } = civilFromDayNumber(days);
  return writeDate(year, month, day);
}

function writeDate(year: number, month: number, day: number): CalendarDate {
  const years = `${TWO_DIGITS[Math.floor(year / 100)]}${TWO_DIGITS[year % 100]}`;
  return `${years}-${TWO_DIGITS[month]}-${TWO_DIGITS[day]}` as CalendarDate;
}
