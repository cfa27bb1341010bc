import type { RuleDay } from './rule';

/** Bits 0, 7, 14, 21 and 28: one weekday of a month that starts on it. */
const EVERY_SEVENTH = 0b10000001000000100000010000001;

const UNKNOWN = -1;

/**
 * Which days of a month BYMONTHDAY and BYDAY let pass, as bits: bit 0 is the first. A month's pattern
 * depends only on its length and the weekday it starts on, so there are 28 of them at most, each
 * worked out once.
 *
 * Every combination of the two parts is their intersection: where the table of RFC 5545, 3.3.10, says
 * "expand" for both it limits the one by the other (its notes 1 and 2).
 */
export class MonthDays {
  private readonly known = new Int32Array(28).fill(UNKNOWN);

  /** With `ordinalsInMonth` false, numbered weekdays count otherwise and are not looked at here. */
  constructor(
    private readonly byMonthDay: readonly number[],
    private readonly byDay: readonly RuleDay[],
    private readonly ordinalsInMonth: boolean,
  ) {}

  /** The bits of a month of `length` days whose first is on `firstWeekday` (0 Monday). */
  bits(length: number, firstWeekday: number): number {
    const key = (length - 28) * 7 + firstWeekday;
    const known = this.known[key] as number;
    if (known !== UNKNOWN) return known;
    const bits = this.monthDayBits(length) & this.weekdayBits(length, firstWeekday);
    this.known[key] = bits;
    return bits;
  }

  private monthDayBits(length: number): number {
    const all = lowBits(length);
    if (this.byMonthDay.length === 0) return all;
    let bits = 0;
    for (const day of this.byMonthDay) {
      const index = day > 0 ? day - 1 : length + day;
      if (index >= 0 && index < length) bits |= 1 << index;
    }
    return bits;
  }

  private weekdayBits(length: number, firstWeekday: number): number {
    const all = lowBits(length);
    if (this.byDay.length === 0) return all;
    let bits = 0;
    for (const { weekday, ordinal } of this.byDay) {
      const first = (weekday - firstWeekday + 7) % 7;
      if (ordinal === 0) bits |= EVERY_SEVENTH << first;
      else if (!this.ordinalsInMonth) bits |= all;
      else {
        const last = first + 7 * Math.floor((length - 1 - first) / 7);
        const index = ordinal > 0 ? first + 7 * (ordinal - 1) : last + 7 * (ordinal + 1);
        if (index >= 0 && index < length) bits |= 1 << index;
      }
    }
    return bits & all;
  }
}

function lowBits(length: number): number {
  return 0x7fffffff >>> (31 - length);
}
