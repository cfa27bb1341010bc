import {
  atTime,
  dateOf,
  fromWallSeconds,
  parseLocalDateTime,
  readBasicDateTime,
  timeOf,
  toWallSeconds,
  writeBasicDateTime,
} from './local-date-time';
import { parseCalendarDate } from './calendar-date';

describe('local date-time', () => {
  it('turns into seconds of the wall clock and back', () => {
    for (const text of ['1997-09-02T09:00:00', '2026-12-31T23:59:59', '2026-01-01T00:00:00']) {
      const local = parseLocalDateTime(text);
      expect(fromWallSeconds(toWallSeconds(local))).toBe(text);
    }
  });

  it('takes times without seconds and with a space', () => {
    expect(parseLocalDateTime('2026-03-08 02:30')).toBe('2026-03-08T02:30:00');
  });

  it.each(['2026-02-30T10:00', '2026-03-08T24:00', '2026-03-08T10:60', '2026-03-08', 'noon'])(
    'refuses %p',
    (text) => {
      expect(() => parseLocalDateTime(text)).toThrow(RangeError);
    },
  );

  // RFC 5545, 3.3.5, form 1; second 60 by 3.3.12.
  it('reads and writes the form of RFC 5545', () => {
    const local = readBasicDateTime('19980118T230000');
    expect(local).toBe('1998-01-18T23:00:00');
    expect(local && writeBasicDateTime(local)).toBe('19980118T230000');
    expect(readBasicDateTime('19970630T235960')).toBe('1997-06-30T23:59:59');
    expect(readBasicDateTime('19980118T230000Z')).toBeNull();
    expect(readBasicDateTime('19980231T230000')).toBeNull();
  });

  it('is a date and a time of day', () => {
    const local = atTime(parseCalendarDate('2026-03-08'), '02:30');
    expect(dateOf(local)).toBe('2026-03-08');
    expect(timeOf(local)).toBe('02:30:00');
  });
});
