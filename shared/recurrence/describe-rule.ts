import {
  type CalendarDate,
  civilFromDayNumber,
  toDayNumber,
  TWO_DIGITS,
} from '../calendar/calendar-date';
import { dateOf, fromWallSeconds, timeOf } from '../calendar/local-date-time';
import type { Rule, RuleDay, Until } from './rule';
import type { Lead, RuleLanguage, RuleWords } from './rule-words';
import { englishRuleWords } from './rule-words-en';
import { spanishRuleWords } from './rule-words-es';

/** The most times of day that are written out as 09:00, 14:00 and so on. */
const MOST_CLOCK_TIMES = 8;

/**
 * The rule as a sentence, with everything in it that the rule says, so that `readRuleWords` can read
 * it back. What a rule leaves to its start (the day of a plain monthly rule) is not in it.
 *
 * @example describeRule(readRule('FREQ=MONTHLY;BYDAY=1MO'), 'en') // 'Every month on the first Monday.'
 * @example describeRule(readRule('FREQ=WEEKLY;INTERVAL=2;BYDAY=MO,FR'), 'es')
 * // 'Cada 2 semanas el lunes y el viernes.'
 */
export function describeRule(rule: Rule, language: RuleLanguage): string {
  const words = wordsOf(language);
  const list = (lead: Lead, items: readonly string[]) =>
    items.length === 0 ? '' : fillLead(words, lead, items);
  const clock = clockTimes(rule);
  const limiting = daysLimit(rule);
  const text = [
    words.every(rule.interval, rule.frequency),
    list('months', rule.byMonth.map(words.month)),
    list('weekNos', rule.byWeekNo.map(words.weekNo)),
    list('yearDays', rule.byYearDay.map(words.yearDay)),
    list('monthDays', rule.byMonthDay.map(words.monthDay)),
    list(limiting ? 'daysLimiting' : 'days', dayItems(rule, words, limiting)),
    list('clock', clock),
    clock.length > 0 ? '' : list('hours', rule.byHour.map(String)),
    clock.length > 0 ? '' : list('minutes', rule.byMinute.map(String)),
    clock.length > 0 ? '' : list('seconds', rule.bySecond.map(String)),
    list('positions', rule.bySetPos.map(words.position)),
    rule.weekStart === 0 ? '' : words.weeksFrom.replace('{weekday}', words.weekday(rule.weekStart)),
    rule.count === null ? '' : countWords(rule.count, words),
    rule.until ? untilWords(rule.until, words) : '',
  ].join('');
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

/** The words of a language. */
export function wordsOf(language: RuleLanguage): RuleWords {
  return language === 'es' ? spanishRuleWords : englishRuleWords;
}

/** Whether numbered weekdays of the rule count within the year (RFC 5545, 3.3.10, note 2). */
export function countsInYear(rule: Pick<Rule, 'frequency' | 'byMonth'>): boolean {
  return rule.frequency === 'YEARLY' && rule.byMonth.length === 0;
}

function fillLead(words: RuleWords, lead: Lead, items: readonly string[]): string {
  const last = items[items.length - 1] ?? '';
  const joint = lead === 'daysLimiting' ? words.or : words.and;
  const joined = items.length === 1 ? last : `${items.slice(0, -1).join(', ')}${joint}${last}`;
  return words.leads[lead][items.length === 1 ? 0 : 1].replace('{list}', joined);
}

/** BYDAY picks among days that something else names already. */
function daysLimit(rule: Rule): boolean {
  return (
    rule.byMonthDay.length > 0 ||
    rule.byYearDay.length > 0 ||
    (rule.frequency === 'DAILY' && rule.interval > 1)
  );
}

function dayItems(rule: Rule, words: RuleWords, limiting: boolean): string[] {
  const days = rule.byDay;
  if (isRun(days, 5)) return [words.mondayToFriday];
  if (isRun(days, 7)) return [words.anyDay];
  const ofYear = countsInYear(rule);
  return days.map((day) => words.ruleDay(day, ofYear, limiting));
}

function isRun(days: readonly RuleDay[], length: number): boolean {
  return days.length === length && days.every((day, i) => day.ordinal === 0 && day.weekday === i);
}

/** Hours and minutes together as times of day, where there are few enough to read. */
function clockTimes({ byHour, byMinute, bySecond }: Rule): string[] {
  if (bySecond.length > 0 || byHour.length * byMinute.length > MOST_CLOCK_TIMES) return [];
  return byHour.flatMap((hour) =>
    byMinute.map((minute) => `${TWO_DIGITS[hour]}:${TWO_DIGITS[minute]}`),
  );
}

function countWords(count: number, words: RuleWords): string {
  return count === 1 ? words.once : words.times.replace('{count}', String(count));
}

function untilWords(until: Until, words: RuleWords): string {
  if (until.form === 'date') return untilDate(until.date, words);
  const local = until.form === 'local' ? until.local : fromWallSeconds(until.instant / 1000);
  const time = words.untilTime.replace('{time}', timeOf(local));
  return `${untilDate(dateOf(local), words)}${time}${until.form === 'utc' ? ' UTC' : ''}`;
}

function untilDate(date: CalendarDate, words: RuleWords): string {
  const { year, month, day } = civilFromDayNumber(toDayNumber(date));
  return words.until
    .replace('{day}', String(day))
    .replace('{month}', words.month(month))
    .replace('{year}', String(year).padStart(4, '0'));
}
