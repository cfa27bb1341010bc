import type { CalendarDate, Weekday } from '../calendar/calendar-date';
import type { LocalDateTime } from '../calendar/local-date-time';

/** How often the interval of a rule is counted, fastest first (RFC 5545, 3.3.10). */
export const FREQUENCIES = [
  'SECONDLY',
  'MINUTELY',
  'HOURLY',
  'DAILY',
  'WEEKLY',
  'MONTHLY',
  'YEARLY',
] as const;

export type Frequency = (typeof FREQUENCIES)[number];

/** RFC 5545's names of the weekdays, in the order of {@link Weekday}. */
export const WEEKDAY_NAMES = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'] as const;

/** A weekday of BYDAY: every one (ordinal 0), or the nth, from the end when negative. */
export interface RuleDay {
  readonly weekday: Weekday;
  readonly ordinal: number;
}

/** The inclusive end of a rule, in whichever of the three forms it was written. */
export type Until =
  | { readonly form: 'date'; readonly date: CalendarDate }
  | { readonly form: 'local'; readonly local: LocalDateTime }
  /** Epoch milliseconds. */
  | { readonly form: 'utc'; readonly instant: number };

/** The parts of a rule that hold lists of numbers. */
export type NumberPart =
  | 'bySecond'
  | 'byMinute'
  | 'byHour'
  | 'byMonthDay'
  | 'byYearDay'
  | 'byWeekNo'
  | 'byMonth'
  | 'bySetPos';

/**
 * One recurrence rule, RFC 5545, 3.3.10. Lists are free of doubles and in canonical order: from the
 * beginning first, then those that count from the end. An empty list means that the part is absent.
 */
export interface Rule extends Readonly<Record<NumberPart, readonly number[]>> {
  readonly frequency: Frequency;
  readonly interval: number;
  readonly count: number | null;
  readonly until: Until | null;
  readonly byDay: readonly RuleDay[];
  /** The day on which a week starts; Monday unless WKST says otherwise. */
  readonly weekStart: Weekday;
}

/** A rule without BY-parts and without an end, to be spread into others. */
export function plainRule(frequency: Frequency, interval = 1): Rule {
  return {
    frequency,
    interval,
    count: null,
    until: null,
    bySecond: [],
    byMinute: [],
    byHour: [],
    byDay: [],
    byMonthDay: [],
    byYearDay: [],
    byWeekNo: [],
    byMonth: [],
    bySetPos: [],
    weekStart: 0,
  };
}

/**
 * A recurrence set (RFC 5545, 3.8.5): a wall-clock start, rules as text, dates added and taken out.
 * Without rules it holds its start and the added dates. With rules, a start that they do not match is
 * no occurrence: the standard leaves that case undefined, and a task off its pattern helps nobody.
 */
export interface RecurrenceSet {
  readonly startsLocal: LocalDateTime;
  readonly rrules: readonly string[];
  readonly rdates?: readonly LocalDateTime[];
  readonly exdates?: readonly LocalDateTime[];
}
