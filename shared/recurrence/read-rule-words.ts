import type { CalendarDate, Weekday } from '../calendar/calendar-date';
import { isCalendarDate } from '../calendar/calendar-date';
import { readLocalDateTime, toWallSeconds } from '../calendar/local-date-time';
import { describeRule, wordsOf } from './describe-rule';
import { formatRule } from './format-rule';
import {
  type Dictionary,
  dictionary,
  dictionaryOf,
  escape,
  itemAt,
  listsAt,
  matchAt,
  range,
  type Reading,
} from './phrase-dictionary';
import { isProblems, parseRule } from './parse-rule';
import { FREQUENCIES, plainRule, type Rule, type RuleDay, type Until } from './rule';
import type { Lead, RuleLanguage, RuleWords } from './rule-words';

type Found = Partial<Rule>;

/** Reads one clause at `at`, in every way in which it may stand there. */
type Clause = (text: string, at: number) => readonly Reading<Found>[];

const WEEKDAYS: readonly Weekday[] = [0, 1, 2, 3, 4, 5, 6];

/**
 * Reads a sentence that `describeRule` writes, whatever its capitals, spacing and full stop; null for
 * anything else. The rule found is worded again and must give the very sentence, so nothing is guessed.
 */
export function readRuleWords(text: string, language: RuleLanguage): Rule | null {
  const sentence = text.trim().replace(/\s+/g, ' ').replace(/\.$/, '').toLowerCase();
  const clauses = clausesOf(language);
  const says = readFrom(clauses, 0, sentence, 0);
  if (!says?.frequency) return null;
  const parsed = parseRule(formatRule({ ...plainRule(says.frequency), ...says }));
  if (isProblems(parsed)) return null;
  return describeRule(parsed, language).toLowerCase() === `${sentence}.` ? parsed : null;
}

/** Any clause but the first may be missing, so one that fits too early is given up again. */
function readFrom(
  clauses: readonly Clause[],
  index: number,
  text: string,
  at: number,
): Found | null {
  const clause = clauses[index];
  if (!clause) return at === text.length ? {} : null;
  for (const { value, end } of clause(text, at)) {
    const rest = readFrom(clauses, index + 1, text, end);
    if (rest) return { ...value, ...rest };
  }
  return index === 0 ? null : readFrom(clauses, index + 1, text, at);
}

const known = new Map<RuleLanguage, readonly Clause[]>();

function clausesOf(language: RuleLanguage): readonly Clause[] {
  let clauses = known.get(language);
  if (!clauses) {
    clauses = buildClauses(wordsOf(language));
    known.set(language, clauses);
  }
  return clauses;
}

function buildClauses(words: RuleWords): Clause[] {
  const numbers = (
    lead: Lead,
    write: (n: number) => string,
    most: number,
    says: (values: number[]) => Found,
    least = -most,
  ) => listClause(words, lead, dictionary(range(least, most), write), says);
  return [
    everyClause(words),
    numbers('months', words.month, 12, (byMonth) => ({ byMonth }), 1),
    numbers('weekNos', words.weekNo, 53, (byWeekNo) => ({ byWeekNo })),
    numbers('yearDays', words.yearDay, 366, (byYearDay) => ({ byYearDay })),
    numbers('monthDays', words.monthDay, 31, (byMonthDay) => ({ byMonthDay })),
    listClause(words, 'daysLimiting', dayDictionary(words, true), (lists) => ({
      byDay: lists.flat(),
    })),
    listClause(words, 'days', dayDictionary(words, false), (lists) => ({ byDay: lists.flat() })),
    listClause(words, 'clock', clockDictionary(), (times) => ({
      byHour: unique(times.map(([hour]) => hour)),
      byMinute: unique(times.map(([, minute]) => minute)),
    })),
    numbers('hours', String, 23, (byHour) => ({ byHour }), 0),
    numbers('minutes', String, 59, (byMinute) => ({ byMinute }), 0),
    numbers('seconds', String, 60, (bySecond) => ({ bySecond }), 0),
    numbers('positions', words.position, 366, (bySetPos) => ({ bySetPos })),
    weeksFromClause(words),
    countClause(words),
    untilClause(words),
  ];
}

function everyClause(words: RuleWords): Clause {
  const one = dictionary(FREQUENCIES, (frequency) => words.every(1, frequency));
  const several = FREQUENCIES.map((frequency) => ({
    frequency,
    pattern: new RegExp(
      escape(words.every(2, frequency).toLowerCase()).replace('2', '(\\d+)'),
      'y',
    ),
  }));
  return (text, at) => {
    for (const { frequency, pattern } of several) {
      const match = matchAt(pattern, text, at);
      if (match) {
        return [{ value: { frequency, interval: Number(match[1]) }, end: at + match[0].length }];
      }
    }
    const item = itemAt(one, text, at);
    return item ? [{ value: { frequency: item.value }, end: item.end }] : [];
  };
}

function weeksFromClause(words: RuleWords): Clause {
  const phrases = dictionary(WEEKDAYS, (weekday) =>
    words.weeksFrom.replace('{weekday}', words.weekday(weekday)),
  );
  return (text, at) => {
    const item = itemAt(phrases, text, at);
    return item ? [{ value: { weekStart: item.value }, end: item.end }] : [];
  };
}

function countClause(words: RuleWords): Clause {
  const times = new RegExp(escape(words.times).replace(escape('{count}'), '(\\d+)'), 'y');
  const once = new RegExp(escape(words.once), 'y');
  return (text, at) => {
    const match = matchAt(times, text, at) ?? matchAt(once, text, at);
    return match ? [{ value: { count: Number(match[1] ?? 1) }, end: at + match[0].length }] : [];
  };
}

function untilClause(words: RuleWords): Clause {
  const months = range(1, 12).map((month) => words.month(month).toLowerCase());
  const date = escape(words.until)
    .replace(escape('{day}'), '(?<day>\\d+)')
    .replace(escape('{month}'), `(?<month>${months.join('|')})`)
    .replace(escape('{year}'), '(?<year>\\d{4})');
  const time = escape(words.untilTime).replace(escape('{time}'), '(?<time>[\\d:]+)');
  const pattern = new RegExp(`${date}(?:${time}(?<utc> utc)?)?`, 'y');
  return (text, at) => {
    const match = matchAt(pattern, text, at);
    const { day = '', month = '', year = '', time: clock, utc } = match?.groups ?? {};
    const two = (n: number | string) => String(n).padStart(2, '0');
    const until =
      match && readUntil(`${year}-${two(months.indexOf(month) + 1)}-${two(day)}`, clock, utc);
    return until ? [{ value: { until }, end: at + (match?.[0].length ?? 0) }] : [];
  };
}

function readUntil(date: string, time: string | undefined, utc: string | undefined): Until | null {
  if (time === undefined) {
    return isCalendarDate(date) ? { form: 'date', date: date as CalendarDate } : null;
  }
  const local = readLocalDateTime(`${date}T${time}`);
  if (!local) return null;
  return utc === undefined
    ? { form: 'local', local }
    : { form: 'utc', instant: toWallSeconds(local) * 1000 };
}

function dayDictionary(words: RuleWords, limiting: boolean): Dictionary<RuleDay[]> {
  const weekdays = (length: number) =>
    WEEKDAYS.slice(0, length).map((weekday) => ({ weekday, ordinal: 0 }));
  const entries: [string, RuleDay[]][] = [
    [words.mondayToFriday.toLowerCase(), weekdays(5)],
    [words.anyDay.toLowerCase(), weekdays(7)],
  ];
  for (const weekday of WEEKDAYS) {
    for (const ordinal of [0, ...range(-53, 53)]) {
      const day = { weekday, ordinal };
      entries.push([words.ruleDay(day, false, limiting).toLowerCase(), [day]]);
      if (ordinal !== 0) entries.push([words.ruleDay(day, true, limiting).toLowerCase(), [day]]);
    }
  }
  return dictionaryOf(entries);
}

function clockDictionary(): Dictionary<readonly [number, number]> {
  const two = (n: number) => String(n).padStart(2, '0');
  const times = range(0, 23).flatMap((hour) =>
    range(0, 59).map((minute) => [hour, minute] as const),
  );
  return dictionary(times, ([hour, minute]) => `${two(hour)}:${two(minute)}`);
}

function listClause<T>(
  words: RuleWords,
  lead: Lead,
  items: Dictionary<T>,
  says: (values: T[]) => Found,
): Clause {
  const joint = lead === 'daysLimiting' ? words.or : words.and;
  const forms = words.leads[lead].map((form) => form.toLowerCase().split('{list}'));
  return (text, at) =>
    forms.flatMap(([before = '', after = '']) =>
      text.startsWith(before, at)
        ? listsAt(items, joint, text, at + before.length)
            .filter(({ end }) => text.startsWith(after, end))
            .map(({ value, end }) => ({ value: says(value), end: end + after.length }))
        : [],
    );
}

function unique(numbers: readonly number[]): number[] {
  return [...new Set(numbers)];
}
