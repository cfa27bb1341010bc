import { dayNumber, fromDayNumber, parseCalendarDate, toDayNumber } from './calendar-date';

describe('calendar date', () => {
  // POSIX.1-2017, 4.16: seconds since the Epoch count 86 400 a day from 1970-01-01.
  it('counts days from the POSIX epoch', () => {
    expect(dayNumber(1970, 1, 1)).toBe(0);
    expect(dayNumber(2000, 3, 1) * 86_400).toBe(951_868_800);
  });

  it('agrees with ECMAScript Date over four centuries, there and back', () => {
    for (let day = -80_000; day < 80_000; day += 7) {
      expect(toDayNumber(fromDayNumber(day))).toBe(day);
    }
  });

  it.each(['2026-02-30', '2023-02-29', '2026-13-01', '2026-1-1', ''])('refuses %p', (text) => {
    expect(() => parseCalendarDate(text)).toThrow(RangeError);
  });

  it('takes a leap day', () => {
    expect(parseCalendarDate('2024-02-29')).toBe('2024-02-29');
  });
});
