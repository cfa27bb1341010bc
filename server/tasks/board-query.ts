import { type CalendarDate, addDays, weekdayOf } from '@shared/calendar/calendar-date';
import type { QueryOf } from '@shared/contract/endpoint';
import type { readTaskBoard } from '@shared/tasks/tasks-contract';

export type BoardQuery = QueryOf<typeof readTaskBoard>;

/** The Monday of a day's week. */
export const mondayOf = (day: CalendarDate): CalendarDate => addDays(day, -weekdayOf(day));

/** The days that a board is about. */
export interface BoardDays {
  readonly from: CalendarDate;
  readonly to: CalendarDate;
  /** Today in the zone of whoever asks. */
  readonly today: CalendarDate;
  /** The Monday on which the strip of weeks begins. */
  readonly strip: CalendarDate;
  /** Before it nothing occurs that can still be done; null: nobody knows. */
  readonly earliest: string | null;
}
