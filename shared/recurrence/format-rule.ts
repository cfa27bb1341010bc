import { fromWallSeconds, writeBasicDateTime } from '../calendar/local-date-time';
import { type Rule, type RuleDay, type Until, WEEKDAY_NAMES } from './rule';

/**
 * The rule as RFC 5545 text in one canonical order of parts, without parts that say nothing
 * (INTERVAL=1, WKST=MO). Reading the text gives the same rule again.
 *
 * @example formatRule(readRule('wkst=mo;freq=weekly;byday=fr,mo')) // 'FREQ=WEEKLY;BYDAY=MO,FR'
 */
export function formatRule(rule: Rule): string {
  const parts = [`FREQ=${rule.frequency}`];
  const list = (name: string, values: readonly (number | string)[]) => {
    if (values.length > 0) parts.push(`${name}=${values.join(',')}`);
  };
  if (rule.interval !== 1) parts.push(`INTERVAL=${rule.interval}`);
  if (rule.count !== null) parts.push(`COUNT=${rule.count}`);
  if (rule.until) parts.push(`UNTIL=${formatUntil(rule.until)}`);
  list('BYMONTH', rule.byMonth);
  list('BYWEEKNO', rule.byWeekNo);
  list('BYYEARDAY', rule.byYearDay);
  list('BYMONTHDAY', rule.byMonthDay);
  list('BYDAY', rule.byDay.map(formatDay));
  list('BYHOUR', rule.byHour);
  list('BYMINUTE', rule.byMinute);
  list('BYSECOND', rule.bySecond);
  list('BYSETPOS', rule.bySetPos);
  if (rule.weekStart !== 0) parts.push(`WKST=${WEEKDAY_NAMES[rule.weekStart]}`);
  return parts.join(';');
}

function formatDay({ weekday, ordinal }: RuleDay): string {
  return `${ordinal === 0 ? '' : ordinal}${WEEKDAY_NAMES[weekday]}`;
}

function formatUntil(until: Until): string {
  if (until.form === 'date') return until.date.replace(/-/g, '');
  if (until.form === 'local') return writeBasicDateTime(until.local);
  return `${writeBasicDateTime(fromWallSeconds(until.instant / 1000))}Z`;
}
