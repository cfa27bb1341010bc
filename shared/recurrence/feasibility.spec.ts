import { parseLocalDateTime } from '../calendar/local-date-time';
import { firstOccurrence, recurrenceProblems, startMatches } from './feasibility';

const starts = parseLocalDateTime('2026-01-05T09:00'); // a Monday

function problems(...rrules: string[]): string[] {
  return recurrenceProblems({ startsLocal: starts, rrules }, { mostPerDay: 12 }).map(
    ({ part, code, params }) => `${part} ${code} ${params['because'] ?? params['perDay'] ?? ''}`,
  );
}

describe('what no schedule can follow', () => {
  it.each([
    ['FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30', 'BYMONTHDAY never-occurs no-such-day'],
    ['FREQ=MONTHLY;BYMONTH=4,6;BYMONTHDAY=31', 'BYMONTHDAY never-occurs no-such-day'],
    ['FREQ=MONTHLY;BYDAY=6MO', 'BYDAY never-occurs excluded-by-the-others'],
    ['FREQ=MONTHLY;BYDAY=MO;BYSETPOS=6', 'BYSETPOS never-occurs excluded-by-the-others'],
    ['FREQ=DAILY;INTERVAL=7;BYDAY=TU', 'BYDAY never-occurs excluded-by-the-others'],
    ['FREQ=DAILY;UNTIL=20251231T235959', 'UNTIL never-occurs until-too-early'],
    ['FREQ=SECONDLY;INTERVAL=2;BYSECOND=1', 'BYSECOND never-occurs excluded-by-the-others'],
  ])('%s can never occur', (rrule, expected) => {
    expect(problems(rrule)).toEqual([expected]);
  });

  it.each(['FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=29', 'FREQ=MONTHLY;BYMONTHDAY=31', 'FREQ=DAILY'])(
    '%s occurs',
    (rrule) => {
      expect(problems(rrule)).toEqual([]);
    },
  );

  it('refuses more occurrences a day than are allowed, of one rule or of several', () => {
    expect(problems('FREQ=HOURLY')).toEqual(['RRULE too-often 24']);
    expect(problems('FREQ=HOURLY;INTERVAL=2')).toEqual([]);
    const twice = 'FREQ=HOURLY;INTERVAL=2';
    expect(problems(twice, `${twice};BYMINUTE=30`)).toEqual(['RRULE too-often 24']);
  });

  it('passes the faults of the text on, with the part named', () => {
    expect(problems('FREQ=DAILY;BYHOUR=25', 'FREQ=WEEKLY;BYMONTHDAY=1')).toEqual([
      'BYHOUR out-of-range ',
      'BYMONTHDAY not-with-frequency ',
    ]);
  });

  it('says whether the start is an occurrence', () => {
    const on = (rrule: string) => ({ startsLocal: starts, rrules: [rrule] });
    expect(startMatches(on('FREQ=WEEKLY;BYDAY=MO'))).toBe(true);
    expect(startMatches(on('FREQ=WEEKLY;BYDAY=TU'))).toBe(false);
    expect(firstOccurrence(on('FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30'))).toBeNull();
  });
});
