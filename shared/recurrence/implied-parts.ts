import { civilFromDayNumber, type Weekday, weekdayOfDayNumber } from '../calendar/calendar-date';
import { SECONDS_PER_DAY, type WallSeconds } from '../calendar/local-date-time';
import type { Rule, RuleDay } from './rule';

/** The parts of a rule that decide which days and times match, with those that the start implies. */
export interface ResolvedParts {
  readonly byMonth: readonly number[];
  readonly byWeekNo: readonly number[];
  readonly byYearDay: readonly number[];
  readonly byMonthDay: readonly number[];
  readonly byDay: readonly RuleDay[];
  readonly byHour: readonly number[];
  readonly byMinute: readonly number[];
  readonly bySecond: readonly number[];
}

/**
 * "Information, not contained in the rule, necessary to determine the various recurrence instance
 * start time and dates are derived from the Start Time" (RFC 5545, 3.3.10): a yearly rule without any
 * day takes the start's day and month, a weekly one its weekday, and so on down to the seconds.
 *
 * Week numbers without a day take the start's weekday by the same sentence; the standard has no
 * example of it, and some engines give all seven days.
 */
export function resolveParts(rule: Rule, start: WallSeconds): ResolvedParts {
  const startDay = Math.floor(start / SECONDS_PER_DAY);
  const second = start - startDay * SECONDS_PER_DAY;
  const { frequency } = rule;
  let { byMonth, byMonthDay, byDay } = rule;
  const noDay = byMonthDay.length === 0 && byDay.length === 0;

  if (frequency === 'WEEKLY' && byDay.length === 0) {
    byDay = everyWeek(weekdayOfDayNumber(startDay));
  } else if (frequency === 'MONTHLY' && noDay) {
    byMonthDay = [civilFromDayNumber(startDay).day];
  } else if (frequency === 'YEARLY' && noDay && rule.byYearDay.length === 0) {
    if (rule.byWeekNo.length > 0) {
      byDay = everyWeek(weekdayOfDayNumber(startDay));
    } else {
      const { month, day } = civilFromDayNumber(startDay);
      byMonthDay = [day];
      if (byMonth.length === 0) byMonth = [month];
    }
  }

  const slowerThanSecondly = frequency !== 'SECONDLY';
  const slowerThanMinutely = slowerThanSecondly && frequency !== 'MINUTELY';
  const slowerThanHourly = slowerThanMinutely && frequency !== 'HOURLY';
  return {
    byMonth,
    byWeekNo: rule.byWeekNo,
    byYearDay: rule.byYearDay,
    byMonthDay,
    byDay,
    byHour: orStart(rule.byHour, slowerThanHourly, Math.floor(second / 3600)),
    byMinute: orStart(rule.byMinute, slowerThanMinutely, Math.floor(second / 60) % 60),
    bySecond: orStart(withoutLeapSecond(rule.bySecond), slowerThanSecondly, second % 60),
  };
}

function everyWeek(weekday: Weekday): RuleDay[] {
  return [{ weekday, ordinal: 0 }];
}

function orStart(values: readonly number[], implied: boolean, start: number): readonly number[] {
  return values.length === 0 && implied ? [start] : values;
}

/** RFC 5545, 3.3.12: who keeps no leap seconds reads second 60 as 59. */
function withoutLeapSecond(seconds: readonly number[]): readonly number[] {
  if (!seconds.includes(60)) return seconds;
  const others = seconds.filter((second) => second < 59);
  return [...others, 59];
}
