import { addToMonth, type Month, monthRange } from '../compliance/month';

/** After a longer silence the oldest months are left to the compliance page. */
export const MOST_BEHIND = 12;

/**
 * The months that a chain still wants a digest of, oldest first: those after its last digest that
 * are over. A chain without any gets the month just over, not its whole past.
 *
 * @param present the month in which it is now, in the organisation's zone
 * @example monthsToDigest('2026-09', '2026-12') // ['2026-10', '2026-11']
 * @example monthsToDigest(null, '2026-12') // ['2026-11']
 * @example monthsToDigest('2026-11', '2026-12') // []
 */
export function monthsToDigest(last: Month | null, present: Month): Month[] {
  const over = addToMonth(present, -1);
  if (last === null) return [over];
  return monthRange(addToMonth(last, 1), over).slice(-MOST_BEHIND);
}
