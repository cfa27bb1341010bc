import {
  addDays,
  addMonths,
  type CalendarDate,
  civilFromDayNumber,
  dayNumber,
  daysBetween,
  fromDayNumber,
  isoWeek,
  parseCalendarDate,
  toDayNumber,
  weekdayOf,
} from './calendar-date';

const date = (text: string) => parseCalendarDate(text);

describe('calendar date', () => {
  // POSIX.1-2017, 4.16: seconds since the Epoch count 86 400 a day from 1970-01-01.
  it('counts days from the POSIX epoch', () => {
    expect(dayNumber(1970, 1, 1)).toBe(0);
    expect(dayNumber(2000, 3, 1) * 86_400).toBe(951_868_800);
  });

  it('agrees with ECMAScript Date over four centuries, there and back', () => {
    for (let day = -80_000; day < 80_000; day += 7) {
      const text = new Date(day * 86_400_000).toISOString().slice(0, 10);
      expect(fromDayNumber(day)).toBe(text);
      expect(toDayNumber(text as CalendarDate)).toBe(day);
      const { year, month, day: dayOfMonth } = civilFromDayNumber(day);
      expect(dayNumber(year, month, dayOfMonth)).toBe(day);
    }
  });

  it.each(['2026-02-30', '2023-02-29', '1900-02-29', '2026-13-01', '2026-00-10', '2026-1-1', ''])(
    'refuses %p',
    (text) => {
      expect(() => parseCalendarDate(text)).toThrow(RangeError);
    },
  );

  it('takes a leap day, also of a year that 400 divides', () => {
    expect(date('2024-02-29')).toBe('2024-02-29');
    expect(date('2000-02-29')).toBe('2000-02-29');
  });

  it('adds days across years and months up to the end of a shorter one', () => {
    expect(addDays(date('2025-12-31'), 1)).toBe('2026-01-01');
    expect(addDays(date('2024-03-01'), -1)).toBe('2024-02-29');
    expect(addMonths(date('2026-01-31'), 1)).toBe('2026-02-28');
    expect(addMonths(date('2026-01-31'), -11)).toBe('2025-02-28');
    expect(addMonths(date('2026-11-30'), 3)).toBe('2027-02-28');
    expect(daysBetween(date('2026-02-28'), date('2026-03-01'))).toBe(1);
  });

  // ISO 8601-1:2019, 3.1.1.23: week 1 holds the year's first Thursday; values from memory of the
  // calendar, checked with python's date.isocalendar().
  it.each([
    ['2027-01-03', 2026, 53],
    ['2027-01-04', 2027, 1],
    ['2024-12-30', 2025, 1],
    ['2021-01-01', 2020, 53],
    ['2026-06-15', 2026, 25],
  ])('%s is in week %i-W%i', (text, year, week) => {
    expect(isoWeek(date(text))).toEqual({ year, week });
  });

  // RFC 5545, 3.8.5.3: 2 September 1997 is a Tuesday.
  it('counts weekdays from Monday', () => {
    expect(weekdayOf(date('1997-09-02'))).toBe(1);
  });
});
