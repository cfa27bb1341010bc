/** The first and last local day of a task's window, `YYYY-MM-DD`. */
export interface DayWindow {
  readonly opensOn: string;
  readonly closesOn: string;
}

export type DayFit = 'early' | 'in-window' | 'late';

/**
 * How a day lies to a task's window: before it opens, in it, or after its last day.
 *
 * @example dayInWindow('2026-06-13', { opensOn: '2026-06-08', closesOn: '2026-06-12' }) // 'late'
 */
export function dayInWindow(day: string, { opensOn, closesOn }: DayWindow): DayFit {
  if (day < opensOn) return 'early';
  return day > closesOn ? 'late' : 'in-window';
}
