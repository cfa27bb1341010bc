import { DateTime } from 'luxon';
import { dateAt, instantOf, localAt, offsetAt, timesShown } from './instant-of';
import { parseLocalDateTime } from './local-date-time';
import { isTimeZone } from './zone-offsets';

const utc = (local: string, tzid: string) =>
  new Date(instantOf(parseLocalDateTime(local), tzid)).toISOString();

describe('instant of a wall-clock time', () => {
  // RFC 5545, 3.3.5, its own three examples.
  it('reads a skipped time with the offset before the gap', () => {
    expect(utc('2007-03-11T02:30', 'America/New_York')).toBe('2007-03-11T07:30:00.000Z');
    expect(timesShown(parseLocalDateTime('2007-03-11T02:30'), 'America/New_York')).toBe('never');
  });

  it('takes the first of a time that is shown twice', () => {
    expect(utc('2007-11-04T01:30', 'America/New_York')).toBe('2007-11-04T05:30:00.000Z');
    expect(timesShown(parseLocalDateTime('2007-11-04T01:30'), 'America/New_York')).toBe('twice');
  });

  it('reads an ordinary time', () => {
    expect(utc('1998-01-19T02:00', 'America/New_York')).toBe('1998-01-19T07:00:00.000Z');
    expect(timesShown(parseLocalDateTime('1998-01-19T02:00'), 'America/New_York')).toBe('once');
  });

  // Computed with python zoneinfo (fold 0), tz data 2025b.
  it.each([
    ['2026-10-04T02:15', 'Australia/Lord_Howe', '2026-10-03T15:45:00.000Z'], // half an hour's shift
    ['2026-03-08T02:30', 'America/Phoenix', '2026-03-08T09:30:00.000Z'], // no shift at all
    ['2011-12-30T12:00', 'Pacific/Apia', '2011-12-30T22:00:00.000Z'], // a day that never was
    ['2026-07-01T12:00', 'Asia/Kathmandu', '2026-07-01T06:15:00.000Z'], // quarter of an hour
    ['2024-04-26T00:00', 'Africa/Cairo', '2024-04-25T22:00:00.000Z'], // midnight skipped
  ])('%s in %s is %s', (local, tzid, expected) => {
    expect(utc(local, tzid)).toBe(expected);
  });

  it('holds at the very edges of a change', () => {
    expect(utc('2026-03-08T01:59:59', 'America/New_York')).toBe('2026-03-08T06:59:59.000Z');
    expect(utc('2026-03-08T03:00', 'America/New_York')).toBe('2026-03-08T07:00:00.000Z');
    expect(utc('2026-11-01T00:59:59', 'America/New_York')).toBe('2026-11-01T04:59:59.000Z');
    expect(utc('2026-11-01T02:00', 'America/New_York')).toBe('2026-11-01T07:00:00.000Z');
  });

  it('answers for years far away either side, in whichever order they are asked for', () => {
    expect(utc('2926-01-15T12:00', 'America/New_York')).toBe('2926-01-15T17:00:00.000Z');
    expect(utc('1700-01-15T12:00', 'Etc/GMT+5')).toBe('1700-01-15T17:00:00.000Z');
    expect(utc('2026-07-15T12:00', 'America/New_York')).toBe('2026-07-15T16:00:00.000Z');
  });

  it('refuses a zone that the machine does not know', () => {
    expect(() => utc('2026-01-01T00:00', 'Mars/Olympus')).toThrow(RangeError);
    expect(isTimeZone('Mars/Olympus')).toBe(false);
    expect(isTimeZone('America/Chicago')).toBe(true);
  });
});

describe('wall clock at an instant', () => {
  // luxon, over the same time-zone data of the machine.
  it('agrees with luxon, hour by hour, around every change of three years', () => {
    const zones = ['America/New_York', 'Australia/Lord_Howe', 'Europe/London', 'Africa/Casablanca'];
    for (const tzid of zones) {
      for (let hour = 0; hour < 3 * 8766; hour += 5) {
        const instant = Date.UTC(2025, 0, 1) + hour * 3_600_000;
        const there = DateTime.fromMillis(instant, { zone: tzid });
        expect(localAt(instant, tzid)).toBe(there.toFormat("yyyy-MM-dd'T'HH:mm:ss"));
        expect(offsetAt(instant, tzid)).toBe(there.offset * 60);
      }
    }
  });

  it('knows the date', () => {
    expect(dateAt(Date.UTC(2026, 0, 1, 3), 'America/Los_Angeles')).toBe('2025-12-31');
  });
});
