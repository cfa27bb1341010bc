import {
  type LocalDateTime,
  SECONDS_PER_DAY,
  toWallSeconds,
  type WallSeconds,
} from '../calendar/local-date-time';
import { eachWallSeconds } from './expand';
import { isProblems, parseRule } from './parse-rule';
import { plainRule, type RecurrenceSet, type Rule } from './rule';
import type { StartForm } from './rule-legality';
import { type RuleProblem, ruleProblem } from './rule-problem';
import { compileRule, RuleRun } from './rule-run';

/** What a recurrence must keep to beyond the standard. */
export interface FeasibilityLimits {
  /** Most occurrences on one local day. */
  readonly mostPerDay: number;
  /** Holds UNTIL and times of day against the form of the start; see `parseRule`. */
  readonly startForm?: StartForm;
  /** The zone in which UNTIL in UTC is read. */
  readonly tzid?: string;
}

/** So many days with occurrences are counted; patterns within a day show well before. */
const DAYS_COUNTED = 60;

const MONTHS =
  'January February March April May June July August September October November December'.split(
    ' ',
  );
const LONGEST_MONTHS = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/**
 * Every reason not to accept a recurrence set: its rules' faults by RFC 5545, a rule that can never
 * occur, and too many occurrences in one day. Empty when there is none.
 */
export function recurrenceProblems(set: RecurrenceSet, limits: FeasibilityLimits): RuleProblem[] {
  const problems: RuleProblem[] = [];
  const start = toWallSeconds(set.startsLocal);
  for (const text of set.rrules) {
    const parsed = parseRule(text, limits.startForm);
    if (isProblems(parsed)) problems.push(...parsed);
    else if (!occurs(parsed, start, limits.tzid))
      problems.push(whyNever(parsed, start, limits.tzid));
  }
  if (problems.length > 0) return problems;
  const crowd = crowdedDay(set, limits);
  return crowd === null
    ? []
    : [ruleProblem('RRULE', 'too-often', { perDay: crowd, most: limits.mostPerDay })];
}

function occurs(rule: Rule, start: WallSeconds, tzid: string | undefined): boolean {
  return new RuleRun(compileRule(rule, start, tzid), start).next() !== Infinity;
}

/** Names the part at fault: the one without which the rule would occur. */
function whyNever(rule: Rule, start: WallSeconds, tzid: string | undefined): RuleProblem {
  if (rule.until && occurs({ ...rule, until: null }, start, tzid)) {
    return never('UNTIL', 'until-too-early', 'it ends before its first occurrence.');
  }
  const day = rule.byMonthDay.find((wanted) => Math.abs(wanted) > longestOf(rule.byMonth));
  if (day !== undefined) {
    const months = rule.byMonth.map((month) => MONTHS[month - 1]).join(' and ');
    return never('BYMONTHDAY', 'no-such-day', `${months} never has ${Math.abs(day)} days.`);
  }
  for (const [part, field] of SUSPECTS) {
    if (rule[field].length === 0) continue;
    if (occurs({ ...rule, [field]: plainRule(rule.frequency)[field] }, start, tzid)) {
      return never(
        part,
        'excluded-by-the-others',
        `nothing matches both ${part} and the rest of it.`,
      );
    }
  }
  if (rule.interval > 1 && occurs({ ...rule, interval: 1 }, start, tzid)) {
    const reason = `counting by ${rule.interval} from the start never meets the other parts.`;
    return never('INTERVAL', 'interval-misses', reason);
  }
  return never('RRULE', 'parts-exclude-each-other', 'its parts exclude one another.');
}

const SUSPECTS = [
  ['BYSETPOS', 'bySetPos'],
  ['BYSECOND', 'bySecond'],
  ['BYMINUTE', 'byMinute'],
  ['BYHOUR', 'byHour'],
  ['BYDAY', 'byDay'],
  ['BYMONTHDAY', 'byMonthDay'],
  ['BYYEARDAY', 'byYearDay'],
  ['BYWEEKNO', 'byWeekNo'],
  ['BYMONTH', 'byMonth'],
] as const;

function never(part: string, because: string, reason: string): RuleProblem {
  return ruleProblem(part, 'never-occurs', { because, reason });
}

function longestOf(byMonth: readonly number[]): number {
  return Math.max(...(byMonth.length > 0 ? byMonth : [1]).map((m) => LONGEST_MONTHS[m - 1] ?? 31));
}

/** The most occurrences on one day where that is too many; null where it is not. */
function crowdedDay(set: RecurrenceSet, limits: FeasibilityLimits): number | null {
  let most = 0;
  let day = NaN;
  let days = 0;
  let count = 0;
  let daysLeft = DAYS_COUNTED;
  for (const wall of eachWallSeconds(set, -Infinity, limits.tzid)) {
    const today = Math.floor(wall / SECONDS_PER_DAY);
    if (today !== day) {
      if (days === daysLeft) break;
      [day, count, days] = [today, 0, days + 1];
    }
    count++;
    most = Math.max(most, count);
    // The day of the start may be cut short, so the next one is counted as well.
    if (count > limits.mostPerDay) daysLeft = Math.min(daysLeft, days + 1);
  }
  return most > limits.mostPerDay ? most : null;
}

/** The first occurrence of a set, or null where it has none. */
export function firstOccurrence(set: RecurrenceSet, tzid?: string): WallSeconds | null {
  const first = eachWallSeconds(set, -Infinity, tzid).next();
  return first.done ? null : first.value;
}

/** Whether the start is itself an occurrence; the standard leaves undefined what happens otherwise. */
export function startMatches(set: RecurrenceSet, tzid?: string): boolean {
  const start: LocalDateTime = set.startsLocal;
  return firstOccurrence({ ...set, exdates: [] }, tzid) === toWallSeconds(start);
}
