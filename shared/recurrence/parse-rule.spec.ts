import { isProblems, parseRule, readRule } from './parse-rule';
import type { StartForm } from './rule-legality';

function faults(text: string, start?: StartForm): string[] {
  const parsed = parseRule(text, start);
  return isProblems(parsed) ? parsed.map(({ part, code }) => `${part} ${code}`) : [];
}

describe('reading a rule (RFC 5545, 3.3.10)', () => {
  it('reads every part, in any order and either case, with or without its name', () => {
    const rule = readRule('rrule:byday=-1su,mo;INTERVAL=2;freq=Monthly;count=3;wkst=SU');
    expect(rule).toMatchObject({
      frequency: 'MONTHLY',
      interval: 2,
      count: 3,
      weekStart: 6,
      byDay: [
        { weekday: 0, ordinal: 0 },
        { weekday: 6, ordinal: -1 },
      ],
    });
  });

  it('puts lists in order and drops doubles', () => {
    expect(readRule('FREQ=MONTHLY;BYMONTHDAY=-1,15,1,-3,15').byMonthDay).toEqual([1, 15, -3, -1]);
  });

  it('reads UNTIL in its three forms', () => {
    expect(readRule('FREQ=DAILY;UNTIL=19971224').until).toEqual({
      form: 'date',
      date: '1997-12-24',
    });
    expect(readRule('FREQ=DAILY;UNTIL=19971224T000000').until).toEqual({
      form: 'local',
      local: '1997-12-24T00:00:00',
    });
    expect(readRule('FREQ=DAILY;UNTIL=19971224T000000Z').until).toEqual({
      form: 'utc',
      instant: Date.UTC(1997, 11, 24),
    });
  });

  // The table of 3.3.10 ("N/A") and the paragraphs on BYDAY, BYWEEKNO, BYYEARDAY and BYMONTHDAY.
  it.each([
    ['FREQ=MONTHLY;BYWEEKNO=20', 'BYWEEKNO not-with-frequency'],
    ['FREQ=WEEKLY;BYWEEKNO=20', 'BYWEEKNO not-with-frequency'],
    ['FREQ=HOURLY;BYWEEKNO=20', 'BYWEEKNO not-with-frequency'],
    ['FREQ=DAILY;BYYEARDAY=1', 'BYYEARDAY not-with-frequency'],
    ['FREQ=WEEKLY;BYYEARDAY=1', 'BYYEARDAY not-with-frequency'],
    ['FREQ=MONTHLY;BYYEARDAY=1', 'BYYEARDAY not-with-frequency'],
    ['FREQ=WEEKLY;BYMONTHDAY=1', 'BYMONTHDAY not-with-frequency'],
    ['FREQ=WEEKLY;BYDAY=1MO', 'BYDAY ordinal-not-with-frequency'],
    ['FREQ=DAILY;BYDAY=-1MO', 'BYDAY ordinal-not-with-frequency'],
    ['FREQ=YEARLY;BYWEEKNO=20;BYDAY=1MO', 'BYDAY ordinal-not-with-week-numbers'],
    ['FREQ=MONTHLY;BYSETPOS=1', 'BYSETPOS needs-another-part'],
    ['FREQ=DAILY;COUNT=3;UNTIL=20260101', 'COUNT count-and-until'],
  ])('refuses %s', (text, fault) => {
    expect(faults(text)).toEqual([fault]);
  });

  it.each([
    'FREQ=YEARLY;BYWEEKNO=20;BYDAY=MO',
    'FREQ=HOURLY;BYYEARDAY=1',
    'FREQ=DAILY;BYMONTHDAY=-1',
    'FREQ=MONTHLY;BYDAY=1MO',
    'FREQ=SECONDLY;BYSETPOS=1;BYHOUR=9',
    'FREQ=YEARLY;BYYEARDAY=-366;BYSETPOS=-366',
    'FREQ=DAILY;BYSECOND=60',
  ])('takes %s', (text) => {
    expect(faults(text)).toEqual([]);
  });

  it.each([
    ['', 'RRULE empty'],
    ['INTERVAL=2', 'FREQ missing-frequency'],
    ['FREQ=FORTNIGHTLY', 'FREQ unknown-frequency'],
    ['FREQ=DAILY;', 'RRULE malformed-part'],
    ['FREQ=DAILY;FREQ=DAILY', 'FREQ repeated-part'],
    ['FREQ=DAILY;INTERVAL=', 'INTERVAL empty-value'],
    ['FREQ=DAILY;INTERVAL=0', 'INTERVAL out-of-range'],
    ['FREQ=DAILY;INTERVAL=-1', 'INTERVAL not-a-number'],
    ['FREQ=DAILY;COUNT=0', 'COUNT out-of-range'],
    ['FREQ=DAILY;BYHOUR=24', 'BYHOUR out-of-range'],
    ['FREQ=DAILY;BYHOUR=-1', 'BYHOUR out-of-range'],
    ['FREQ=DAILY;BYMINUTE=60', 'BYMINUTE out-of-range'],
    ['FREQ=DAILY;BYSECOND=61', 'BYSECOND out-of-range'],
    ['FREQ=MONTHLY;BYMONTHDAY=0', 'BYMONTHDAY out-of-range'],
    ['FREQ=MONTHLY;BYMONTHDAY=-32', 'BYMONTHDAY out-of-range'],
    ['FREQ=YEARLY;BYYEARDAY=367', 'BYYEARDAY out-of-range'],
    ['FREQ=YEARLY;BYWEEKNO=54', 'BYWEEKNO out-of-range'],
    ['FREQ=YEARLY;BYMONTH=13', 'BYMONTH out-of-range'],
    ['FREQ=YEARLY;BYMONTH=-1', 'BYMONTH out-of-range'],
    ['FREQ=YEARLY;BYMONTH=June', 'BYMONTH not-a-number'],
    ['FREQ=YEARLY;BYDAY=MO;BYSETPOS=367', 'BYSETPOS out-of-range'],
    ['FREQ=MONTHLY;BYDAY=0MO', 'BYDAY out-of-range'],
    ['FREQ=MONTHLY;BYDAY=54MO', 'BYDAY out-of-range'],
    ['FREQ=MONTHLY;BYDAY=MOO', 'BYDAY not-a-weekday'],
    ['FREQ=WEEKLY;WKST=XX', 'WKST not-a-weekday'],
    ['FREQ=DAILY;UNTIL=20260230', 'UNTIL not-a-date'],
    ['FREQ=DAILY;UNTIL=2026-01-01', 'UNTIL not-a-date'],
    ['FREQ=DAILY;BYEASTER=1', 'BYEASTER unknown-part'],
  ])('refuses %p as %s', (text, fault) => {
    expect(faults(text)).toEqual([fault]);
  });

  it('answers all problems at once, each in words that name the part', () => {
    const parsed = parseRule('FREQ=WEEKLY;BYMONTHDAY=99;BYHOUR=9,25;COUNT=2;UNTIL=20260101');
    expect(isProblems(parsed) && parsed.map(({ message }) => message)).toEqual([
      'BYMONTHDAY: 99 is outside 1 to 31 and -31 to -1.',
      'BYHOUR: 25 is outside 0 to 23.',
      'BYMONTHDAY cannot be used with FREQ=WEEKLY.',
      'COUNT and UNTIL cannot both end a rule.',
    ]);
  });

  // 3.3.10, UNTIL: same value type as DTSTART; UTC where DTSTART has a zone; no BYHOUR on dates.
  it('holds UNTIL and times of day against the form of the start', () => {
    expect(faults('FREQ=DAILY;UNTIL=20260101T000000', 'zoned')).toEqual(['UNTIL until-form']);
    expect(faults('FREQ=DAILY;UNTIL=20260101T000000Z', 'zoned')).toEqual([]);
    expect(faults('FREQ=DAILY;UNTIL=20260101T000000Z', 'floating')).toEqual(['UNTIL until-form']);
    expect(faults('FREQ=DAILY;UNTIL=20260101', 'date')).toEqual([]);
    expect(faults('FREQ=DAILY;BYHOUR=9', 'date')).toEqual(['BYHOUR time-part-on-date']);
  });

  it('throws for a rule that was taken to be good', () => {
    expect(() => readRule('FREQ=NEVER')).toThrow(/FREQ cannot be “NEVER”/);
  });
});
