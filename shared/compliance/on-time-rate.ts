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
 * The on-time rate as a share from 0 to 1: tasks done within their window ÷ tasks whose window
 * closed in the period, less excused and covered. Null where nothing counts, which is not 0 %.
 *
 * A published worked example fixes the trap: of 100 scheduled jobs 50 were done while 150 other
 * jobs were done as well; the rate is 50 %, never 200 % (Palmer, plantservices.com 11299398).
 */
export function onTimeRate(counts: WindowCounts): number | null {
  const counted = counts.onTime + counts.late + counts.notDone;
  return counted === 0 ? null : counts.onTime / counted;
}
