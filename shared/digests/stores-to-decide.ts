import type { DigestContent } from './digest-content';

type Store = DigestContent['stores'][number];

/**
 * Below this share of tasks on time a store is put before the account owner. A house rule, set to
 * keep the list short; no standard gives such a figure.
 */
export const LOW_RATE = 0.8;

/** Fewer closed windows than this say little: one task more or less would change the verdict. */
export const ENOUGH_WINDOWS = 5;

/**
 * The stores that an account owner is asked about, lowest rate first.
 *
 * @example
 * // 3 of 5 on time is listed; 1 of 2 is as low, and too few to tell.
 */
export function storesToDecide(stores: readonly Store[]): Store[] {
  const counted = ({ counts }: Store) => counts.onTime + counts.late + counts.notDone;
  return stores
    .filter((store) => store.rate !== null && store.rate < LOW_RATE)
    .filter((store) => counted(store) >= ENOUGH_WINDOWS)
    .sort((a, b) => (a.rate ?? 1) - (b.rate ?? 1) || a.number.localeCompare(b.number));
}
