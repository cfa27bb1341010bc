import { dayNumber, fromDayNumber } from '../calendar/calendar-date';
import {
  type ByDay,
  type Frequency,
  type Rule,
  type RuleProblem,
  type Until,
  frequencies,
  weekdays,
} from './rule';

export type ParsedRule =
  | { readonly rule: Rule; readonly problems: readonly [] }
  | { readonly rule: null; readonly problems: readonly RuleProblem[] };

/** Range of each list of numbers, and whether it may count from the end. RFC 5545, 3.3.10. */
const lists = {
  // 60 is a leap second; wall clocks here have none, so it is read as 59.
  BYSECOND: [0, 60, false],
  BYMINUTE: [0, 59, false],
  BYHOUR: [0, 23, false],
  BYMONTHDAY: [1, 31, true],
  BYYEARDAY: [1, 366, true],
  BYWEEKNO: [1, 53, true],
  BYMONTH: [1, 12, false],
  BYSETPOS: [1, 366, true],
} as const;

const known = [...Object.keys(lists), 'FREQ', 'INTERVAL', 'COUNT', 'UNTIL', 'WKST', 'BYDAY'];

/**
 * Reads the text of an RRULE value (with or without the name `RRULE:`) by RFC 5545, 3.3.10.
 * Never throws: everything that is wrong is told at once, each with the part at fault.
 */
export function parseRule(text: string): ParsedRule {
  const problems: RuleProblem[] = [];
  const fail = (part: string, reason: RuleProblem['reason'], message: string) => {
    problems.push({ part, reason, message });
    return undefined;
  };
  const parts = splitParts(text, fail);

  const list = (part: keyof typeof lists): number[] => {
    const value = parts.get(part);
    if (value === undefined) return [];
    const [low, high, fromEnd] = lists[part];
    const numbers = value.split(',').map((item) => {
      const number = /^[+-]?\d{1,3}$/.test(item) ? Number(item) : NaN;
      if (Number.isNaN(number)) {
        return fail(part, 'unreadable', `${part}: “${item}” is not a whole number.`);
      }
      const size = fromEnd ? Math.abs(number) : number;
      if (size < low || size > high) {
        const range = fromEnd ? `${low} to ${high} or -${high} to -${low}` : `${low} to ${high}`;
        return fail(part, 'out-of-range', `${part}: ${number} is not in the range ${range}.`);
      }
      return part === 'BYSECOND' ? Math.min(number, 59) : number;
    });
    const read = numbers.filter((it): it is number => it !== undefined);
    return [...new Set(read)].sort((a, b) => a - b);
  };
  const positive = (part: 'INTERVAL' | 'COUNT'): number | undefined => {
    const value = parts.get(part);
    if (value === undefined) return undefined;
    if (!/^\d{1,9}$/.test(value))
      return fail(part, 'unreadable', `${part} must be a whole number.`);
    return Number(value) > 0
      ? Number(value)
      : fail(part, 'out-of-range', `${part} must be at least 1.`);
  };

  const frequency = readFrequency(parts.get('FREQ'), fail);
  const weekStart = weekdays.indexOf((parts.get('WKST') ?? 'MO') as 'MO');
  if (weekStart < 0) fail('WKST', 'unreadable', 'WKST must be one of MO, TU, WE, TH, FR, SA, SU.');
  const rule: Rule = {
    frequency: frequency ?? 'DAILY',
    interval: positive('INTERVAL') ?? 1,
    count: positive('COUNT') ?? null,
    until: readUntil(parts.get('UNTIL'), fail) ?? null,
    weekStart,
    bySecond: list('BYSECOND'),
    byMinute: list('BYMINUTE'),
    byHour: list('BYHOUR'),
    byDay: readByDay(parts.get('BYDAY'), fail),
    byMonthDay: list('BYMONTHDAY'),
    byYearDay: list('BYYEARDAY'),
    byWeekNo: list('BYWEEKNO'),
    byMonth: list('BYMONTH'),
    bySetPos: list('BYSETPOS'),
  };
  if (frequency) checkTogether(rule, parts, fail);
  return problems.length > 0 ? { rule: null, problems } : { rule, problems: [] };
}

type Fail = (part: string, reason: RuleProblem['reason'], message: string) => undefined;

function splitParts(text: string, fail: Fail): Map<string, string> {
  const parts = new Map<string, string>();
  const body = text
    .trim()
    .toUpperCase()
    .replace(/^RRULE:/, '');
  for (const piece of body.split(';')) {
    const [name = '', value, more] = piece.split('=');
    if (value === undefined || value === '' || more !== undefined) {
      fail(name || 'RRULE', 'unreadable', `“${piece}” is not of the form NAME=VALUE.`);
    } else if (!known.includes(name)) {
      fail(name, 'unknown-part', `${name} is not a part of a recurrence rule.`);
    } else if (parts.has(name)) {
      fail(name, 'twice', `${name} stands twice.`);
    } else {
      parts.set(name, value);
    }
  }
  return parts;
}

function readFrequency(value: string | undefined, fail: Fail): Frequency | undefined {
  if (value === undefined) return fail('FREQ', 'missing', 'FREQ is missing.');
  const frequency = frequencies.find((it) => it === value);
  return frequency ?? fail('FREQ', 'unreadable', `FREQ must be one of ${frequencies.join(', ')}.`);
}

function readByDay(value: string | undefined, fail: Fail): ByDay[] {
  if (value === undefined) return [];
  const days = value.split(',').map((item): ByDay | undefined => {
    const [, ordinal = '', name] = /^([+-]?\d{1,2})?(MO|TU|WE|TH|FR|SA|SU)$/.exec(item) ?? [];
    if (!name)
      return fail('BYDAY', 'unreadable', `BYDAY: “${item}” is not a weekday like MO or -1FR.`);
    if (ordinal !== '' && (Number(ordinal) === 0 || Math.abs(Number(ordinal)) > 53)) {
      return fail(
        'BYDAY',
        'out-of-range',
        `BYDAY: ${ordinal} is not in the range 1 to 53 or -53 to -1.`,
      );
    }
    return { weekday: weekdays.indexOf(name as 'MO'), ordinal: Number(ordinal) };
  });
  return days.filter((it): it is ByDay => it !== undefined);
}

function readUntil(value: string | undefined, fail: Fail): Until | undefined {
  if (value === undefined) return undefined;
  const read = /^(\d{4})(\d\d)(\d\d)(?:T(\d\d)(\d\d)(\d\d)(Z?))?$/.exec(value);
  if (read) {
    const [, year, month, date, hour, minute, second, zulu] = read;
    const day = dayNumber(Number(year), Number(month), Number(date));
    const real = fromDayNumber(day) === `${year}-${month}-${date}`;
    if (real && hour === undefined) return { kind: 'date', day };
    const [h, m, s] = [Number(hour), Number(minute), Number(second)];
    if (real && h < 24 && m < 60 && s < 61) {
      const seconds = day * 86_400 + h * 3600 + m * 60 + Math.min(s, 59);
      return { kind: zulu === 'Z' ? 'instant' : 'local', seconds };
    }
  }
  return fail('UNTIL', 'unreadable', `UNTIL: “${value}” is not a date like 20261231T235959Z.`);
}

/** What RFC 5545, 3.3.10 forbids in company. */
function checkTogether(rule: Rule, parts: ReadonlyMap<string, string>, fail: Fail): void {
  const { frequency } = rule;
  const notWith = (part: string) =>
    fail(part, 'not-with-frequency', `${part} cannot stand in a rule with FREQ=${frequency}.`);
  if (parts.has('COUNT') && parts.has('UNTIL')) {
    fail('COUNT', 'count-with-until', 'COUNT and UNTIL cannot stand in the same rule.');
  }
  if (parts.has('BYWEEKNO') && frequency !== 'YEARLY') notWith('BYWEEKNO');
  if (parts.has('BYYEARDAY') && ['DAILY', 'WEEKLY', 'MONTHLY'].includes(frequency)) {
    notWith('BYYEARDAY');
  }
  if (parts.has('BYMONTHDAY') && frequency === 'WEEKLY') notWith('BYMONTHDAY');
  if (rule.byDay.some(({ ordinal }) => ordinal !== 0)) {
    if (frequency !== 'MONTHLY' && frequency !== 'YEARLY') {
      fail(
        'BYDAY',
        'not-with-frequency',
        `BYDAY takes numbers like 2MO only in MONTHLY and YEARLY rules.`,
      );
    } else if (parts.has('BYWEEKNO')) {
      fail('BYDAY', 'not-with-frequency', 'BYDAY takes no numbers like 2MO beside BYWEEKNO.');
    }
  }
  const others = [...parts.keys()].some((part) => part.startsWith('BY') && part !== 'BYSETPOS');
  if (parts.has('BYSETPOS') && !others) {
    fail('BYSETPOS', 'needs-another-part', 'BYSETPOS needs another BY part beside it.');
  }
}
