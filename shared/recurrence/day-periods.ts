import {
  civilFromDayNumber,
  dayNumber,
  daysInMonth,
  type Weekday,
  weekdayOfDayNumber,
} from '../calendar/calendar-date';
import { DayFilter } from './day-filter';
import type { ResolvedParts } from './implied-parts';
import { MonthDays } from './month-days';
import type { Rule } from './rule';
import { yearDayTests } from './year-days';

/** The last year for which dates have four digits; no rule is followed beyond it. */
export const LAST_YEAR = 9999;

/** The last day of {@link LAST_YEAR}. */
export const LAST_DAY = dayNumber(LAST_YEAR, 12, 31);

/**
 * The intervals of a rule of DAILY or slower (every second week, say), numbered from 0 for the one
 * that holds the start. Any of them can be filled without those before it.
 */
export interface DayPeriods {
  /** The interval with the day, or the last one before it where INTERVAL passes over the day. */
  indexAt(day: number): number;
  readonly lastIndex: number;
  /** Writes the days of an interval that match into `days`, in order, and answers how many. */
  fill(index: number, days: number[]): number;
}

/** The intervals of a rule that starts on `startDay`; days are day numbers since 1970. */
export function dayPeriods(rule: Rule, parts: ResolvedParts, startDay: number): DayPeriods {
  switch (rule.frequency) {
    case 'YEARLY':
      return years(rule, parts, startDay);
    case 'MONTHLY':
      return months(rule, parts, startDay);
    case 'WEEKLY':
      return weeks(rule, parts, startDay);
    default:
      return singleDays(rule, parts, startDay);
  }
}

function singleDays(rule: Rule, parts: ResolvedParts, startDay: number): DayPeriods {
  const filter = new DayFilter(parts);
  const { interval } = rule;
  return {
    indexAt: (day) => Math.floor((day - startDay) / interval),
    lastIndex: Math.floor((LAST_DAY - startDay) / interval),
    fill(index, days) {
      const day = startDay + index * interval;
      if (!filter.passes(day)) return 0;
      days[0] = day;
      return 1;
    },
  };
}

function weeks(rule: Rule, parts: ResolvedParts, startDay: number): DayPeriods {
  const filter = new DayFilter({ ...parts, byDay: [] });
  const step = rule.interval * 7;
  const firstDay = startDay - ((weekdayOfDayNumber(startDay) - rule.weekStart + 7) % 7);
  const inWeek = parts.byDay.map(({ weekday }) => (weekday - rule.weekStart + 7) % 7);
  if (inWeek.length > 1) inWeek.sort((a, b) => a - b);
  return {
    indexAt: (day) => Math.floor((day - firstDay) / step),
    lastIndex: Math.floor((LAST_DAY - 6 - firstDay) / step),
    fill(index, days) {
      const week = firstDay + index * step;
      let count = 0;
      for (let i = 0; i < inWeek.length; i++) {
        const day = week + (inWeek[i] as number);
        if (filter.passes(day)) days[count++] = day;
      }
      return count;
    },
  };
}

function months(rule: Rule, parts: ResolvedParts, startDay: number): DayPeriods {
  const monthDays = new MonthDays(parts.byMonthDay, parts.byDay, true);
  const { interval } = rule;
  const { byMonth } = parts;
  const first = monthIndex(startDay);
  return {
    indexAt: (day) => Math.floor((monthIndex(day) - first) / interval),
    lastIndex: Math.floor((LAST_YEAR * 12 + 11 - first) / interval),
    fill(index, days) {
      const at = first + index * interval;
      const year = Math.floor(at / 12);
      const month = at - year * 12 + 1;
      if (byMonth.length > 0 && !byMonth.includes(month)) return 0;
      return addMonthDays(monthDays, year, month, days, 0);
    },
  };
}

function years(rule: Rule, parts: ResolvedParts, startDay: number): DayPeriods {
  // BYDAY=20MO counts within the year, but within the month where BYMONTH names months (note 2).
  const ordinalsInYear = parts.byMonth.length === 0 && parts.byDay.some((day) => day.ordinal !== 0);
  const monthDays = new MonthDays(parts.byMonthDay, parts.byDay, !ordinalsInYear);
  const testsOfYear = yearDayTests(parts, rule.weekStart, ordinalsInYear);
  const { interval } = rule;
  const inMonths = parts.byMonth.length > 0 ? parts.byMonth : ALL_MONTHS;
  const first = civilFromDayNumber(startDay).year;
  return {
    indexAt: (day) => Math.floor((civilFromDayNumber(day).year - first) / interval),
    lastIndex: Math.floor((LAST_YEAR - first) / interval),
    fill(index, days) {
      const year = first + index * interval;
      let count = 0;
      for (const month of inMonths) count = addMonthDays(monthDays, year, month, days, count);
      if (!testsOfYear) return count;
      const passes = testsOfYear(year);
      let kept = 0;
      for (let i = 0; i < count; i++) {
        const day = days[i] as number;
        if (passes(day)) days[kept++] = day;
      }
      return kept;
    },
  };
}

const ALL_MONTHS: readonly number[] = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12];

function monthIndex(day: number): number {
  const { year, month } = civilFromDayNumber(day);
  return year * 12 + month - 1;
}

/** Appends the days of the month at `count` and answers the new count. */
function addMonthDays(
  monthDays: MonthDays,
  year: number,
  month: number,
  days: number[],
  count: number,
): number {
  const first = dayNumber(year, month, 1);
  const weekday: Weekday = weekdayOfDayNumber(first);
  let bits = monthDays.bits(daysInMonth(year, month), weekday);
  let filled = count;
  while (bits !== 0) {
    days[filled++] = first + 31 - Math.clz32(bits & -bits);
    bits &= bits - 1;
  }
  return filled;
}
