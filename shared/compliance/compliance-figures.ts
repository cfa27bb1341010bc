import { onTimeRate, type WindowCounts } from './on-time-rate';
import { rateChange } from './rate-change';

/** A rate with the counts it is made of, beside those of the range it is compared with. */
export interface ComplianceFigures {
  readonly counts: WindowCounts;
  readonly rate: number | null;
  readonly previousCounts: WindowCounts;
  readonly previousRate: number | null;
  /** Percentage points; null where either rate is missing. */
  readonly change: number | null;
}

/**
 * Everything that is said about one row, from the counts of its two ranges.
 *
 * @example
 * // 9 of 10 after 8 of 10: rate 0.9, change +10 points
 */
export function complianceFigures(
  counts: WindowCounts,
  previousCounts: WindowCounts,
): ComplianceFigures {
  const [rate, previousRate] = [onTimeRate(counts), onTimeRate(previousCounts)];
  return { counts, rate, previousCounts, previousRate, change: rateChange(previousRate, rate) };
}
