import { fromDayNumber, type Weekday } from '@shared/calendar/calendar-date';
import { atTime, type LocalDateTime } from '@shared/calendar/local-date-time';
import { formatRule } from '@shared/recurrence/format-rule';
import { isProblems, parseRule } from '@shared/recurrence/parse-rule';
import { FREQUENCIES, plainRule, type Rule, type RuleDay } from '@shared/recurrence/rule';
import * as fc from 'fast-check';

/** A wall-clock start between 2024 and 2031, often at the end of a month. */
export const anyStart: fc.Arbitrary<LocalDateTime> = fc
  .tuple(
    fc.integer({ min: 19_723, max: 22_280 }),
    fc.constantFrom('00:00:00', '02:30:00', '09:00:00', '12:15:30', '23:59:59'),
  )
  .map(([day, time]) => atTime(fromDayNumber(day), time));

function some(values: fc.Arbitrary<number>, chance: number, most = 4): fc.Arbitrary<number[]> {
  return fc.oneof(
    { weight: 100 - chance, arbitrary: fc.constant<number[]>([]) },
    { weight: chance, arbitrary: fc.uniqueArray(values, { minLength: 1, maxLength: most }) },
  );
}

function either(most: number): fc.Arbitrary<number> {
  return fc.oneof(fc.integer({ min: 1, max: most }), fc.integer({ min: -most, max: -1 }));
}

const weekday = fc.integer({ min: 0, max: 6 }).map((n) => n as Weekday);
const plainDays = fc
  .uniqueArray(weekday, { minLength: 1, maxLength: 7 })
  .map((days): RuleDay[] => days.map((day) => ({ weekday: day, ordinal: 0 })));

function numberedDays(most: number): fc.Arbitrary<RuleDay[]> {
  return fc.array(fc.record({ weekday, ordinal: either(most) }), { minLength: 1, maxLength: 3 });
}

function daysFor(frequency: string, hasWeekNo: boolean): fc.Arbitrary<RuleDay[]> {
  const none = fc.constant<RuleDay[]>([]);
  if (frequency === 'MONTHLY') return fc.oneof(none, plainDays, numberedDays(5));
  if (frequency === 'YEARLY' && !hasWeekNo) return fc.oneof(none, plainDays, numberedDays(53));
  return fc.oneof(none, plainDays);
}

/** Any rule that RFC 5545 allows, in canonical form and without an end. */
export const endlessRule: fc.Arbitrary<Rule> = fc
  .record({
    frequency: fc.constantFrom(...FREQUENCIES),
    interval: fc.oneof(fc.constant(1), fc.integer({ min: 1, max: 40 })),
    bySecond: some(fc.integer({ min: 0, max: 59 }), 15, 3),
    byMinute: some(fc.integer({ min: 0, max: 59 }), 20, 3),
    byHour: some(fc.integer({ min: 0, max: 23 }), 25, 3),
    byMonthDay: some(either(31), 30),
    byYearDay: some(either(366), 20),
    byWeekNo: some(either(53), 20),
    byMonth: some(fc.integer({ min: 1, max: 12 }), 30, 5),
    bySetPos: some(either(5), 20, 2),
    weekStart: fc.oneof(fc.constant(0 as const), weekday),
  })
  .chain((parts) =>
    daysFor(parts.frequency, parts.byWeekNo.length > 0).map((byDay) => ({ ...parts, byDay })),
  )
  .map((parts) => canonical({ ...plainRule(parts.frequency), ...parts }));

/** Any rule that RFC 5545 allows: endless, with COUNT, or with UNTIL in one of its three forms. */
export const anyRule: fc.Arbitrary<Rule> = fc
  .tuple(
    endlessRule,
    fc.constantFrom('none', 'count', 'date', 'local', 'utc'),
    fc.integer({ min: 1, max: 60 }),
    anyStart,
  )
  .map(([rule, end, count, local]) => {
    if (end === 'count') return { ...rule, count };
    if (end === 'local') return { ...rule, until: { form: 'local' as const, local } };
    if (end === 'utc') {
      return { ...rule, until: { form: 'utc' as const, instant: Date.parse(`${local}Z`) } };
    }
    if (end === 'date') {
      const date = fromDayNumber(19_800 + count * 40);
      return { ...rule, until: { form: 'date' as const, date } };
    }
    return rule;
  });

/** Leaves out what the frequency does not allow and puts the lists in order. */
function canonical(rule: Rule): Rule {
  const { frequency } = rule;
  const yearly = frequency === 'YEARLY';
  const withinDay = frequency === 'HOURLY' || frequency === 'MINUTELY' || frequency === 'SECONDLY';
  const legal = {
    ...rule,
    byWeekNo: yearly ? rule.byWeekNo : [],
    byYearDay: yearly || withinDay ? rule.byYearDay : [],
    byMonthDay: frequency === 'WEEKLY' ? [] : rule.byMonthDay,
  };
  const others = /;BY(?!SETPOS)/.test(formatRule(legal));
  const parsed = parseRule(formatRule(others ? legal : { ...legal, bySetPos: [] }));
  if (isProblems(parsed)) throw new Error(parsed.map(({ message }) => message).join(' '));
  return parsed;
}
