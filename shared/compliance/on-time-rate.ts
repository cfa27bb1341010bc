/** How the tasks ended whose window closed in a period; every task stands in exactly one count. */
export interface WindowCounts {
  readonly onTime: number;
  readonly late: number;
  /** Window closed, not done: overdue or missed. */
  readonly notDone: number;
  readonly excused: number;
  readonly covered: number;
}

/**
 * What a rate is out of: the tasks whose window closed, less excused and covered.
 *
 * @example countedWindows({ onTime: 3, late: 1, notDone: 2, excused: 7, covered: 9 }) // 6
 */
export function countedWindows({ onTime, late, notDone }: WindowCounts): number {
  return onTime + late + notDone;
}

/**
 * The on-time rate as a share from 0 to 1: tasks done within their window ÷ tasks whose window
 * closed in the period, less excused and covered. Null where nothing counts, which is not 0 %.
 *
 * A published worked example fixes the trap: of 100 scheduled jobs 50 were done while 150 other
 * jobs were done as well; the rate is 50 %, never 200 % (Palmer, plantservices.com 11299398).
 *
 * @example onTimeRate({ onTime: 3, late: 1, notDone: 0, excused: 7, covered: 9 }) // 0.75
 */
export function onTimeRate(counts: WindowCounts): number | null {
  const counted = countedWindows(counts);
  return counted === 0 ? null : counts.onTime / counted;
}
