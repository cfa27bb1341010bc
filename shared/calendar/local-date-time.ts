import {
  type CalendarDate,
  fromDayNumber,
  isCalendarDate,
  toDayNumber,
  TWO_DIGITS,
} from './calendar-date';

declare const localDateTime: unique symbol;

/**
 * What a wall clock shows, `YYYY-MM-DDTHH:MM:SS`, without a zone. It becomes an instant only
 * together with a time zone (`instantOf`), and the two types never mix.
 */
export type LocalDateTime = string & { readonly [localDateTime]: true };

/**
 * A wall-clock time as a number for arithmetic: seconds since 1970-01-01T00:00:00 on that same
 * clock, every day 86 400 of them. Not an instant: no zone has been applied.
 */
export type WallSeconds = number;

export const SECONDS_PER_DAY = 86_400;

/** The time of day written last: the occurrences of a schedule mostly share theirs. */
let clockSecond = 0;
let clock = 'T00:00:00';

/** Wall-clock seconds of a local date-time. */
export function toWallSeconds(local: LocalDateTime): WallSeconds {
  return (
    toDayNumber(local.slice(0, 10) as CalendarDate) * SECONDS_PER_DAY +
    +local.slice(11, 13) * 3600 +
    +local.slice(14, 16) * 60 +
    +local.slice(17, 19)
  );
}

/** The local date-time of wall-clock seconds; the inverse of {@link toWallSeconds}. Years 0–9999. */
export function fromWallSeconds(wall: WallSeconds): LocalDateTime {
  const day = Math.floor(wall / SECONDS_PER_DAY);
  const second = wall - day * SECONDS_PER_DAY;
  if (second !== clockSecond) {
    const hours = Math.floor(second / 3600);
    const minutes = Math.floor((second - hours * 3600) / 60);
    clockSecond = second;
    clock = `T${TWO_DIGITS[hours]}:${TWO_DIGITS[minutes]}:${TWO_DIGITS[second % 60]}`;
  }
  return (fromDayNumber(day) + clock) as LocalDateTime;
}

/**
 * Reads `YYYY-MM-DDTHH:MM` or `YYYY-MM-DDTHH:MM:SS` (a space may stand for the T).
 * @throws RangeError naming the text when it is not a date and time of day.
 */
export function parseLocalDateTime(text: string): LocalDateTime {
  const local = readLocalDateTime(text);
  if (local === null) throw new RangeError(`Not a local date and time: ${text}`);
  return local;
}

/** Like {@link parseLocalDateTime}, with null in place of an error. */
export function readLocalDateTime(text: string): LocalDateTime | null {
  const match = /^(\d{4}-\d\d-\d\d)[T ]([01]\d|2[0-3]):([0-5]\d)(?::([0-5]\d))?$/.exec(text);
  if (!match || !isCalendarDate(match[1] ?? '')) return null;
  return `${match[1]}T${match[2]}:${match[3]}:${match[4] ?? '00'}` as LocalDateTime;
}

/**
 * Reads RFC 5545's form without a zone, `YYYYMMDDTHHMMSS` (section 3.3.5, form 1); null otherwise.
 * Second 60 is read as 59, as section 3.3.12 asks of those who keep no leap seconds.
 */
export function readBasicDateTime(text: string): LocalDateTime | null {
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)$/.exec(text);
  if (!match) return null;
  const [, year, month, day, hours, minutes, seconds] = match;
  return readLocalDateTime(
    `${year}-${month}-${day}T${hours}:${minutes}:${seconds === '60' ? '59' : seconds}`,
  );
}

/** Writes RFC 5545's form without a zone, `YYYYMMDDTHHMMSS` (section 3.3.5, form 1). */
export function writeBasicDateTime(local: LocalDateTime): string {
  return local.replace(/[-:]/g, '');
}

/** The date part. */
export function dateOf(local: LocalDateTime): CalendarDate {
  return local.slice(0, 10) as CalendarDate;
}

/** The time of day, `HH:MM:SS`. */
export function timeOf(local: LocalDateTime): string {
  return local.slice(11);
}

/**
 * A date at a time of day, `HH:MM` or `HH:MM:SS`.
 * @throws RangeError when the time is not one of a 24-hour clock.
 */
export function atTime(date: CalendarDate, time: string): LocalDateTime {
  return parseLocalDateTime(`${date}T${time}`);
}

/** Orders local date-times for `sort`: negative, zero or positive. */
export function compareLocal(a: LocalDateTime, b: LocalDateTime): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
