import type { CalendarDate } from '@shared/calendar/calendar-date';
import { addDays, parseCalendarDate, weekdayOf } from '@shared/calendar/calendar-date';

/** Days on the board: five weeks. */
export const BOARD_DAYS = 35;

/** A column of the board. */
export interface BoardDay {
  readonly date: CalendarDate;
  /** Saturday or Sunday: drawn at rest. */
  readonly rest: boolean;
}

/** The days of the board from its first one on. */
export function boardDays(from: string): readonly BoardDay[] {
  const first = parseCalendarDate(from);
  return Array.from({ length: BOARD_DAYS }, (_, index) => {
    const date = addDays(first, index);
    return { date, rest: weekdayOf(date) > 4 };
  });
}

/** The first day of the board five weeks before or after. */
export function turnBoard(from: string, boards: -1 | 1): string {
  return addDays(parseCalendarDate(from), boards * BOARD_DAYS);
}
