import {
  civilFromDayNumber,
  dayNumber,
  daysInMonth,
  weekdayOfDayNumber,
} from '../calendar/calendar-date';
import type { ResolvedParts } from './implied-parts';
import { MonthDays } from './month-days';
import { type YearDayTest, yearDayTests } from './year-days';

/**
 * Whether a day passes BYMONTH, BYMONTHDAY, BYYEARDAY and BYDAY where they limit (DAILY and faster,
 * and BYMONTH in WEEKLY). It remembers the month it stands in, as days come in order.
 */
export class DayFilter {
  /** True where every day passes. */
  readonly passesAll: boolean;
  private readonly monthDays: MonthDays;
  private readonly testsOfYear: ((year: number) => YearDayTest) | null;
  private firstOfMonth = 0;
  private firstOfNext = 0;
  private bits = 0;
  private test: YearDayTest | null = null;
  private testYear = NaN;

  constructor(private readonly parts: ResolvedParts) {
    this.monthDays = new MonthDays(parts.byMonthDay, parts.byDay, false);
    this.testsOfYear = yearDayTests(parts, 0, false);
    this.passesAll =
      parts.byMonth.length === 0 &&
      parts.byMonthDay.length === 0 &&
      parts.byDay.length === 0 &&
      parts.byYearDay.length === 0;
  }

  /** Whether the day (since 1970) passes. */
  passes(day: number): boolean {
    if (this.passesAll) return true;
    if (day < this.firstOfMonth || day >= this.firstOfNext) this.enterMonth(day);
    return (
      ((this.bits >> (day - this.firstOfMonth)) & 1) === 1 && (this.test === null || this.test(day))
    );
  }

  private enterMonth(day: number): void {
    const { year, month } = civilFromDayNumber(day);
    const length = daysInMonth(year, month);
    this.firstOfMonth = dayNumber(year, month, 1);
    this.firstOfNext = this.firstOfMonth + length;
    const { byMonth } = this.parts;
    this.bits =
      byMonth.length === 0 || byMonth.includes(month)
        ? this.monthDays.bits(length, weekdayOfDayNumber(this.firstOfMonth))
        : 0;
    if (this.testsOfYear && this.testYear !== year) {
      this.test = this.testsOfYear(year);
      this.testYear = year;
    }
  }
}
