/** What was decided about a task; `none` while nobody has said anything. */
export type TaskOutcome = 'none' | 'done' | 'excused' | 'covered';

export const taskStates = [
  'planned',
  'open',
  'due-soon',
  'overdue',
  'done',
  'done-late',
  'missed',
  'excused',
  'covered',
] as const;

/** The words a person reads; see {@link taskState}. */
export type TaskState = (typeof taskStates)[number];

/** The moments of one task, in epoch milliseconds, in this order (equal ones allowed). */
export interface TaskTimes {
  readonly opensAt: number;
  readonly dueSoonAt: number;
  /** End of the window, exclusive: done at this very moment is late. */
  readonly closesAt: number;
  /** From here on it can no longer be done, even late. */
  readonly lapsesAt: number;
}

/**
 * The state of a task at the instant `now` (epoch milliseconds).
 *
 * A decision outranks the clock; then the window runs planned → open → due soon, and after it
 * closes the task is overdue until it lapses and is missed.
 *
 * @example taskState('none', null, { opensAt: 0, dueSoonAt: 5, closesAt: 9, lapsesAt: 12 }, 9) // 'overdue'
 */
export function taskState(
  outcome: TaskOutcome,
  doneAt: number | null,
  times: TaskTimes,
  now: number,
): TaskState {
  if (outcome === 'excused' || outcome === 'covered') return outcome;
  if (outcome === 'done') {
    return doneAt !== null && doneAt < times.closesAt ? 'done' : 'done-late';
  }
  if (now < times.opensAt) return 'planned';
  if (now < times.dueSoonAt) return 'open';
  if (now < times.closesAt) return 'due-soon';
  return now < times.lapsesAt ? 'overdue' : 'missed';
}
