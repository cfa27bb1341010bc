import { anyRule, anyStart } from '@test/reference/recurrence/rule-arbitrary';
import * as fc from 'fast-check';
import { parseLocalDateTime } from '../calendar/local-date-time';
import { eachOccurrence, nextOccurrences, occurrencesBetween } from './expand';
import { formatRule } from './format-rule';
import type { RecurrenceSet } from './rule';

const at = parseLocalDateTime;

/** Denser rules are left to the fixed examples: they would only take time. */
const MOST = 3_000;

function first(n: number, startsLocal: string, ...rrules: string[]): string[] {
  return nextOccurrences({ startsLocal: at(startsLocal), rrules }, at('1900-01-01T00:00'), n);
}

describe('expanding a rule (RFC 5545, 3.3.10)', () => {
  // 3.3.10, COUNT and "invalid dates MUST be ignored": libical's vector for month ends.
  it('skips months that are too short and does not count them', () => {
    expect(first(4, '2026-01-31T09:00', 'FREQ=MONTHLY;COUNT=4')).toEqual([
      '2026-01-31T09:00:00',
      '2026-03-31T09:00:00',
      '2026-05-31T09:00:00',
      '2026-07-31T09:00:00',
    ]);
    expect(first(2, '2024-02-29T09:00', 'FREQ=YEARLY')).toEqual([
      '2024-02-29T09:00:00',
      '2028-02-29T09:00:00',
    ]);
  });

  // 3.3.10: UNTIL "bounds the recurrence rule in an inclusive manner".
  it('includes UNTIL itself, a date with the whole of its day', () => {
    const start = '2026-01-01T09:00';
    expect(first(9, start, 'FREQ=DAILY;UNTIL=20260102T090000')).toHaveLength(2);
    expect(first(9, start, 'FREQ=DAILY;UNTIL=20260102T085959')).toHaveLength(1);
    expect(first(9, start, 'FREQ=DAILY;UNTIL=20260102')).toHaveLength(2);
  });

  // 3.3.10: "the set of recurrence instances starts at the beginning of the interval".
  it('counts BYSETPOS from the beginning of the interval, also before the start', () => {
    expect(first(2, '2026-01-07T09:00', 'FREQ=WEEKLY;BYDAY=MO,WE,FR;BYSETPOS=1')).toEqual([
      '2026-01-12T09:00:00',
      '2026-01-19T09:00:00',
    ]);
    expect(first(2, '2026-01-07T09:00', 'FREQ=DAILY;BYHOUR=8,9,10;BYSETPOS=-1')).toEqual([
      '2026-01-07T10:00:00',
      '2026-01-08T10:00:00',
    ]);
    expect(
      first(3, '2026-01-07T09:00', 'FREQ=HOURLY;INTERVAL=5;BYMINUTE=0,20,40;BYSETPOS=1,-1'),
    ).toEqual(['2026-01-07T09:00:00', '2026-01-07T09:40:00', '2026-01-07T14:00:00']);
  });

  it('carries an interval of hours, minutes or seconds across days', () => {
    expect(first(3, '2026-01-01T22:00', 'FREQ=HOURLY;INTERVAL=5')).toEqual([
      '2026-01-01T22:00:00',
      '2026-01-02T03:00:00',
      '2026-01-02T08:00:00',
    ]);
    expect(first(2, '2026-01-01T00:00', 'FREQ=MINUTELY;INTERVAL=2881')).toEqual([
      '2026-01-01T00:00:00',
      '2026-01-03T00:01:00',
    ]);
    expect(first(2, '2026-01-01T00:00', 'FREQ=SECONDLY;INTERVAL=90000;BYMONTH=2')).toEqual([
      '2026-02-01T06:00:00',
      '2026-02-02T07:00:00',
    ]);
  });

  it('reads second 60 as 59 (3.3.12)', () => {
    expect(first(2, '2026-01-01T00:00:59', 'FREQ=MINUTELY;BYSECOND=59,60')).toEqual([
      '2026-01-01T00:00:59',
      '2026-01-01T00:01:59',
    ]);
  });

  it('takes what a rule leaves open from the start, week numbers their weekday', () => {
    expect(first(2, '2026-05-14T06:30', 'FREQ=YEARLY;BYWEEKNO=20')).toEqual([
      '2026-05-14T06:30:00',
      '2027-05-20T06:30:00',
    ]);
  });

  it('ends with the year 9999 where nothing more can match', () => {
    expect(first(1, '2026-01-01T00:00', 'FREQ=MONTHLY;BYMONTH=2;BYMONTHDAY=30')).toEqual([]);
    expect(first(1, '2026-01-01T00:00', 'FREQ=SECONDLY;INTERVAL=2;BYSECOND=1')).toEqual([]);
  });
});

describe('expanding a set (RFC 5545, 3.8.5)', () => {
  const weekly: RecurrenceSet = {
    startsLocal: at('2026-01-05T09:00'),
    rrules: ['FREQ=WEEKLY;COUNT=3'],
  };

  it('adds RDATEs, drops EXDATEs whatever they hit, and counts doubles once', () => {
    const set: RecurrenceSet = {
      ...weekly,
      rrules: ['FREQ=WEEKLY;COUNT=3', 'FREQ=DAILY;COUNT=2'],
      rdates: [at('2026-01-12T09:00'), at('2026-01-07T10:00'), at('2026-01-08T10:00')],
      exdates: [at('2026-01-06T09:00'), at('2026-01-08T10:00'), at('2026-02-02T09:00')],
    };
    const expected = [
      '2026-01-05T09:00:00',
      '2026-01-07T10:00:00',
      '2026-01-12T09:00:00',
      '2026-01-19T09:00:00',
    ];
    expect([...eachOccurrence(set)]).toEqual(expected);
    expect(occurrencesBetween(set, at('2026-01-01T00:00'), at('2027-01-01T00:00'))).toEqual(
      expected,
    );
  });

  it('holds its start and its RDATEs where it has no rule', () => {
    const set = { ...weekly, rrules: [], rdates: [at('2026-01-01T00:00')] };
    expect([...eachOccurrence(set, at('2025-01-01T00:00'))]).toEqual([
      '2026-01-01T00:00:00',
      '2026-01-05T09:00:00',
    ]);
  });

  it('counts COUNT from the start, wherever one begins to look', () => {
    expect(nextOccurrences(weekly, at('2026-01-12T08:59:59'), 5)).toEqual([
      '2026-01-12T09:00:00',
      '2026-01-19T09:00:00',
    ]);
  });

  it('looks strictly after a moment, and between two with both included', () => {
    expect(nextOccurrences(weekly, at('2026-01-05T09:00'), 1)).toEqual(['2026-01-12T09:00:00']);
    expect(occurrencesBetween(weekly, at('2026-01-05T09:00'), at('2026-01-12T09:00'))).toHaveLength(
      2,
    );
  });

  it('runs forward without doubles, and every window shows the same occurrences', () => {
    fc.assert(
      fc.property(anyRule, anyStart, anyStart, fc.nat(500), (rule, startsLocal, from, days) => {
        const set = { startsLocal, rrules: [formatRule(rule)] };
        const to = at(
          new Date(Date.parse(`${from}Z`) + days * 86_400_000).toISOString().slice(0, 19),
        );
        const all: string[] = [];
        for (const local of eachOccurrence(set)) {
          if (local > to || all.length === MOST) break;
          all.push(local);
        }
        fc.pre(all.length < MOST);
        expect(all.every((local, i) => i === 0 || local > (all[i - 1] ?? ''))).toBe(true);
        const inWindow = all.filter((local) => local >= from);
        expect(occurrencesBetween(set, from, to)).toEqual(inWindow);
        expect(all.every((local) => local >= startsLocal)).toBe(true);
      }),
      { numRuns: 200 },
    );
  });
});
