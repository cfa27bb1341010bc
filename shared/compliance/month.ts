declare const month: unique symbol;

/** A month of the calendar, `YYYY-MM`. */
export type Month = string & { readonly [month]: true };

export const monthPattern = /^(19|20)\d\d-(0[1-9]|1[0-2])$/;

/** Whether the text is a month, `YYYY-MM`, of 1900 to 2099. */
export const isMonth = (text: string): text is Month => monthPattern.test(text);

/**
 * The month so many months later, or earlier when negative.
 *
 * @example addToMonth('2026-01', -1) // '2025-12'
 */
export function addToMonth(start: Month, months: number): Month {
  const index = indexOf(start) + months;
  return `${Math.floor(index / 12)}-${String((index % 12) + 1).padStart(2, '0')}` as Month;
}

/** How many months a range has, both ends counted; less than one when `to` comes first. */
export const monthsIn = (from: Month, to: Month): number => indexOf(to) - indexOf(from) + 1;

/** The months of a range, both ends included. */
export function monthRange(from: Month, to: Month): Month[] {
  return Array.from({ length: Math.max(0, monthsIn(from, to)) }, (_, n) => addToMonth(from, n));
}

/** The month in which a calendar date (`YYYY-MM-DD`) lies. */
export const monthOf = (date: string): Month => date.slice(0, 7) as Month;

/** The last day of a month, `YYYY-MM-DD`. */
export function lastDayOf(of: Month): string {
  const [year, number] = [+of.slice(0, 4), +of.slice(5, 7)];
  return `${of}-${new Date(Date.UTC(year, number, 0)).getUTCDate()}`;
}

function indexOf(of: Month): number {
  return +of.slice(0, 4) * 12 + +of.slice(5, 7) - 1;
}
