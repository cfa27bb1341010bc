import { addDays, type CalendarDate } from '../calendar/calendar-date';
import { dateAt, instantOf } from '../calendar/instant-of';
import { atTime, dateOf, type LocalDateTime } from '../calendar/local-date-time';

/**
 * How long a task may be done around its due time.
 *
 * `days` counts calendar days of the store, whatever the clocks do in them; `hours` counts elapsed
 * hours and suits checks of a shift. `before` and `after` say how far the window reaches on either
 * side, `dueSoon` how long before the due time a task is due soon, `late` how long after its window
 * it can still be done late; null: until the next occurrence opens.
 */
export interface WindowPlan {
  readonly kind: 'days' | 'hours';
  readonly before: number;
  readonly after: number;
  readonly late: number | null;
  readonly dueSoon: number;
}

/** The moments of one task in epoch milliseconds, opens ≤ due soon ≤ closes ≤ lapses. */
export interface WindowTimes {
  readonly opensAt: number;
  readonly dueSoonAt: number;
  readonly dueAt: number;
  /** End of the window, exclusive. */
  readonly closesAt: number;
  /** From here on the task can no longer be done, even late. */
  readonly lapsesAt: number;
  /** Local date of the due time. */
  readonly dueOn: CalendarDate;
  /** The last local day on which the task is still on time. */
  readonly closesOn: CalendarDate;
}

/** Stands for "never lapses": 9999-12-31, which every column and every screen can hold. */
export const NEVER_LAPSES = Date.UTC(9999, 11, 31);

const HOUR = 3_600_000;

/**
 * The window of the occurrence at `local` in `tzid`. `nextOpensAt` (epoch milliseconds) is when the
 * next occurrence of the schedule opens, or null where there is none; it counts only for plans
 * without a number of late days or hours.
 *
 * With days, the window opens at 00:00 of the due date less `before` and closes at 24:00 of the due
 * date plus `after`: two days either side of Wednesday reach from Monday 00:00 to Friday 24:00.
 */
export function windowTimes(
  local: LocalDateTime,
  tzid: string,
  plan: WindowPlan,
  nextOpensAt: number | null,
): WindowTimes {
  const dueOn = dateOf(local);
  const dueAt = instantOf(local, tzid);
  return plan.kind === 'days'
    ? dayWindow(dueOn, dueAt, tzid, plan, nextOpensAt)
    : hourWindow(dueOn, dueAt, tzid, plan, nextOpensAt);
}

/** When the window of the occurrence at `local` opens, epoch milliseconds. */
export function windowOpensAt(local: LocalDateTime, tzid: string, plan: WindowPlan): number {
  return plan.kind === 'days'
    ? midnight(addDays(dateOf(local), -plan.before), tzid)
    : instantOf(local, tzid) - plan.before * HOUR;
}

function dayWindow(
  dueOn: CalendarDate,
  dueAt: number,
  tzid: string,
  plan: WindowPlan,
  nextOpensAt: number | null,
): WindowTimes {
  const closesOn = addDays(dueOn, plan.after);
  // A due time in a gap at midnight lies after its own date's first moment, never before it.
  const opensAt = Math.min(midnight(addDays(dueOn, -plan.before), tzid), dueAt);
  const closesAt = Math.max(midnight(addDays(closesOn, 1), tzid), dueAt);
  const lapsesAt =
    plan.late === null
      ? (nextOpensAt ?? NEVER_LAPSES)
      : midnight(addDays(closesOn, 1 + plan.late), tzid);
  const dueSoonAt = midnight(addDays(dueOn, -plan.dueSoon), tzid);
  return {
    opensAt,
    dueSoonAt: clamp(dueSoonAt, opensAt, closesAt),
    dueAt,
    closesAt,
    lapsesAt: Math.max(lapsesAt, closesAt),
    dueOn,
    closesOn,
  };
}

function hourWindow(
  dueOn: CalendarDate,
  dueAt: number,
  tzid: string,
  plan: WindowPlan,
  nextOpensAt: number | null,
): WindowTimes {
  const opensAt = dueAt - plan.before * HOUR;
  const closesAt = dueAt + plan.after * HOUR;
  const lapsesAt = plan.late === null ? (nextOpensAt ?? NEVER_LAPSES) : closesAt + plan.late * HOUR;
  return {
    opensAt,
    dueSoonAt: clamp(dueAt - plan.dueSoon * HOUR, opensAt, closesAt),
    dueAt,
    closesAt,
    lapsesAt: Math.max(lapsesAt, closesAt),
    dueOn,
    closesOn: dateAt(Math.max(opensAt, closesAt - 1), tzid),
  };
}

/** The first moment of a local date: where clocks skip midnight, the moment they skip it. */
function midnight(date: CalendarDate, tzid: string): number {
  return instantOf(atTime(date, '00:00'), tzid);
}

function clamp(value: number, low: number, high: number): number {
  return Math.min(Math.max(value, low), high);
}
