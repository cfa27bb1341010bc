import type { CalendarDate, Weekday } from '@shared/calendar/calendar-date';
import { isCalendarDate } from '@shared/calendar/calendar-date';
import type { LocalDateTime, WallSeconds } from '@shared/calendar/local-date-time';
import { toWallSeconds } from '@shared/calendar/local-date-time';
import { formatRule } from '@shared/recurrence/format-rule';
import { resolveParts } from '@shared/recurrence/implied-parts';
import { isProblems, parseRule } from '@shared/recurrence/parse-rule';
import { plainRule, type Rule, type RuleDay } from '@shared/recurrence/rule';

export type PlainUnit = 'DAILY' | 'WEEKLY' | 'MONTHLY' | 'YEARLY';

/** A recurrence as the plain controls hold it: what most rules say, and nothing else. */
export interface PlainPattern {
  readonly every: number;
  readonly unit: PlainUnit;
  /** For weeks; 0 is Monday. Empty: the start's own weekday. */
  readonly weekdays: readonly Weekday[];
  /** For months and years: a day of the month, or the nth weekday. */
  readonly dayBy: 'date' | 'weekday';
  /** 1 to 31, or −1 for the last day. */
  readonly monthDay: number;
  /** 1 to 5, or −1 for the last. */
  readonly nth: number;
  readonly nthWeekday: Weekday;
  /** For years; 1 is January. */
  readonly month: number;
  /** More than once a day: hours besides the start's own. */
  readonly hours: readonly number[];
  readonly ends: 'never' | 'on' | 'after';
  /** The last day, included. */
  readonly until: string;
  readonly count: number;
}

/** What the controls show at first: monthly on the start's own day. */
export function patternFrom(startsLocal: string): PlainPattern {
  const [year = 2000, month = 1, day = 1] = startsLocal.slice(0, 10).split('-').map(Number);
  const weekday = ((new Date(Date.UTC(year, month - 1, day)).getUTCDay() + 6) % 7) as Weekday;
  return {
    every: 1,
    unit: 'MONTHLY',
    weekdays: [weekday],
    dayBy: 'date',
    monthDay: day,
    nth: Math.ceil(day / 7) > 4 ? -1 : Math.ceil(day / 7),
    nthWeekday: weekday,
    month,
    hours: [],
    ends: 'never',
    until: '',
    count: 12,
  };
}

/**
 * The RRULE text of a pattern.
 *
 * @example toRuleText({ ...patternFrom('2026-01-05T09:00:00'), unit: 'WEEKLY' }, '2026-01-05T09:00:00')
 * // 'FREQ=WEEKLY;BYDAY=MO'
 */
export function toRuleText(pattern: PlainPattern, startsLocal: string): string {
  const startHour = Number(startsLocal.slice(11, 13));
  const hours = [...new Set([startHour, ...pattern.hours])].sort((a, b) => a - b);
  const day: Pick<Rule, 'byDay' | 'byMonthDay'> =
    pattern.dayBy === 'date'
      ? { byDay: [], byMonthDay: [pattern.monthDay] }
      : { byDay: [{ weekday: pattern.nthWeekday, ordinal: pattern.nth }], byMonthDay: [] };
  const days: Partial<Rule> = {
    DAILY: {},
    WEEKLY: { byDay: pattern.weekdays.map((weekday): RuleDay => ({ weekday, ordinal: 0 })) },
    MONTHLY: day,
    YEARLY: { ...day, byMonth: [pattern.month] },
  }[pattern.unit];
  return formatRule({
    ...plainRule(pattern.unit, Math.max(1, Math.floor(pattern.every) || 1)),
    ...days,
    byHour: hours.length > 1 ? hours : [],
    count: pattern.ends === 'after' ? Math.max(1, Math.floor(pattern.count) || 1) : null,
    until:
      pattern.ends === 'on' && isCalendarDate(pattern.until)
        ? { form: 'date', date: pattern.until as CalendarDate }
        : null,
  });
}

/** The pattern that says the same as a rule text; null where the plain controls cannot say it. */
export function toPattern(text: string, startsLocal: string): PlainPattern | null {
  const rule = parseRule(text);
  if (isProblems(rule) || !isPlainUnit(rule.frequency)) return null;
  const begins = toWallSeconds(startsLocal as LocalDateTime);
  const { byDay, byMonthDay, byMonth, byHour } = resolveParts(rule, begins);
  const start = patternFrom(startsLocal);
  const startHour = Number(startsLocal.slice(11, 13));
  const [first] = byDay;
  const weekly = rule.frequency === 'WEEKLY';
  const pattern: PlainPattern = {
    every: rule.interval,
    unit: rule.frequency,
    weekdays: weekly ? byDay.map(({ weekday }) => weekday) : start.weekdays,
    dayBy: !weekly && first ? 'weekday' : 'date',
    monthDay: byMonthDay[0] ?? start.monthDay,
    nth: first?.ordinal || start.nth,
    nthWeekday: first?.weekday ?? start.nthWeekday,
    month: byMonth[0] ?? start.month,
    hours: byHour.filter((hour) => hour !== startHour),
    ends: rule.until ? 'on' : rule.count === null ? 'never' : 'after',
    until: rule.until?.form === 'date' ? rule.until.date : '',
    count: rule.count ?? start.count,
  };
  if (!onLists(pattern)) return null;
  return saysSame(rule, toRuleText(pattern, startsLocal), begins) ? pattern : null;
}

function isPlainUnit(frequency: Rule['frequency']): frequency is PlainUnit {
  return ['DAILY', 'WEEKLY', 'MONTHLY', 'YEARLY'].includes(frequency);
}

/** Whether the lists of days and of numbered weekdays hold what the pattern has. */
function onLists({ monthDay, nth }: PlainPattern): boolean {
  return (monthDay === -1 || monthDay > 0) && (nth === -1 || (nth > 0 && nth <= 5));
}

/** Whether two rules are one, once all that the start implies is said aloud. */
function saysSame(rule: Rule, text: string, begins: WallSeconds): boolean {
  const said = parseRule(text);
  if (isProblems(said)) return false;
  const aloud = (it: Rule) => JSON.stringify({ ...it, ...resolveParts(it, begins) });
  return aloud(rule) === aloud(said);
}
