import * as fc from 'fast-check';
import { addDays, type CalendarDate } from '@shared/calendar/calendar-date';
import { fromWallSeconds } from '@shared/calendar/local-date-time';
import { eachOccurrence } from '@shared/recurrence/expand';
import { firstOccurrence } from '@shared/recurrence/feasibility';
import { formatRule } from '@shared/recurrence/format-rule';
import type { Rule } from '@shared/recurrence/rule';
import { endlessRule, anyRule, anyStart } from './rule-arbitrary';
import { askDateutil, askIcal, askRrule, dateutilMissing, type Question } from './second-opinions';

interface Asked extends Question {
  readonly rule: Rule;
  readonly ours: readonly string[];
}

/** Another seed for every run; VATWRIGHT_SEED repeats one. */
const seed = Number(process.env['VATWRIGHT_SEED'] ?? Math.floor(Math.random() * 2 ** 31));
const MOST = 24;
const YEARS = 6;

/**
 * Engines count from a start that is itself an occurrence, so each rule starts at its first one
 * (RFC 5545, 3.8.5.3: another start makes the set undefined); what never occurs is left out.
 */
function ask(rules: fc.Arbitrary<Rule>, runs: number): Asked[] {
  const samples = fc.sample(fc.tuple(rules, anyStart), { seed, numRuns: runs });
  return samples.flatMap(([rule, start]) => {
    const rrule = formatRule(rule);
    const first = firstOccurrence({ startsLocal: start, rrules: [rrule] });
    if (first === null) return [];
    const dtstart = fromWallSeconds(first);
    const until: string = addDays(dtstart.slice(0, 10) as CalendarDate, 366 * YEARS);
    const ours: string[] = [];
    for (const local of eachOccurrence({ startsLocal: dtstart, rrules: [rrule] }, undefined)) {
      if (local > until || ours.length === MOST) break;
      ours.push(local);
    }
    return ours[0] === dtstart ? [{ rule, rrule, dtstart, most: ours.length, ours }] : [];
  });
}

const daily = (rule: Rule) => !['HOURLY', 'MINUTELY', 'SECONDLY'].includes(rule.frequency);
const withinDay = (rule: Rule) => [...rule.byHour, ...rule.byMinute, ...rule.bySecond].length > 0;
/** Taking the fourth of one a day never occurs, which is searched for long and teaches nothing. */
const emptySets = (rule: Rule) =>
  rule.bySetPos.length > 0 && !(withinDay(rule) || rule.byDay.length > 2);

/** Told with its seed, so that it can be asked again. */
const told = (asked: Asked, theirs: readonly string[] | null) =>
  `seed ${seed}: ${asked.rrule} from ${asked.dtstart}: ${theirs?.slice(0, 4).join(' ') ?? 'refused'}`;

describe('second opinions on random rules', () => {
  const missing = dateutilMissing();
  const withDateutil = missing ? it.skip : it;

  /*
   * python-dateutil 2.9. Left out is where it departs from RFC 5545, 3.3.10:
   * - BYWEEKNO without BYDAY: the weekday comes from DTSTART; dateutil takes all seven days. Days of a
   *   numbered week that lie in the neighbouring calendar year it leaves out.
   * - WEEKLY with BYSETPOS: positions count within the whole week; dateutil counts the first one from
   *   DTSTART.
   * - BYDAY beyond the fifth within BYMONTH: there is no such day; dateutil fails with an IndexError.
   */
  withDateutil(`python-dateutil agrees${missing ? ` (${missing})` : ''}`, () => {
    const plain = anyRule.filter(
      (rule) =>
        daily(rule) &&
        !rule.until &&
        !emptySets(rule) &&
        rule.byWeekNo.length === 0 &&
        !(rule.frequency === 'WEEKLY' && rule.bySetPos.length > 0) &&
        !(rule.byMonth.length > 0 && rule.byDay.some(({ ordinal }) => Math.abs(ordinal) > 5)),
    );
    const questions = ask(plain, 1200);
    expect(questions.length).toBeGreaterThan(600);
    const answers = askDateutil(questions);
    const wrong = questions.flatMap((asked, i) =>
      JSON.stringify(answers[i]) === JSON.stringify(asked.ours)
        ? []
        : [told(asked, answers[i] ?? null)],
    );
    expect(wrong).toEqual([]);
  });

  /*
   * ical.js 2: asked where it is at home. It takes one BYHOUR, BYMINUTE and BYSECOND into account at a
   * time, and has ideas of its own on BYSETPOS, BYWEEKNO, BYYEARDAY, on BYMONTHDAY together with
   * BYDAY, on numbered weekdays, and on months too short for the start's day; RFC 5545, 3.3.10's table of expansions says otherwise.
   */
  it('ical.js agrees where it follows the table of 3.3.10', () => {
    const plain = endlessRule.filter(
      (rule) =>
        daily(rule) &&
        !withinDay(rule) &&
        rule.bySetPos.length + rule.byWeekNo.length + rule.byYearDay.length === 0 &&
        (rule.byMonthDay.length === 0 || rule.byDay.length === 0) &&
        !(
          rule.frequency === 'YEARLY' &&
          rule.byDay.length + rule.byMonthDay.length + rule.byMonth.length > 0
        ) &&
        rule.byMonthDay.every((day) => day > 0) &&
        !(rule.frequency === 'DAILY' && rule.byMonthDay.length > 0) &&
        !(rule.frequency === 'MONTHLY' && rule.byMonth.length + rule.byDay.length > 0),
    );
    expect(disagreements(ask(plain, 600), askIcal)).toEqual([]);
  });

  /*
   * rrule 2.8 is a translation of dateutil and shares its departures; with BYSETPOS from both ends it
   * gives an occurrence twice.
   */
  it('the rrule package agrees on rules of whole days', () => {
    const plain = endlessRule.filter(
      (rule) =>
        daily(rule) &&
        rule.bySetPos.length + rule.byWeekNo.length === 0 &&
        !(rule.byMonth.length > 0 && rule.byDay.some(({ ordinal }) => Math.abs(ordinal) > 5)),
    );
    expect(disagreements(ask(plain, 600), askRrule)).toEqual([]);
  });
});

function disagreements(questions: readonly Asked[], answer: (asked: Asked) => string[]): string[] {
  expect(questions.length).toBeGreaterThan(200);
  return questions.flatMap((asked) => {
    const theirs = answer(asked);
    return JSON.stringify(theirs) === JSON.stringify(asked.ours) ? [] : [told(asked, theirs)];
  });
}
