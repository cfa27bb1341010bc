import { dayNumber, isLeapYear, weekdayOfDayNumber } from '../calendar/calendar-date';
import type { ResolvedParts } from './implied-parts';
import type { RuleDay } from './rule';

/** Whether a day passes the parts that count within a year; days are day numbers (since 1970). */
export type YearDayTest = (day: number) => boolean;

/**
 * The test of BYYEARDAY, BYWEEKNO and, with `ordinalsInYear`, numbered weekdays for the days of one
 * year; null where the rule has none of them.
 *
 * A day belongs to the interval of its calendar year, so 30 December may be in week 1 of the next
 * year and still an occurrence of this one: with INTERVAL above 1 the standard leaves open which year
 * such a week belongs to.
 */
export function yearDayTests(
  parts: ResolvedParts,
  weekStart: number,
  ordinalsInYear: boolean,
): ((year: number) => YearDayTest) | null {
  const { byYearDay, byWeekNo } = parts;
  const days = ordinalsInYear ? parts.byDay : [];
  if (byYearDay.length === 0 && byWeekNo.length === 0 && days.length === 0) return null;
  return (year) => {
    const first = dayNumber(year, 1, 1);
    const length = isLeapYear(year) ? 366 : 365;
    return (day) =>
      (byYearDay.length === 0 || inYear(byYearDay, day - first, length)) &&
      (byWeekNo.length === 0 || inWeeks(byWeekNo, day, year, weekStart)) &&
      (days.length === 0 || isNthOfYear(days, day, day - first, length));
  };
}

/** `index` counts from 0. */
function inYear(byYearDay: readonly number[], index: number, length: number): boolean {
  return byYearDay.includes(index + 1) || byYearDay.includes(index - length);
}

function isNthOfYear(
  days: readonly RuleDay[],
  day: number,
  index: number,
  length: number,
): boolean {
  const weekday = weekdayOfDayNumber(day);
  const fromStart = Math.floor(index / 7) + 1;
  const fromEnd = -Math.floor((length - 1 - index) / 7) - 1;
  return days.some(
    ({ weekday: wanted, ordinal }) =>
      wanted === weekday && (ordinal === 0 || ordinal === fromStart || ordinal === fromEnd),
  );
}

function inWeeks(
  byWeekNo: readonly number[],
  day: number,
  year: number,
  weekStart: number,
): boolean {
  const thisFirst = firstWeek(year, weekStart);
  const nextFirst = firstWeek(year + 1, weekStart);
  const [from, to] =
    day < thisFirst
      ? [firstWeek(year - 1, weekStart), thisFirst]
      : day < nextFirst
        ? [thisFirst, nextFirst]
        : [nextFirst, firstWeek(year + 2, weekStart)];
  const week = Math.floor((day - from) / 7) + 1;
  const weeks = (to - from) / 7;
  return byWeekNo.includes(week) || byWeekNo.includes(week - weeks - 1);
}

/** First day of week 1: the first week with at least four days of the year (RFC 5545, 3.3.10). */
function firstWeek(year: number, weekStart: number): number {
  const fourth = dayNumber(year, 1, 4);
  return fourth - ((weekdayOfDayNumber(fourth) - weekStart + 7) % 7);
}
