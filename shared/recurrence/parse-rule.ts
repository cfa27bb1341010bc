import { type CalendarDate, isCalendarDate, type Weekday } from '../calendar/calendar-date';
import { readBasicDateTime, toWallSeconds } from '../calendar/local-date-time';
import {
  FREQUENCIES,
  type Frequency,
  type NumberPart,
  type Rule,
  type RuleDay,
  type Until,
  WEEKDAY_NAMES,
} from './rule';
import { illegalCombinations, type StartForm } from './rule-legality';
import { type RuleProblem, ruleProblem } from './rule-problem';

interface NumberSpec {
  readonly field: NumberPart;
  /** Largest absolute value. */
  readonly most: number;
  readonly least: number;
  readonly negative: boolean;
}

// The ranges of RFC 5545, 3.3.10.
const NUMBER_PARTS: Readonly<Record<string, NumberSpec>> = {
  BYSECOND: { field: 'bySecond', least: 0, most: 60, negative: false },
  BYMINUTE: { field: 'byMinute', least: 0, most: 59, negative: false },
  BYHOUR: { field: 'byHour', least: 0, most: 23, negative: false },
  BYMONTHDAY: { field: 'byMonthDay', least: 1, most: 31, negative: true },
  BYYEARDAY: { field: 'byYearDay', least: 1, most: 366, negative: true },
  BYWEEKNO: { field: 'byWeekNo', least: 1, most: 53, negative: true },
  BYMONTH: { field: 'byMonth', least: 1, most: 12, negative: false },
  BYSETPOS: { field: 'bySetPos', least: 1, most: 366, negative: true },
};

const MOST_INTERVAL = 1_000_000_000;

type Draft = { -readonly [K in keyof Rule]: Rule[K] };

/**
 * Reads the text of a recurrence rule (RFC 5545, 3.3.10), with or without `RRULE:` before it, in
 * upper or lower case. Answers the rule, or every problem at once.
 *
 * With `start`, the form of the start is held against the rule as the RFC demands: the form of UNTIL,
 * and no times of day where the start is a date.
 */
export function parseRule(text: string, start?: StartForm): Rule | RuleProblem[] {
  const problems: RuleProblem[] = [];
  const draft: Draft = {
    frequency: 'DAILY',
    interval: 1,
    count: null,
    until: null,
    bySecond: [],
    byMinute: [],
    byHour: [],
    byDay: [],
    byMonthDay: [],
    byYearDay: [],
    byWeekNo: [],
    byMonth: [],
    bySetPos: [],
    weekStart: 0,
  };
  const body = text
    .trim()
    .toUpperCase()
    .replace(/^RRULE:/, '');
  if (body === '') return [ruleProblem('RRULE', 'empty')];

  const seen: string[] = [];
  for (const piece of body.split(';')) {
    const equals = piece.indexOf('=');
    const part = piece.slice(0, equals);
    const value = piece.slice(equals + 1);
    if (equals < 1) problems.push(ruleProblem('RRULE', 'malformed-part', { text: piece }));
    else if (seen.includes(part)) problems.push(ruleProblem(part, 'repeated-part'));
    else if (value === '') problems.push(ruleProblem(part, 'empty-value'));
    else readPart(draft, part, value, problems);
    if (equals >= 1) seen.push(part);
  }
  if (!seen.includes('FREQ')) problems.push(ruleProblem('FREQ', 'missing-frequency'));
  else if (!problems.some(({ code }) => code === 'unknown-frequency')) {
    problems.push(...illegalCombinations(draft, seen, start));
  }
  return problems.length > 0 ? problems : draft;
}

/** Whether {@link parseRule} answered problems. */
export function isProblems(parsed: Rule | RuleProblem[]): parsed is RuleProblem[] {
  return Array.isArray(parsed);
}

/**
 * Reads a rule that is known to be good, such as one that was checked when it was saved.
 * @throws RangeError with all problems in words.
 */
export function readRule(text: string): Rule {
  const parsed = parseRule(text);
  if (isProblems(parsed)) throw new RangeError(parsed.map(({ message }) => message).join(' '));
  return parsed;
}

function readPart(draft: Draft, part: string, value: string, problems: RuleProblem[]): void {
  const spec = NUMBER_PARTS[part];
  if (spec) {
    draft[spec.field] = readNumbers(part, spec, value, problems);
    return;
  }
  switch (part) {
    case 'FREQ':
      if (FREQUENCIES.includes(value as Frequency)) draft.frequency = value as Frequency;
      else problems.push(ruleProblem('FREQ', 'unknown-frequency', { value }));
      break;
    case 'INTERVAL':
      draft.interval = readPositive(part, value, problems);
      break;
    case 'COUNT':
      draft.count = readPositive(part, value, problems);
      break;
    case 'UNTIL':
      draft.until = readUntil(value);
      if (!draft.until) problems.push(ruleProblem('UNTIL', 'not-a-date', { value }));
      break;
    case 'WKST': {
      const weekday = weekdayNamed(value);
      if (weekday === null) problems.push(ruleProblem('WKST', 'not-a-weekday', { value }));
      else draft.weekStart = weekday;
      break;
    }
    case 'BYDAY':
      draft.byDay = readDays(value, problems);
      break;
    default:
      problems.push(ruleProblem(part, 'unknown-part'));
  }
}

function readPositive(part: string, value: string, problems: RuleProblem[]): number {
  if (!/^\d+$/.test(value)) {
    problems.push(ruleProblem(part, 'not-a-number', { value }));
    return 1;
  }
  const number = Number(value);
  if (number >= 1 && number <= MOST_INTERVAL) return number;
  problems.push(ruleProblem(part, 'out-of-range', { value, range: `1 to ${MOST_INTERVAL}` }));
  return 1;
}

function readNumbers(
  part: string,
  spec: NumberSpec,
  value: string,
  problems: RuleProblem[],
): number[] {
  const numbers: number[] = [];
  for (const item of value.split(',')) {
    const number = /^[+-]?\d{1,3}$/.test(item) ? Number(item) : NaN;
    const size = Math.abs(number);
    const signed = !spec.negative && /^[+-]/.test(item);
    if (Number.isNaN(number) || signed) {
      const digits = /^[+-]?\d+$/.test(item);
      problems.push(
        digits
          ? ruleProblem(part, 'out-of-range', { value: item, range: rangeOf(spec) })
          : ruleProblem(part, 'not-a-number', { value: item }),
      );
    } else if (size < spec.least || size > spec.most) {
      problems.push(ruleProblem(part, 'out-of-range', { value: item, range: rangeOf(spec) }));
    } else if (!numbers.includes(number)) numbers.push(number);
  }
  return numbers.length > 1 ? numbers.sort(fromTheBeginningFirst) : numbers;
}

function rangeOf({ least, most, negative }: NumberSpec): string {
  return negative ? `${least} to ${most} and -${most} to -${least}` : `${least} to ${most}`;
}

function fromTheBeginningFirst(a: number, b: number): number {
  return a < 0 === b < 0 ? a - b : b - a;
}

function readDays(value: string, problems: RuleProblem[]): RuleDay[] {
  const days: RuleDay[] = [];
  for (const item of value.split(',')) {
    const weekday = weekdayNamed(item.slice(-2));
    const number = item.slice(0, -2);
    if (weekday === null || !/^(?:[+-]?\d{1,2})?$/.test(number)) {
      problems.push(ruleProblem('BYDAY', 'not-a-weekday', { value: item }));
      continue;
    }
    const ordinal = Number(number);
    if (number !== '' && (ordinal === 0 || Math.abs(ordinal) > 53)) {
      problems.push(
        ruleProblem('BYDAY', 'out-of-range', { value: item, range: '1 to 53 and -53 to -1' }),
      );
    } else if (!days.some((day) => day.weekday === weekday && day.ordinal === ordinal)) {
      days.push({ weekday, ordinal });
    }
  }
  return days.length > 1 ? days.sort(byOrdinalThenWeekday) : days;
}

function byOrdinalThenWeekday(a: RuleDay, b: RuleDay): number {
  return a.ordinal === b.ordinal
    ? a.weekday - b.weekday
    : fromTheBeginningFirst(a.ordinal, b.ordinal);
}

function weekdayNamed(name: string): Weekday | null {
  const index = WEEKDAY_NAMES.indexOf(name as (typeof WEEKDAY_NAMES)[number]);
  return index < 0 ? null : (index as Weekday);
}

function readUntil(value: string): Until | null {
  if (/^\d{8}$/.test(value)) {
    const date = `${value.slice(0, 4)}-${value.slice(4, 6)}-${value.slice(6)}` as CalendarDate;
    return isCalendarDate(date) ? { form: 'date', date } : null;
  }
  const local = readBasicDateTime(value.endsWith('Z') ? value.slice(0, -1) : value);
  if (!local) return null;
  return value.endsWith('Z')
    ? { form: 'utc', instant: toWallSeconds(local) * 1000 }
    : { form: 'local', local };
}
