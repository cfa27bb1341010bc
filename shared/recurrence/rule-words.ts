import type { Weekday } from '../calendar/calendar-date';
import type { Frequency, RuleDay } from './rule';

/** The languages in which rules can be put into words. */
export type RuleLanguage = 'en' | 'es';

/**
 * How one language words a rule. Items are written by functions and never read by them: a reader
 * writes all the values there are and looks a text up among them, so the two cannot drift apart.
 */
export interface RuleWords {
  /** "every day", "every 2 weeks". */
  every(interval: number, frequency: Frequency): string;
  /** Joins the last two of a list: " and ". */
  readonly and: string;
  /** Joins the last two of a list of which one has to hold: " or ". */
  readonly or: string;
  month(month: number): string;
  weekday(weekday: Weekday): string;
  /** `ofYear`: a numbered weekday counts within the year; `limiting`: it follows "if it is". */
  ruleDay(day: RuleDay, ofYear: boolean, limiting: boolean): string;
  readonly mondayToFriday: string;
  readonly anyDay: string;
  monthDay(day: number): string;
  yearDay(day: number): string;
  weekNo(week: number): string;
  position(position: number): string;
  /** Puts a list behind its lead, with {list} in its place; the second form for several items. */
  readonly leads: Readonly<Record<Lead, readonly [one: string, several: string]>>;
  /** For COUNT=1. */
  readonly once: string;
  /** With {count}. */
  readonly times: string;
  /** With {weekday}. */
  readonly weeksFrom: string;
  /** With {day}, {month} and {year}. */
  readonly until: string;
  /** With {time}. */
  readonly untilTime: string;
}

/** The clauses that hold a list, in the order in which a sentence has them. */
export type Lead =
  | 'months'
  | 'weekNos'
  | 'yearDays'
  | 'monthDays'
  | 'days'
  | 'daysLimiting'
  | 'clock'
  | 'hours'
  | 'minutes'
  | 'seconds'
  | 'positions';
