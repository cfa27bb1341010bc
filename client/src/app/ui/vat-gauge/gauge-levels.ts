/** The moments of an interval, in epoch milliseconds. */
export interface GaugeTimes {
  /** When the interval began: the last completion, or the close of the task before. */
  readonly startedAt: number;
  readonly opensAt: number;
  readonly dueAt: number;
  readonly closesAt: number;
}

/** Where they stand on the wall: 1 at the rim (just begun), 0 at the floor (window closed). */
export interface GaugeLevels {
  readonly level: number;
  readonly opens: number;
  readonly due: number;
}

/**
 * How far the oil stands: the share of the interval that is left at `now`, and the levels at which
 * the window opens and the task is due.
 *
 * @example
 * // thirty days, the window opening on the 20th, due on the 25th, at the 15th day
 * gaugeLevels({ startedAt: 0, opensAt: 20, dueAt: 25, closesAt: 30 }, 15)
 * // { level: 0.5, opens: 1/3, due: 1/6 }
 */
export function gaugeLevels(times: GaugeTimes, now: number): GaugeLevels {
  const whole = times.closesAt - times.startedAt;
  const left = (at: number): number =>
    whole <= 0 ? 0 : Math.min(1, Math.max(0, (times.closesAt - at) / whole));
  return { level: left(now), opens: left(times.opensAt), due: left(times.dueAt) };
}
