/** RFC 5545, 3.3.10. */
export const frequencies = [
  'SECONDLY',
  'MINUTELY',
  'HOURLY',
  'DAILY',
  'WEEKLY',
  'MONTHLY',
  'YEARLY',
] as const;

export type Frequency = (typeof frequencies)[number];

/** Weekdays as RFC 5545 writes them, from Monday, which is 0 here as in ISO 8601. */
export const weekdays = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'] as const;

export interface ByDay {
  /** 0 Monday to 6 Sunday. */
  readonly weekday: number;
  /** 2 the second, −1 the last; 0 every one. */
  readonly ordinal: number;
}

/** When a rule ends: an instant, a wall-clock time, or a whole day; always inclusive. */
export type Until =
  | { readonly kind: 'instant'; readonly seconds: number }
  | { readonly kind: 'local'; readonly seconds: number }
  | { readonly kind: 'date'; readonly day: number };

/** A parsed RRULE. Empty lists mean the part is absent. */
export interface Rule {
  readonly frequency: Frequency;
  readonly interval: number;
  readonly count: number | null;
  readonly until: Until | null;
  /** First day of the week, 0 Monday. */
  readonly weekStart: number;
  readonly bySecond: readonly number[];
  readonly byMinute: readonly number[];
  readonly byHour: readonly number[];
  readonly byDay: readonly ByDay[];
  readonly byMonthDay: readonly number[];
  readonly byYearDay: readonly number[];
  readonly byWeekNo: readonly number[];
  readonly byMonth: readonly number[];
  readonly bySetPos: readonly number[];
}

/** What is wrong with one part of a rule's text. */
export interface RuleProblem {
  /** The part at fault, as written: `BYMONTHDAY`. */
  readonly part: string;
  readonly reason:
    | 'unreadable'
    | 'unknown-part'
    | 'twice'
    | 'missing'
    | 'out-of-range'
    | 'not-with-frequency'
    | 'count-with-until'
    | 'needs-another-part'
    | 'never-occurs'
    | 'too-often';
  /** A sentence in English that names the part and the reason. */
  readonly message: string;
}
