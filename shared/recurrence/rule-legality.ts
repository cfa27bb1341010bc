import type { Frequency, Rule } from './rule';
import { WEEKDAY_NAMES } from './rule';
import { type RuleProblem, ruleProblem } from './rule-problem';

/** What kind of value the start of a recurrence is: a date, a wall-clock time, or one with a zone. */
export type StartForm = 'date' | 'floating' | 'zoned';

/** The parts that RFC 5545, 3.3.10, rules out for a frequency ("N/A" in its table). */
const NOT_WITH: Readonly<Partial<Record<Frequency, readonly string[]>>> = {
  DAILY: ['BYYEARDAY', 'BYWEEKNO'],
  WEEKLY: ['BYMONTHDAY', 'BYYEARDAY', 'BYWEEKNO'],
  MONTHLY: ['BYYEARDAY', 'BYWEEKNO'],
  HOURLY: ['BYWEEKNO'],
  MINUTELY: ['BYWEEKNO'],
  SECONDLY: ['BYWEEKNO'],
};

const UNTIL_FORMS: Readonly<
  Record<StartForm, { readonly form: string; readonly expected: string; readonly start: string }>
> = {
  date: { form: 'date', expected: 'a date', start: 'a date' },
  floating: {
    form: 'local',
    expected: 'a local date and time (without Z)',
    start: 'a local time',
  },
  zoned: { form: 'utc', expected: 'in UTC (ending in Z)', start: 'in a time zone' },
};

/**
 * Every combination in the rule that RFC 5545, 3.3.10, does not allow. `parts` are the names of the
 * parts as written, so that a part whose value is wrong as well is still found out of place.
 */
export function illegalCombinations(
  rule: Rule,
  parts: readonly string[],
  start?: StartForm,
): RuleProblem[] {
  const problems: RuleProblem[] = [];
  const { frequency } = rule;
  for (const part of NOT_WITH[frequency] ?? []) {
    if (parts.includes(part)) problems.push(ruleProblem(part, 'not-with-frequency', { frequency }));
  }
  const numbered = rule.byDay.find(({ ordinal }) => ordinal !== 0);
  if (numbered) {
    const value = `${numbered.ordinal}${WEEKDAY_NAMES[numbered.weekday]}`;
    if (frequency !== 'MONTHLY' && frequency !== 'YEARLY') {
      problems.push(ruleProblem('BYDAY', 'ordinal-not-with-frequency', { value, frequency }));
    } else if (parts.includes('BYWEEKNO')) {
      problems.push(ruleProblem('BYDAY', 'ordinal-not-with-week-numbers', { value }));
    }
  }
  const others = parts.some((part) => part.startsWith('BY') && part !== 'BYSETPOS');
  if (parts.includes('BYSETPOS') && !others) {
    problems.push(ruleProblem('BYSETPOS', 'needs-another-part'));
  }
  if (parts.includes('COUNT') && parts.includes('UNTIL')) {
    problems.push(ruleProblem('COUNT', 'count-and-until'));
  }
  if (start) problems.push(...againstStart(rule, parts, start));
  return problems;
}

function againstStart(rule: Rule, parts: readonly string[], start: StartForm): RuleProblem[] {
  const problems: RuleProblem[] = [];
  const { form, expected, start: words } = UNTIL_FORMS[start];
  if (rule.until && rule.until.form !== form) {
    problems.push(ruleProblem('UNTIL', 'until-form', { expected, start: words }));
  }
  if (start === 'date') {
    for (const part of ['BYHOUR', 'BYMINUTE', 'BYSECOND']) {
      if (parts.includes(part)) problems.push(ruleProblem(part, 'time-part-on-date'));
    }
  }
  return problems;
}
